import type { CampaignState, RunState, SessionState } from '../state.ts';

/** Where a specimen is planned, or was loaded. */
export interface Place {
  session: string;
  number: number;
  slot: number;
}

/** What a specimen code means for the slot it is put into. */
export type LoadVerdict =
  | { kind: 'as-planned'; code: string }
  | { kind: 'already-here'; code: string }
  /** Belongs in another slot of this session. */
  | { kind: 'other-slot'; code: string; place: Place }
  /** Belongs in another session. */
  | { kind: 'other-session'; code: string; place: Place }
  /** A spare of the treatment that is planned here, or of another one. */
  | { kind: 'spare'; code: string; treatment: string; fits: boolean }
  /** Was loaded before: refused, one specimen is one piece. */
  | { kind: 'used'; code: string; place: Place }
  /** The check character is wrong: a slip of the finger or a damaged label. */
  | { kind: 'misread'; code: string }
  /** A well-formed code of no specimen of this campaign. */
  | { kind: 'unknown'; code: string };

/** A code as compared: capitals, no spaces or hyphens. */
export const plainCode = (code: string) => code.toUpperCase().replace(/[\s\u2010-\u2013-]/gu, '');

/**
 * Returns what a specimen code means for one slot of one session. Knows the whole campaign: a specimen planned elsewhere
 * is sent there, one that was loaded before is refused, a code with a wrong check character is called misread before anything
 * else is said about it.
 *
 * @param state the campaign as it stands
 * @param session id of the session being loaded
 * @param slot 0-based slot the specimen is put into
 * @param typed the code as tapped, scanned or typed
 * @param isWellFormed tells whether the check character is right
 * Checked by: test/core/campaign/checks/check-load.test.ts
 */
export function checkLoad(
  state: CampaignState,
  session: string,
  slot: number,
  typed: string,
  isWellFormed: (code: string) => boolean
): LoadVerdict {
  const wanted = plainCode(typed);
  const same = (code: string | undefined) => code !== undefined && plainCode(code) === wanted;
  const runs = state.sessions.flatMap((s) =>
    s.runs.flatMap((run) => [run, ...run.earlier].map((one) => ({ s, run: one })))
  );

  const loaded = runs.find(({ run }) => same(run.loaded?.specimen));
  if (loaded) {
    const code = loaded.run.loaded?.specimen ?? wanted;
    const here = loaded.s.id === session && loaded.run.slot === slot;
    return here ? { kind: 'already-here', code } : { kind: 'used', code, place: placeOf(loaded.s, loaded.run) };
  }
  const open = runs.filter(({ s, run }) => s.status !== 'dropped' && same(run.planned.specimen));
  const planned = open.find(({ s }) => s.id === session) ?? open[0];
  if (planned) {
    const code = planned.run.planned.specimen;
    if (planned.s.id !== session) return { kind: 'other-session', code, place: placeOf(planned.s, planned.run) };
    if (planned.run.slot !== slot) return { kind: 'other-slot', code, place: placeOf(planned.s, planned.run) };
    return { kind: 'as-planned', code };
  }
  const spare = state.issued?.spares.find(({ specimen }) => same(specimen));
  if (spare) {
    const here = runs.find(({ s, run }) => s.id === session && run.slot === slot);
    const fits = here?.run.planned.treatment === spare.treatment;
    return { kind: 'spare', code: spare.specimen, treatment: spare.treatment, fits };
  }
  return isWellFormed(wanted) ? { kind: 'unknown', code: wanted } : { kind: 'misread', code: wanted };
}

const placeOf = (session: SessionState, run: RunState): Place => ({
  session: session.id,
  number: session.plan.number,
  slot: run.slot
});
