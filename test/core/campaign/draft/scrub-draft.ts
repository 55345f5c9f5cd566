import { newConstant, newDraft, newMeasurand, newReading, newTreatment } from '#lib/core/campaign/draft/new-draft.ts';
import type { PlanDraft } from '#lib/core/campaign/draft/plan-draft.ts';

/** Invented: four wall paints, three tracks, film loss from panel mass. */
export function scrubDraft(): PlanDraft {
  const draft = newDraft({ precautions: ['Isolate the machine.'], ruinReasons: ['Panel slipped'] });
  const treatments: PlanDraft['treatments'] = [];
  for (const name of ['Alpha', 'Beta', 'Gamma', 'Delta']) treatments.push(newTreatment(treatments, name));
  const before = { ...newReading([], 'before'), unit: 'g', decimals: '4', when: 'before' as const };
  const after = { ...newReading([before], 'after'), unit: 'g', decimals: '4' };
  const area = { ...newConstant([]), id: 'area', value: '0,0040', unit: 'm²' };
  const density = { ...newConstant([area]), id: 'density', value: '1.5', unit: 'g/cm³' };
  const loss = {
    ...newMeasurand([]),
    label: 'Loss of film thickness',
    unit: 'µm',
    source: 'formula' as const,
    formula: '(before - after)/(area*density)',
    possible: { min: '0', max: '200' },
    expected: { min: '1', max: '30' },
    scatter: '0,8',
    difference: '2'
  };
  return {
    ...draft,
    title: 'Invented wall paints',
    treatments,
    readings: [before, after],
    constants: [area, density],
    measurands: [loss],
    runMinutes: '5,5'
  };
}
