import { expect, it } from 'vitest';
import { repeatSession } from '#lib/core/campaign/steps/repeat-session.ts';
import { unusedSpares } from '#lib/core/campaign/steps/unused-spares.ts';
import { campaign, loadedRun, run, session } from '../wall-paint.ts';

const spares = ['A-8', 'A-9', 'B-9', 'C-9'].map((specimen) => ({
  treatment: specimen.charAt(0).toLowerCase(),
  specimen
}));
function withSpares(...sessions: Parameters<typeof campaign>[0]) {
  const state = campaign(sessions);
  if (!state.issued) throw new Error('the campaign is issued');
  return { ...state, issued: { ...state.issued, spares } };
}
const first = session(1, [loadedRun('s1', 0, 'A-1'), loadedRun('s1', 1, 'B-1')]);

it('unusedSpares(state, treatment) leaves out what was loaded and what is planned', () => {
  expect(unusedSpares(withSpares(first), 'a')).toEqual(['A-8', 'A-9']);
  const loaded = session(2, [loadedRun('s2', 0, 'A-8')]);
  expect(unusedSpares(withSpares(first, loaded), 'a')).toEqual(['A-9']);
  expect(unusedSpares(withSpares(first, session(2, [run('s2', 0, 'A-8')])), 'a')).toEqual(['A-9']);
});

it('unusedSpares(state, treatment) gives back what a dropped session was planned with', () => {
  const dropped = session(2, [run('s2', 0, 'A-8')], { status: 'dropped' });
  expect(unusedSpares(withSpares(first, dropped), 'a')).toEqual(['A-8', 'A-9']);
});

it('repeatSession(state, source, treatments) takes a spare for every slot and comes last', () => {
  expect(repeatSession(withSpares(first), 's1', ['a', 'b'], 'r1')).toEqual({
    id: 'r1',
    number: 2,
    shift: 1,
    machine: 'm',
    slots: [
      { treatment: 'a', specimen: 'A-8' },
      { treatment: 'b', specimen: 'B-9' }
    ],
    repeats: 's1'
  });
});

it('repeatSession(state, source, treatments) takes two spares for a treatment that comes twice', () => {
  const made = repeatSession(withSpares(first), 's1', ['a', 'a'], 'r1');
  expect(made?.slots.map((slot) => slot?.specimen)).toEqual(['A-8', 'A-9']);
});

it('repeatSession(state, source, treatments) is null when only one treatment has a spare', () => {
  expect(repeatSession(withSpares(first), 's1', ['a', 'd'], 'r1')).toBeNull();
});
