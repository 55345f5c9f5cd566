import type { PackagedResult } from './package-input.ts';
import type { Table } from './table.ts';

/** How each measurand was analysed: enough to do it again. */
export const modelTable = (results: readonly PackagedResult[]): Table => ({
  name: 'result-model',
  path: 'results/model.csv',
  title: 'How each measurand was analysed',
  primaryKey: ['measurand'],
  fields: [
    { name: 'measurand', type: 'string', title: 'Measurand' },
    { name: 'label', type: 'string', title: 'In words' },
    { name: 'unit', type: 'string', title: 'Unit' },
    { name: 'primary', type: 'string', title: 'Primary analysis: sessions fixed or random' },
    { name: 'direction', type: 'string', title: 'Which end is better' },
    { name: 'target', type: 'number', title: 'Target, if nearest to a target is better' },
    { name: 'alpha', type: 'number', title: 'Error probability' },
    { name: 'control', type: 'string', title: 'Control' },
    { name: 'slot', type: 'boolean', title: 'Slots are in the model' },
    { name: 'machine', type: 'boolean', title: 'Machines are in the model' },
    { name: 'shift', type: 'boolean', title: 'Shifts are in the model' },
    { name: 'covariate', type: 'boolean', title: 'A specimen property is in the model' },
    { name: 'seed', type: 'integer', title: 'Seed of simulations' },
    { name: 'algorithm', type: 'string', title: 'Version of the analysis' }
  ],
  rows: results.map(({ measurand, input, analysis }) => {
    const sources = analysis.fixed.ok ? analysis.fixed.value.anova.sources.map((s) => s.source) : [];
    return [
      measurand.id,
      measurand.label,
      measurand.unit,
      input.primary,
      typeof input.direction === 'object' ? 'target' : input.direction,
      typeof input.direction === 'object' ? input.direction.target : null,
      input.alpha,
      input.control === null ? null : (input.treatments[input.control]?.id ?? null),
      sources.includes('slot'),
      sources.includes('machine'),
      sources.includes('shift'),
      sources.includes('covariate'),
      input.seed,
      analysis.algorithm
    ];
  })
});
