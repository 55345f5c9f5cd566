import type { CampaignEvent, UnknownEvent } from './event.ts';
import type { Of } from './marks.ts';
import type { Speaking } from './spoken-of.ts';
import type { Contradiction, DeviceState, ReadingState, RecordFlag, RunState, SessionState } from './state.ts';
import type { RunTally } from './summary.ts';

type Any = CampaignEvent | UnknownEvent;

/** To be raised whenever the same events come to another state, or a checkpoint to another form. */
export const replayVersion = 1;

/** A device's chain as far as it has been read. */
export interface DeviceCheckpoint {
  state: DeviceState;
  flags: readonly RecordFlag[];
  /** The events at the end of the chain; more than one after a fork. */
  tail: Any[];
}

/**
 * What a replay knows but for the single sessions, as plain values. With each session's part it goes on where it was
 * taken, without the log. It can be made again from the log at any time and is worth nothing without it.
 */
export interface CoreCheckpoint {
  campaign: string;
  events: number;
  tick: number;
  devices: DeviceCheckpoint[];
  overall: CampaignEvent[];
  planning: CampaignEvent[];
  unknown: UnknownEvent[];
  speaking: Speaking[];
  /** Events that something speaks of and that are not here. */
  absent: string[];
  /** Events of sessions that no plan names. */
  nowhere: CampaignEvent[];
  twice: [string, Contradiction][];
  aside: string[];
  doubtful: string[];
}

/** One session's part: what is needed at once, its runs, and the events they come from. Each is read only when needed. */
export interface SessionCheckpoint {
  head: SessionHead;
  /** JSON of the runs, packed by `packRuns`. */
  runs: string;
  events: readonly CampaignEvent[];
}

export interface SessionHead {
  state: Omit<SessionState, 'runs' | 'plan'>;
  tally: RunTally;
  contradictions: Contradiction[];
  strangers: Of<'specimen-loaded'>[];
  /** Specimen codes that any load of the session names. */
  codes: string[];
}

/** Most of a campaign's state is its readings, and most readings have one version that counts: it is kept once. */
export const packRuns = (runs: readonly RunState[]): string => JSON.stringify(runs.map(packed));

export const unpackRuns = (text: string): RunState[] => (JSON.parse(text) as PackedRun[]).map(unpacked);

type PackedReading = Omit<ReadingState, 'current'> & { current: number };
type PackedRun = Omit<RunState, 'readings' | 'earlier'> & { readings: PackedReading[]; earlier: PackedRun[] };

const packed = (run: RunState): PackedRun => ({
  ...run,
  readings: run.readings.map((one) => ({
    ...one,
    current: one.versions.findIndex(({ event }) => event === one.current?.event)
  })),
  earlier: run.earlier.map(packed)
});

function unpacked(run: PackedRun): RunState {
  const readings = run.readings as (PackedReading | ReadingState)[];
  for (const one of readings) one.current = one.versions[one.current as number] ?? null;
  return { ...run, readings: readings as ReadingState[], earlier: run.earlier.map(unpacked) };
}
