import { describe, expect, test } from 'vitest';
import type { Observations } from '#lib/core/analysis/observations.ts';
import type { CampaignState } from '#lib/core/campaign/state.ts';
import { planRepair } from '#lib/core/design/repair/plan-repair.ts';
import { repairFacts, repairQuestion } from '#lib/state/repair-facts.ts';
import { campaign, loadedRun, session, wallPaintPlan } from '../core/campaign/wall-paint.ts';

/** A ring of pairs over t treatments, all sessions closed; every kept run has the value 1. */
function ring(t: number, lost: (session: number, slot: number) => boolean): [CampaignState, Observations] {
  const ids = Array.from({ length: t }, (_, i) => `t${i}`);
  const sessions = ids.map((_, j) => {
    const one = session(j + 1, [loadedRun(`s${j + 1}`, 0, `A-${j}`), loadedRun(`s${j + 1}`, 1, `B-${j}`)]);
    const slots = [j, (j + 1) % t].map((i, slot) => ({ treatment: `t${i}`, specimen: `${j}-${slot}` }));
    return { ...one, status: 'closed' as const, plan: { ...one.plan, slots } };
  });
  const treatments = ids.map((id) => ({ id, name: id, specimens: null, control: false, note: '' }));
  const state = campaign(sessions, { plan: { ...wallPaintPlan, treatments } });
  const rows = ids.flatMap((_, j) =>
    [j, (j + 1) % t].map((treatment, slot) => ({
      treatment,
      session: j,
      slot,
      y: 1,
      ruined: lost(j, slot),
      limit: 'none' as const,
      runId: `${j}/${slot}`
    }))
  );
  const input = {
    treatments: treatments.map(({ id, name }) => ({ id, name })),
    sessions: sessions.map(({ id }) => ({ id, name: id, shift: '1', machine: 'm' })),
    rows
  } as unknown as Observations;
  return [state, input];
}

describe('repairQuestion(state, input)', () => {
  test('asks nothing when every closed run counts', () => {
    expect(repairQuestion(...ring(6, () => false))).toBeNull();
  });

  test('asks about the loss of a campaign of any size', () => {
    const question = repairQuestion(...ring(150, (s, slot) => s === 4 && slot === 0));
    expect(question?.lostRuns).toBe(1);
    expect(question?.request.kept[4]).toEqual([5]);
    expect(question?.request.treatments).toBe(150);
  });
});

describe('repairFacts(question, report, sigma, treatments)', () => {
  test('gives standard errors in units of the measurand, and names the pairs that lost most', () => {
    const [state, input] = ring(6, (s, slot) => s === 0 && slot === 0);
    const question = repairQuestion(state, input);
    if (!question) throw new Error('something is lost');
    const facts = repairFacts(question, planRepair(question.request), 2, input.treatments.map(({ id }) => id)); // prettier-ignore
    // Neighbours in a ring of six pairs: resistance 2·(1·5)/6 between them, 2·5 once the ring is cut between them.
    expect(facts.hit[0]).toMatchObject({ a: 't0', b: 't1' });
    expect(facts.hit[0]?.planned).toBeCloseTo(2 * Math.sqrt(5 / 3), 9);
    expect(facts.hit[0]?.now).toBeCloseTo(2 * Math.sqrt(10), 9);
    expect(facts.ways.map(({ kind }) => kind)).toEqual(['extra', 'rerun', 'leave']);
    expect(facts.ways.find(({ kind }) => kind === 'rerun')?.session).toBe('s1');
  });

  test('gives no figure without an estimate of scatter', () => {
    const [state, input] = ring(4, (s) => s === 0);
    const question = repairQuestion(state, input);
    if (!question) throw new Error('something is lost');
    const facts = repairFacts(question, planRepair(question.request), null, ['t0', 't1', 't2', 't3']);
    expect(facts.now).toBeNull();
    expect(facts.ways.every(({ seAfter }) => seAfter === null)).toBe(true);
  });
});
