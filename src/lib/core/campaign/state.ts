import type { CampaignEvent, DataOf, UnknownEvent } from './event.ts';
import type { IssuedPlan, Plan, PlannedSession } from './plan.ts';

/** Who did it, when, and by which event. */
export interface Mark {
  event: string;
  at: string;
  who: string;
  device: string;
}

/** One version of a reading: the first as recorded, then corrections; all are kept. */
export interface ReadingVersion extends Mark {
  raw: string;
  value: number;
  limit: 'none' | 'at-least' | 'at-most';
  source: DataOf<'reading-recorded'>['source'];
  readAt: string | null;
  raised: DataOf<'reading-recorded'>['raised'];
  /** Why a warned value was kept, or why a correction was made. */
  because: string | null;
}

export interface ReadingState {
  reading: string;
  repeat: number;
  /** What counts now; null when nothing is recorded or two devices contradict each other. */
  current: ReadingVersion | null;
  /** All versions in order of time, undone ones too. */
  versions: (ReadingVersion & { undone: boolean })[];
  /** Said to be missing, with the reason. */
  missing: (Mark & { reason: string }) | null;
  /** Key of the contradiction that must be decided first; null when there is none. */
  contradiction: string | null;
}

export interface NoteState extends Mark {
  about: DataOf<'noted'>['about'];
  session: string | null;
  slot: number | null;
  text: string;
}

export interface Ruin extends Mark {
  reason: string;
  whole: boolean;
  next: DataOf<'ruined'>['next'];
}

/** One specimen in one slot in one session. */
export interface RunState {
  /** `session/slot`; an earlier run of the slot adds `/specimen` */
  id: string;
  session: string;
  slot: number;
  /** As issued. */
  planned: { treatment: string; specimen: string };
  /** What really is in the slot; null until loaded. */
  loaded:
    (Mark & { treatment: string; specimen: string; how: 'tap' | 'scan' | 'typed'; because: string | null }) | null;
  /** Treatment the analysis uses: of the loaded specimen, else of the planned one; '' when nobody knows, or must decide first. */
  treatment: string;
  specimen: string;
  readings: ReadingState[];
  ruined: Ruin | null;
  /** Every ruin and reinstatement ever. */
  ruinHistory: (Ruin & { reinstated: (Mark & { reason: string }) | null })[];
  notes: NoteState[];
  /** Ruined runs of this slot in this session that a spare specimen has followed; oldest first, mostly empty. */
  earlier: RunState[];
}

export interface ConditionValue extends Mark {
  condition: string;
  raw: string;
  value: number | null;
  raised: DataOf<'reading-recorded'>['raised'];
  because: string | null;
}

export interface SessionState {
  id: string;
  plan: PlannedSession;
  status: 'waiting' | 'loading' | 'running' | 'reading' | 'closed' | 'dropped';
  precautions: Mark | null;
  started: (Mark & { seconds: number | null }) | null;
  stopped: (Mark & { early: string | null }) | null;
  closed: Mark | null;
  /** Runs in slot order; empty or out-of-service slots are absent. */
  runs: RunState[];
  ruined: Ruin | null;
  conditions: ConditionValue[];
  notes: NoteState[];
}

export interface ShiftState {
  shift: number;
  operator: string;
  opened: Mark;
  closed: (Mark & { handOver: string }) | null;
}

/** Two things that cannot both be true; shown side by side until a person decides. */
export interface Contradiction {
  /** Stable name: kind and place. */
  key: string;
  kind: 'two-values' | 'two-specimens' | 'specimen-twice' | 'two-plans' | 'two-ruins';
  session: string | null;
  slot: number | null;
  reading: string | null;
  /** The events that contradict, oldest first. */
  events: CampaignEvent[];
  decided: (Mark & { chosen: string; reason: string }) | null;
  /** Every decision taken about it, oldest first; a later value opens the question again. */
  decisions: (Mark & { chosen: string; reason: string })[];
}

/** Something about the record itself that a person should know. */
export interface RecordFlag {
  kind:
    | 'clock-jumped'
    | 'gap'
    | 'fork'
    | 'altered'
    | 'not-understood'
    | 'device-fault'
    /** Speaks of a session, slot or event that the record does not hold (yet). */
    | 'orphan'
    /** A specimen code that no plan gave. */
    | 'unknown-specimen';
  device: string;
  event: string | null;
  detail: string;
}

export interface DeviceState {
  device: string;
  /** Highest sequence number held. */
  seq: number;
  /** Hash of that event. */
  head: string;
  /** Events recorded since the last verified export of this device. */
  sinceExport: number;
  lastExport: (Mark & { events: number; sha256: string; how: string }) | null;
}

/** The state of a campaign: a pure function of the set of its events. */
export interface CampaignState {
  id: string;
  title: string;
  demo: boolean;
  created: Mark | null;
  /** As it stands now: as issued, with amendments applied; null before the issue. */
  issued: IssuedPlan | null;
  plan: Plan | null;
  issuedBy: Mark | null;
  amendments: (Mark & DataOf<'plan-amended'>)[];
  /** In loading order. */
  sessions: SessionState[];
  shifts: ShiftState[];
  /** About the campaign or a shift; the others stand with their session or run. */
  notes: NoteState[];
  contradictions: Contradiction[];
  flags: RecordFlag[];
  notUnderstood: UnknownEvent[];
  devices: DeviceState[];
  /** How many events the replay saw. */
  events: number;
}
