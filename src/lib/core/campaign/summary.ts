import type { CampaignState, SessionState } from './state.ts';

/** What a list of campaigns shows of one; derived from the state and written with every event. */
export interface CampaignSummary {
  id: string;
  title: string;
  demo: boolean;
  /** RFC 3339 time of the first event; null in an empty campaign. */
  createdAt: string | null;
  issued: boolean;
  sessions: number;
  sessionsClosed: number;
  runs: number;
  /** Runs whose readings are all in, said to be missing, or that are ruined. */
  runsDone: number;
  events: number;
  /** Events of this device that no verified file holds yet. */
  notExported: number;
  /** Contradictions nobody has decided. */
  undecided: number;
}

/** How many runs a session has and how many of them are done. */
export interface RunTally {
  runs: number;
  done: number;
}

/** A session's state does not change once it is made; it is counted once. */
const tallies = new WeakMap<SessionState, RunTally>();

export function tallyOf(session: SessionState): RunTally {
  let tally = tallies.get(session);
  if (!tally) {
    const done = session.runs.filter(
      (run) => run.ruined !== null || run.readings.every((r) => r.current !== null || r.missing !== null)
    ).length;
    tallies.set(session, (tally = { runs: session.runs.length, done }));
  }
  return tally;
}

/** Says how a session whose runs have not been looked at counts. */
export const rememberTally = (session: SessionState, tally: RunTally): void => void tallies.set(session, tally);

/** The summary of a campaign as this device sees it. Cost: the number of sessions, and the readings of those that are new. */
export function summaryOf(state: CampaignState, device: string): CampaignSummary {
  let [sessions, closed, runs, runsDone] = [0, 0, 0, 0];
  for (const session of state.sessions) {
    if (session.status === 'dropped') continue;
    const tally = tallyOf(session);
    sessions++;
    if (session.status === 'closed') closed++;
    runs += tally.runs;
    runsDone += tally.done;
  }
  return {
    id: state.id,
    title: state.title,
    demo: state.demo,
    createdAt: state.created?.at ?? null,
    issued: state.issued !== null,
    sessions,
    sessionsClosed: closed,
    runs,
    runsDone,
    events: state.events,
    notExported: state.devices.find((one) => one.device === device)?.sinceExport ?? 0,
    undecided: state.contradictions.filter(({ decided }) => decided === null).length
  };
}
