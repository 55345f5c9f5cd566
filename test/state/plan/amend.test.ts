import { describe, expect, test } from 'vitest';
import { checkCode } from '#lib/core/design/specimen-codes.ts';
import { extraSession, repeatOf } from '#lib/state/plan/amend.ts';
import { campaign, loadedRun, session } from '../../core/campaign/wall-paint.ts';

const state = () => campaign([session(1, [loadedRun('s1', 0, 'A-1'), loadedRun('s1', 1, 'B-1')]), session(2, [])]);

describe('repeatOf(state, session, withSpares, seed)', () => {
  test('runs the same treatments in the same slots, last in the loading order', () => {
    const repeated = repeatOf(state(), 's1', false, 'seed');
    expect(repeated).toMatchObject({ id: 's3', number: 3, repeats: 's1', machine: 'm' });
    expect(repeated?.slots.map((slot) => slot?.treatment)).toEqual(['a', 'b']);
  });

  test('takes a spare specimen where there is one and draws a sound new code where there is none', () => {
    const [a, b] = repeatOf(state(), 's1', true, 'seed')?.slots ?? [];
    expect(a?.specimen).toBe('A-9');
    expect(checkCode(b?.specimen ?? '').tag).toBe('good');
  });

  test('never gives out a code that is in use', () => {
    const before = state();
    const first = repeatOf(before, 's1', false, 'same seed');
    if (!first) throw new Error('nothing to repeat');
    const after = campaign([...before.sessions, { ...session(3, []), plan: first }]);
    const second = repeatOf(after, 's1', false, 'same seed');
    const codes = [...first.slots, ...(second?.slots ?? [])].map((slot) => slot?.specimen);
    expect(new Set(codes).size).toBe(4);
  });

  test('repeats nothing that is not there', () => {
    expect(repeatOf(state(), 's9', true, 'seed')).toBeNull();
  });
});

describe('extraSession(state, treatments, seed)', () => {
  test('puts every treatment once into a slot in service, spare specimens first, last in the loading order', () => {
    const added = extraSession(state(), ['a', 'c'], 'seed');
    expect(added).toMatchObject({ id: 's3', number: 3, repeats: null, machine: 'm' });
    expect(added?.slots.map((slot) => slot?.treatment).sort()).toEqual(['a', 'c']);
    expect(added?.slots.find((slot) => slot?.treatment === 'a')?.specimen).toBe('A-9');
    expect(added).toEqual(extraSession(state(), ['a', 'c'], 'seed'));
  });

  test('leaves no treatment out silently: null where no machine has slots for all', () => {
    expect(extraSession(state(), ['a', 'b', 'c'], 'seed')).toBeNull();
  });
});
