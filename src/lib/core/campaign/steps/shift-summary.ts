import type { CampaignState, NoteState, RunState, SessionState, ShiftState } from '../state.ts';

export interface ShiftSummary {
  shift: number;
  state: ShiftState | null;
  closed: SessionState[];
  /** Begun and not closed, or of this shift and not begun. */
  open: SessionState[];
  /** Readings kept after a check spoke. */
  flagged: { session: SessionState; run: RunState; reading: string; said: string; because: string | null }[];
  ruined: { session: SessionState; run: RunState | null; reason: string }[];
  missing: { session: SessionState; run: RunState; reading: string; reason: string | null }[];
  notes: NoteState[];
  /** Everybody who recorded something in its sessions. */
  who: string[];
}

/** The shift to be ended: the last that was opened and not closed, else that of the last session worked on, else the first. */
export function shiftAtHand(state: CampaignState): number {
  const open = state.shifts.filter(({ closed }) => closed === null).at(-1);
  if (open) return open.shift;
  const worked = state.sessions.filter(({ status }) => status !== 'waiting' && status !== 'dropped').at(-1);
  return worked?.plan.shift ?? state.sessions[0]?.plan.shift ?? 1;
}

/**
 * Returns what there is to say at the end of a shift: sessions done and open, readings kept after a warning, what was ruined or is
 * missing, notes, and by whom.
 * Checked by: test/core/campaign/steps/shift-summary.test.ts
 */
export function shiftSummary(state: CampaignState, shift: number): ShiftSummary {
  const sessions = state.sessions.filter(({ plan, status }) => plan.shift === shift && status !== 'dropped');
  const runs = sessions.flatMap((session) =>
    session.runs.flatMap((run) => [...run.earlier, run]).map((run) => ({ session, run }))
  );
  const readings = runs.flatMap(({ session, run }) => run.readings.map((reading) => ({ session, run, reading })));
  const shiftState = state.shifts.filter((one) => one.shift === shift).at(-1) ?? null;
  return {
    shift,
    state: shiftState,
    closed: sessions.filter(({ status }) => status === 'closed'),
    open: sessions.filter(({ status }) => status !== 'closed'),
    flagged: readings.flatMap(({ session, run, reading }) =>
      (reading.current?.raised ?? []).map(({ said }) => ({
        session,
        run,
        reading: reading.reading,
        said,
        because: reading.current?.because ?? null
      }))
    ),
    ruined: [
      ...sessions.flatMap((session) => (session.ruined ? [{ session, run: null, reason: session.ruined.reason }] : [])),
      ...runs.flatMap(({ session, run }) =>
        run.ruined && !session.ruined ? [{ session, run, reason: run.ruined.reason }] : []
      )
    ],
    missing: readings.flatMap(({ session, run, reading }) =>
      session.status === 'closed' && reading.current === null && run.ruined === null
        ? [{ session, run, reading: reading.reading, reason: reading.missing?.reason ?? null }]
        : []
    ),
    notes: [
      ...state.notes.filter(({ about }) => about === 'shift'),
      ...sessions.flatMap(({ notes }) => notes),
      ...runs.flatMap(({ run }) => run.notes)
    ],
    who: [...new Set(readings.flatMap(({ reading }) => (reading.current ? [reading.current.who] : [])))]
  };
}
