import type { Plan } from '#lib/core/campaign/plan.ts';

const free = { min: null, max: null };

/** Nine recipes of one wall paint. All invented. */
const recipes: [string, string][] = [
  ['r1', 'Recipe 1 (in production)'],
  ['r2', 'Recipe 2, more binder'],
  ['r3', 'Recipe 3, less binder'],
  ['r4', 'Recipe 4, fine chalk'],
  ['r5', 'Recipe 5, coarse chalk'],
  ['r6', 'Recipe 6, talc'],
  ['r7', 'Recipe 7, wax 1 %'],
  ['r8', 'Recipe 8, wax 2 %'],
  ['r9', 'Recipe 9, harder resin']
];

/**
 * The plan of the demo: which of nine wall paints wears least on a three-track wet-scrub machine. Invented; the method of
 * measurement is that of ISO 11998 (panel mass before and after 200 strokes, mean loss of film thickness).
 */
export const demoPlan: Plan = {
  title: 'Wall paints on the wet-scrub machine (invented demo data)',
  question: 'Which recipe loses least film in 200 strokes, and is any better than the recipe in production?',
  treatments: recipes.map(([id, name]) => ({ id, name, specimens: 6, control: id === 'r1', note: '' })),
  machines: [
    {
      id: 'scrubber',
      name: 'Wet-scrub machine',
      layout: { kind: 'row' },
      slots: ['Track 1', 'Track 2', 'Track 3'].map((name) => ({ name, inService: true }))
    }
  ],
  readings: (
    [
      ['before', 'Panel mass before', 'before'],
      ['after', 'Panel mass after', 'after']
    ] as const
  ).map(([id, label, kind]) => ({
    id,
    label,
    unit: 'g',
    decimals: 4,
    possible: { min: 1, max: 200 },
    expected: { min: 35, max: 55 },
    when: { kind },
    repeats: 1,
    resolution: 0.0001,
    mayStopAtLimit: false
  })),
  constants: [
    { id: 'area', label: 'Scrubbed area', value: 0.004, unit: 'm^2' },
    { id: 'density', label: 'Dry film density', value: 1.5, unit: 'g/cm^3' }
  ],
  measurands: [
    {
      id: 'loss',
      label: 'Loss of film thickness',
      unit: 'um',
      decimals: 2,
      formula: '(before - after) / (area * density)',
      direction: { kind: 'lower' },
      kind: 'number',
      possible: { min: 0, max: 200 },
      expected: { min: 2, max: 16 },
      scatter: 0.5,
      difference: 1.5,
      equivalenceMargin: 1
    }
  ],
  conditions: [
    { id: 'temperature', label: 'Room temperature', kind: 'number', unit: '°C', window: { min: 21, max: 25 } },
    { id: 'humidity', label: 'Relative humidity', kind: 'number', unit: '%', window: { min: 45, max: 55 } },
    { id: 'pad', label: 'Batch of abrasive pads', kind: 'text', unit: '', window: free }
  ],
  sessionsPerShift: 3,
  minutesPerSession: 25,
  runSeconds: 324,
  operator: '',
  precautions: [
    'Stop and isolate the machine before you reach between the carriages.',
    'Close the guard before you start; wait until the carriages stand still before you open it.',
    'Wear safety glasses and gloves: the scrub liquid is alkaline and sprays. Wipe up spills at once.'
  ],
  ruinReasons: [
    'Pad came loose',
    'Panel slipped in its holder',
    'Scrub liquid ran dry',
    'Film flaked off',
    'Wrong stroke count'
  ],
  open: false,
  primary: {
    measurand: 'loss',
    sessions: 'fixed',
    comparison: 'all-pairs',
    adjustment: 'tukey',
    alpha: 0.05,
    slotInModel: false
  }
};

/** Invented true loss of film of each recipe, µm, in the order of the plan. */
export const demoTruth = [7.4, 5.6, 11.6, 7.0, 10.4, 8.6, 5.9, 4.1, 5.2];
