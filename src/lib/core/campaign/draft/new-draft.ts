import type {
  DraftCondition,
  DraftConstant,
  DraftMachine,
  DraftMeasurand,
  DraftReading,
  DraftTreatment,
  PlanDraft
} from './plan-draft.ts';

/** Returns a key that none of the items has: the letter and the next number. */
export function nextKey(letter: string, items: readonly { key: string }[]): string {
  const used = items.map(({ key }) => (key.startsWith(letter) ? Number(key.slice(letter.length)) : 0));
  return `${letter}${Math.max(0, ...used.filter(Number.isInteger)) + 1}`;
}

const anyRange = () => ({ min: '', max: '' });
const taken = () => ({
  when: 'after' as const,
  point: '',
  pointUnit: '',
  repeats: '1',
  resolution: '',
  mayStopAtLimit: false
});

export const newTreatment = (among: readonly DraftTreatment[], name = ''): DraftTreatment => ({
  key: nextKey('t', among),
  name,
  specimens: '',
  control: false,
  note: ''
});

export const newMachine = (among: readonly DraftMachine[], slots = 3): DraftMachine => ({
  key: nextKey('m', among),
  name: '',
  layout: 'row',
  columns: '2',
  slots: Array.from({ length: slots }, (_, i) => ({ name: String(i + 1), inService: true }))
});

export const newReading = (among: readonly DraftReading[], id = ''): DraftReading => ({
  key: nextKey('r', among),
  id,
  label: '',
  unit: '',
  decimals: '2',
  possible: anyRange(),
  expected: anyRange(),
  ...taken()
});

export const newConstant = (among: readonly DraftConstant[]): DraftConstant => ({
  key: nextKey('c', among),
  id: '',
  label: '',
  value: '',
  unit: ''
});

export const newMeasurand = (among: readonly DraftMeasurand[]): DraftMeasurand => ({
  key: nextKey('y', among),
  id: '',
  label: '',
  unit: '',
  decimals: '2',
  source: 'read',
  formula: '',
  direction: 'lower',
  target: '',
  possible: anyRange(),
  expected: anyRange(),
  scatter: '',
  difference: '',
  equivalenceMargin: '',
  ...taken()
});

export const newCondition = (among: readonly DraftCondition[]): DraftCondition => ({
  key: nextKey('w', among),
  label: '',
  kind: 'number',
  unit: '',
  window: anyRange()
});

/**
 * Returns an empty draft.
 *
 * @param words - precautions and reasons for ruin to begin with, in the person's language
 */
export function newDraft(words: { precautions: readonly string[]; ruinReasons: readonly string[] }): PlanDraft {
  return {
    v: 1,
    title: '',
    question: '',
    operator: '',
    treatments: [],
    machines: [newMachine([])],
    sessionsPerShift: '',
    minutesPerSession: '',
    runMinutes: '',
    readings: [],
    constants: [],
    measurands: [newMeasurand([])],
    conditions: [],
    precautions: words.precautions.join('\n'),
    ruinReasons: words.ruinReasons.join('\n'),
    open: false,
    primary: {
      measurand: '',
      sessions: 'fixed',
      comparison: 'all-pairs',
      adjustment: 'tukey',
      alpha: '0.05',
      slotInModel: false
    },
    design: {
      maxSessions: '',
      resolvable: false,
      controlWeigh: 'test-control',
      controlInEverySession: false,
      apart: [],
      chosen: '',
      seed: '',
      order: 'early-stop',
      spares: '0'
    }
  };
}
