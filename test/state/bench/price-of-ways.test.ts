import { expect, it } from 'vitest';
import { priceOfWays } from '#lib/state/bench/price-of-ways.ts';
import type { CampaignState, RunState } from '#lib/core/campaign/state.ts';
import { campaign, mark, run, session } from '../../core/campaign/wall-paint.ts';

const ruined = { ...mark, reason: 'Panel slipped', whole: false, next: null };

/** All pairs of four paints: t 4, k 2, b 6, r 3, λ 1. Its A-value is 2k/(λt) = 1. */
const pairs = ['AB', 'CD', 'AC', 'BD', 'AD', 'BC'];
function allPairs(change: (code: string) => Partial<RunState>, spares: string[] = []): CampaignState {
  const made = pairs.map((pair, i) =>
    session(
      i + 1,
      [...pair].map((letter, slot) => run(`s${i + 1}`, slot, `${letter}-${i + 1}`, change(`${letter}-${i + 1}`)))
    )
  );
  const state = campaign(made);
  if (!state.issued) throw new Error('issued');
  const listed = spares.map((specimen) => ({ treatment: specimen.charAt(0).toLowerCase(), specimen }));
  return { ...state, issued: { ...state.issued, spares: listed } };
}
const oneRuined = (spares: string[] = []) => allPairs((code) => (code === 'A-1' ? { ruined } : {}), spares);

it('priceOfWays(state) finds the plan itself at no price: a spare now restores it', () => {
  // Var(τ̂_i − τ̂_i′) = 2kσ²/(λt) = 1 for the balanced design (Cochran & Cox 1957, section 11.1a).
  const { spareNow } = priceOfWays(oneRuined(['A-9']), 's1', 0);
  expect(spareNow?.standardError).toBeCloseTo(1, 12);
  expect(spareNow?.more).toBeCloseTo(0, 12);
});

it('priceOfWays(state) prices leaving out as the design without that session, for a run alone compares nothing', () => {
  // Without the session AB the design is the cycle A–C–B–D–A with the chord CD: resistances of that graph by hand,
  // each edge 2σ²: AB 2, CD 1, the other four pairs 1.25; mean (2 + 1 + 4 · 1.25) / 6 = 4/3.
  const { leaveOut } = priceOfWays(oneRuined(), 's1', 0);
  expect(leaveOut?.standardError).toBeCloseTo(Math.sqrt(4 / 3), 12);
  expect(leaveOut?.more).toBeCloseTo(Math.sqrt(4 / 3) - 1, 12);
});

it('priceOfWays(state) proposes the pair that was lost for later when there are specimens', () => {
  const { later } = priceOfWays(oneRuined(['A-9', 'B-9', 'C-9', 'D-9']), 's1', 0);
  expect(later?.treatments).toEqual(['a', 'b']);
  expect(later?.price?.more).toBeCloseTo(0, 12);
});

it('priceOfWays(state) proposes nothing for later without two spares', () => {
  expect(priceOfWays(oneRuined(['A-9']), 's1', 0).later).toBeNull();
});

it('priceOfWays(state) says null where leaving out loses a comparison', () => {
  const lost = allPairs((code) => (code.startsWith('A') ? { ruined } : {}));
  expect(priceOfWays(lost, 's1', 0).leaveOut).toBeNull();
});

it('priceOfWays(state, session, null) repeats the same treatments for a whole session', () => {
  const whole = allPairs((code) => (code.endsWith('1') ? { ruined: { ...ruined, whole: true } } : {}), ['A-9', 'B-9']);
  expect(priceOfWays(whole, 's1', null)).toMatchObject({ spareNow: null, later: { treatments: ['a', 'b'] } });
});
