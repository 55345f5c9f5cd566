import { expect, it } from 'vitest';
import { checkLoad } from '#lib/core/campaign/checks/check-load.ts';
import { campaign, loadedRun, mark, run, session } from '../wall-paint.ts';

const state = campaign([
  session(1, [loadedRun('s1', 0, 'A-1'), loadedRun('s1', 1, 'B-1')], { status: 'closed' }),
  session(2, [run('s2', 0, 'C-1'), run('s2', 1, 'D-1')], { status: 'loading', precautions: mark }),
  session(3, [run('s3', 0, 'A-2'), run('s3', 1, 'C-2')])
]);
const wellFormed = (code: string) => code.endsWith('1');
const verdict = (code: string, slot = 0) => checkLoad(state, 's2', slot, code, wellFormed);

it('checkLoad(planned code) is as planned, whatever the case, spaces and hyphens', () => {
  expect(verdict('C-1')).toEqual({ kind: 'as-planned', code: 'C-1' });
  expect(verdict(' c1')).toEqual({ kind: 'as-planned', code: 'C-1' });
});

it('checkLoad(code of the other slot) says which slot', () => {
  expect(verdict('D-1')).toEqual({ kind: 'other-slot', code: 'D-1', place: { session: 's2', number: 2, slot: 1 } });
});

it('checkLoad(code of another session) says which session and slot', () => {
  expect(verdict('A-2')).toMatchObject({ kind: 'other-session', place: { number: 3, slot: 0 } });
});

it('checkLoad(code used before) refuses and says where it was', () => {
  expect(verdict('B-1')).toMatchObject({ kind: 'used', place: { number: 1, slot: 1 } });
});

it('checkLoad(code of a run that a spare has followed) is used as well', () => {
  const followed = loadedRun('s1', 0, 'A-3', { earlier: [loadedRun('s1', 0, 'A-1')] });
  const later = campaign([session(1, [followed]), session(2, [run('s2', 0, 'C-1')])]);
  expect(checkLoad(later, 's2', 0, 'A-1', wellFormed)).toMatchObject({ kind: 'used' });
});

it('checkLoad(code already in this slot) says so', () => {
  expect(checkLoad(state, 's1', 1, 'B-1', wellFormed)).toEqual({ kind: 'already-here', code: 'B-1' });
});

it('checkLoad(spare) says whether it is of the treatment planned here', () => {
  expect(verdict('A-9')).toEqual({ kind: 'spare', code: 'A-9', treatment: 'a', fits: false });
  expect(checkLoad(state, 's3', 0, 'A-9', wellFormed)).toMatchObject({ kind: 'spare', fits: true });
});

it('checkLoad(code with a wrong check character) is misread, not unknown', () => {
  expect(verdict('X-2')).toEqual({ kind: 'misread', code: 'X2' });
  expect(verdict('X-1')).toEqual({ kind: 'unknown', code: 'X1' });
});
