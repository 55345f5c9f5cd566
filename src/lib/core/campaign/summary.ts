import type { CampaignState } from './state.ts';

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

/** The summary of a campaign as this device sees it. Cost: the number of readings. */
export function summaryOf(state: CampaignState, device: string): CampaignSummary {
  const sessions = state.sessions.filter(({ status }) => status !== 'dropped');
  const runs = sessions.flatMap((session) => session.runs);
  return {
    id: state.id,
    title: state.title,
    demo: state.demo,
    createdAt: state.created?.at ?? null,
    issued: state.issued !== null,
    sessions: sessions.length,
    sessionsClosed: sessions.filter(({ status }) => status === 'closed').length,
    runs: runs.length,
    runsDone: runs.filter(
      (run) => run.ruined !== null || run.readings.every((r) => r.current !== null || r.missing !== null)
    ).length,
    events: state.events,
    notExported: state.devices.find((one) => one.device === device)?.sinceExport ?? 0,
    undecided: state.contradictions.filter(({ decided }) => decided === null).length
  };
}
