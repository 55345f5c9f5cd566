/** What the bench screen shows; made from the campaign by the state, words and numbers written out. */

export type Shape =
  'down' | 'standing' | 'point' | 'later' | 'dots' | 'check' | 'diamond' | 'gap' | 'cross' | 'off' | 'pair' | 'note';

export interface ValueView {
  key: string;
  label: string;
  /** Written out; null while there is none. */
  text: string | null;
  unit: string;
  mark: 'saved' | 'kept' | 'missing' | 'writing' | 'due' | 'later' | 'contradiction';
}

export type SlotCondition = 'toLoad' | 'loaded' | 'due' | 'writing' | 'saved' | 'kept' | 'missing' | 'ruined' | 'out';

export interface SlotView {
  slot: number;
  name: string;
  /** Null: nothing is planned here or the slot is out of service. */
  code: string | null;
  /** Only when the plan is open. */
  treatment: string | null;
  condition: SlotCondition;
  /** Stands on the beam. */
  loaded: boolean;
  /** The one the sentence speaks of. */
  focus: boolean;
  values: ValueView[];
  ruined: string | null;
  notes: number;
}

export interface MachineView {
  name: string;
  layout: { kind: 'row' } | { kind: 'ring' } | { kind: 'grid'; columns: number };
  slots: SlotView[];
  /** How far the run is, 0 to 1; null when nothing runs or no end is planned. */
  progress: number | null;
}

export interface ConditionView {
  id: string;
  label: string;
  unit: string;
  numeric: boolean;
  text: string;
  /** The text is that of the session before and waits to be confirmed. */
  suggested: boolean;
  window: string;
  /** The text is no number. */
  problem: string | null;
  /** Outside its window, in words. */
  said: string | null;
  because: string;
}

/** What a code means that is not the planned specimen of the slot, with the ways on. */
export interface LoadWarningView {
  code: string;
  said: string[];
  /** Belongs into another slot of this session: one tap puts it there. */
  putThere: { slot: number; name: string } | null;
  /** Recorded in another slot of this session, but really here. */
  moveHere: boolean;
  /** May be recorded as really loaded, with a reason. */
  really: boolean;
  /** Fits the slot as a spare: no reason but "spare" is needed. */
  spare: boolean;
}

/** A computed quantity of a run: written out, or why there is none; neither while it is being computed. */
export interface RunResultView {
  measurand: string;
  label: string;
  text: string | null;
  why: string | null;
}

export interface CheckRowView {
  slot: number;
  name: string;
  code: string;
  ruined: string | null;
  values: ValueView[];
  /** What the run comes to. */
  results: RunResultView[];
  flagged: string[];
}

/** A way on after ruin, with its price in precision. */
export interface WayOnView {
  way: 'repeat-later' | 'spare-now' | 'leave-out';
  title: string;
  says: string;
  /** Null while it is being reckoned. */
  price: string | null;
  possible: boolean;
}

export interface QueueRowView {
  id: string;
  number: number;
  shift: number;
  status: 'waiting' | 'loading' | 'running' | 'reading' | 'closed' | 'dropped';
  ruined: number;
  whole: boolean;
  runs: number;
  repeats: number | null;
  added: boolean;
  current: boolean;
}

export interface BenchSettingsView {
  keys: 'normal' | 'larger' | 'largest';
  hand: 'right' | 'left';
  typing: 'own' | 'system';
  signals: boolean;
  /** Speed of a gauge on a serial port. */
  baud: number;
}

export interface GaugeView {
  /** This browser can talk to serial ports. */
  possible: boolean;
  open: boolean;
  line: string | null;
  fault: string | null;
}

export type Mood = 'do' | 'look' | 'fault' | 'wait' | 'done';
