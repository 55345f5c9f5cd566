import { describe, expect, test } from 'vitest';
import type { Measurand, ReadingDefinition } from '#lib/core/campaign/plan.ts';
import { compileMeasurand } from '#lib/formula/compile-measurand.ts';

const open = { min: null, max: null };
const reading = (id: string, unit: string): ReadingDefinition => ({
  id,
  label: id,
  unit,
  decimals: 3,
  possible: open,
  expected: open,
  when: { kind: 'after' },
  repeats: 1,
  resolution: null,
  mayStopAtLimit: false
});
const measurand = (id: string, unit: string, formula: string | null): Measurand => ({
  id,
  label: id,
  unit,
  decimals: 2,
  formula,
  direction: { kind: 'lower' },
  kind: 'number',
  possible: open,
  expected: open,
  scatter: null,
  difference: null,
  equivalenceMargin: null
});
const evaluated = async (asked: Measurand, readings: ReadingDefinition[], values: Record<string, number | null>) => {
  const compiled = await compileMeasurand(asked, { readings, constants: [] });
  if (!compiled.ok) throw new Error(compiled.error.tag);
  return compiled.value.evaluate(values);
};

describe('compileMeasurand(measurand, context)', () => {
  test('takes the reading of its own id where there is no formula', async () => {
    expect(await evaluated(measurand('gloss', 'GU', null), [reading('gloss', 'GU')], { gloss: 41.5 })).toEqual({
      ok: true,
      value: 41.5
    });
  });

  test('converts where the reading has another unit than the measurand', async () => {
    expect(await evaluated(measurand('loss', 'mg', null), [reading('loss', 'g')], { loss: 0.25 })).toEqual({
      ok: true,
      value: 250
    });
  });

  test('says that a reading is missing, in the plan and in the run', async () => {
    expect(await compileMeasurand(measurand('gloss', '', null), { readings: [], constants: [] })).toEqual({
      ok: false,
      error: { tag: 'formula-missing-reading', name: 'gloss' }
    });
    expect(await evaluated(measurand('gloss', '', null), [reading('gloss', '')], {})).toEqual({
      ok: false,
      error: { tag: 'value-missing', name: 'gloss' }
    });
  });

  test('evaluates a formula of readings and constants', async () => {
    const compiled = await compileMeasurand(measurand('loss', 'mg', '(before - after) / runs'), {
      readings: [reading('before', 'g'), reading('after', 'g')],
      constants: [{ id: 'runs', label: 'Runs', value: 2, unit: '' }]
    });
    expect(compiled.ok && compiled.value.evaluate({ before: 12, after: 11 })).toEqual({ ok: true, value: 500 });
  });
});
