import * as v from 'valibot';
import { describe, expect, test } from 'vitest';
import { newDraft, newMeasurand, newTreatment } from '#lib/core/campaign/draft/new-draft.ts';
import type { PlanDraft } from '#lib/core/campaign/draft/plan-draft.ts';
import { readDraft } from '#lib/core/campaign/draft/read-draft.ts';
import { PlanSchema } from '#lib/core/campaign/plan.ts';
import { scrubDraft } from './scrub-draft.ts';

const faultsOf = (change: (draft: PlanDraft) => void) => {
  const draft = scrubDraft();
  change(draft);
  return readDraft(draft).faults;
};

describe('readDraft(draft)', () => {
  test('makes a valid plan of a complete draft, numbers with comma or point', () => {
    const { plan, faults, complete } = readDraft(scrubDraft());
    expect(faults).toEqual([]);
    expect(complete).toBe(true);
    expect(v.safeParse(PlanSchema, plan).success).toBe(true);
    expect(plan.constants.map(({ value }) => value)).toEqual([0.004, 1.5]);
    expect(plan.runSeconds).toBe(330);
    expect(plan.measurands[0]).toMatchObject({ id: 'loss_of_film_thickness', scatter: 0.8, difference: 2 });
    expect(plan.primary).toMatchObject({ measurand: 'loss_of_film_thickness', alpha: 0.05 });
  });

  test('makes one reading of a measurand that is read as it is', () => {
    const draft = scrubDraft();
    draft.measurands = [{ ...newMeasurand([]), label: 'Größe', unit: 'mm' }];
    const { plan } = readDraft(draft);
    expect(plan.measurands[0]).toMatchObject({ id: 'groesse', formula: null });
    expect(plan.readings.at(-1)).toMatchObject({ id: 'groesse', label: 'Größe', unit: 'mm', when: { kind: 'after' } });
  });

  test('gives measurands ids that are free', () => {
    const draft = scrubDraft();
    draft.measurands = ['Before', '++', '+-'].map((label, i) => ({ ...newMeasurand([]), key: `y${i + 1}`, label }));
    draft.readings = draft.readings.map((reading) => ({ ...reading, id: reading.id }));
    const ids = readDraft(draft).plan.measurands.map(({ id }) => id);
    expect(ids).toEqual(['before_2', 'y2', 'y3']);
  });

  test('leaves out untouched rows', () => {
    const faults = faultsOf((draft) => draft.treatments.push(newTreatment(draft.treatments)));
    expect(faults).toEqual([]);
  });

  test('says that every session is complete where slots are as many as treatments, and allows it', () => {
    const draft = scrubDraft();
    draft.machines[0]?.slots.push({ name: '4', inService: true });
    const { faults, complete } = readDraft(draft);
    expect(faults).toEqual([{ path: 'machines', weight: 'told', tag: 'complete-sessions', slots: 4, treatments: 4 }]);
    expect(complete).toBe(true);
  });

  test.each<[string, (draft: PlanDraft) => void, object]>([
    ['an empty title', (d) => (d.title = ' '), { path: 'title', tag: 'title-empty' }],
    ['one treatment', (d) => (d.treatments.length = 1), { path: 'treatments', tag: 'treatments-too-few', least: 2 }],
    [
      'a name twice, whatever its capitals and blanks',
      (d) => (d.treatments[3]!.name = ' ALPHA '),
      { path: 'treatments.3.name', tag: 'name-twice', name: 'ALPHA' }
    ],
    [
      'a row with specimens and no name',
      (d) => {
        d.treatments[2]!.name = '';
        d.treatments[2]!.specimens = '4';
      },
      { path: 'treatments.2.name', tag: 'name-empty' }
    ],
    [
      'half a specimen',
      (d) => (d.treatments[0]!.specimens = '1,5'),
      { path: 'treatments.0.specimens', tag: 'not-whole', least: 0, most: 100_000 }
    ],
    [
      'a letter in a number',
      (d) => (d.measurands[0]!.scatter = '0,8x'),
      { path: 'measurands.0.scatter', tag: 'not-a-number', text: '0,8x' }
    ],
    [
      'a number with two meanings',
      (d) => (d.measurands[0]!.scatter = '1.234'),
      { path: 'measurands.0.scatter', tag: 'two-meanings', text: '1.234' }
    ],
    ['a scatter of nothing', (d) => (d.measurands[0]!.scatter = '0'), { tag: 'not-positive' }],
    [
      'a range upside down',
      (d) => (d.measurands[0]!.expected = { min: '30', max: '1' }),
      { path: 'measurands.0.expected', tag: 'range-upside-down' }
    ],
    [
      'expected values that cannot be',
      (d) => (d.measurands[0]!.expected.max = '300'),
      { path: 'measurands.0.expected', tag: 'expected-beyond-possible' }
    ],
    [
      'no slot in service',
      (d) => d.machines[0]!.slots.forEach((slot) => (slot.inService = false)),
      { path: 'machines.0.slots', tag: 'no-slot-in-service' }
    ],
    [
      'a grid without columns',
      (d) => Object.assign(d.machines[0]!, { layout: 'grid', columns: '' }),
      { path: 'machines.0.columns', tag: 'needed' }
    ],
    ['a reading name twice', (d) => (d.readings[1]!.id = 'before'), { path: 'readings.1.id', tag: 'id-twice' }],
    ['a name with a blank', (d) => (d.readings[1]!.id = 'mass after'), { tag: 'id-not-a-name', text: 'mass after' }],
    ['a constant without value', (d) => (d.constants[0]!.value = ''), { path: 'constants.0.value', tag: 'needed' }],
    ['a formula of nothing', (d) => (d.measurands[0]!.formula = ' '), { tag: 'formula-empty' }],
    ['no measurand', (d) => (d.measurands = []), { tag: 'no-measurand' }],
    ['a target without value', (d) => (d.measurands[0]!.direction = 'target'), { tag: 'needed' }],
    ['α of 5', (d) => (d.primary.alpha = '5'), { path: 'primary.alpha', tag: 'alpha-out-of-range' }],
    ['a control comparison with no control', (d) => (d.primary.comparison = 'to-control'), { tag: 'control-needed' }]
  ])('stops at %s', (_, change, fault) => {
    expect(faultsOf(change)).toContainEqual(expect.objectContaining({ weight: 'stop', ...fault }));
  });

  test('an empty draft is far from complete and never throws', () => {
    const { complete, faults } = readDraft(newDraft({ precautions: [], ruinReasons: [] }));
    expect(complete).toBe(false);
    expect(faults.map(({ tag }) => tag)).toEqual(['title-empty', 'treatments-too-few', 'name-empty']);
  });
});
