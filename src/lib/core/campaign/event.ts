import * as v from 'valibot';
import { IssuedPlanSchema, PlannedSessionSchema, PlanSchema } from './plan.ts';

/**
 * What happened: an append-only list of events; the state is a replay of it. A correction is a new event that names the
 * old one and says why.
 * Source: ISO/IEC 17025:2017, 7.5 and 7.11 (original observations kept, amendments traceable); RFC 9562 (UUIDv7);
 * RFC 3339 (time with offset); RFC 8785 (canonical JSON that is hashed).
 */

const text = (most: number) => v.pipe(v.string(), v.maxLength(most));
const uuid = v.pipe(v.string(), v.regex(/^[0-9a-f]{8}-[0-9a-f]{4}-7[0-9a-f]{3}-[89ab][0-9a-f]{3}-[0-9a-f]{12}$/));
/** Ticks end with the year 2200, so that nobody's file can push the counter out of the exact integers. */
export const lastTick = 7_258_118_400_000;
const finite = v.pipe(v.number(), v.finite());
const natural = v.pipe(v.number(), v.integer(), v.minValue(0), v.maxValue(1e9));
const sessionId = text(40);
const reason = v.pipe(v.string(), v.minLength(1), v.maxLength(1000));

/** A check that spoke when the value was entered; kept with the value. */
export const RaisedSchema = v.strictObject({
  check: v.picklist([
    'missing',
    'impossible',
    'unexpected',
    'slip',
    'stuck',
    'surprise',
    'condition',
    'specimen',
    'code',
    'clock'
  ]),
  /** What was said to the person, in the words shown. */
  said: text(500)
});

const readingFields = {
  session: sessionId,
  slot: natural,
  specimen: text(24),
  /** Id of the reading definition. */
  reading: text(40),
  /** 1-based number of a repeated reading. */
  repeat: v.pipe(natural, v.minValue(1)),
  /** What was typed, to the letter, and the number it was understood as. */
  raw: text(200),
  value: finite,
  /** A reading that stopped at a limit: the true value is at least, or at most, this. */
  limit: v.picklist(['none', 'at-least', 'at-most'])
};

/** Every kind of event and its data. Kinds are only ever added. */
export const kinds = {
  'campaign-created': v.strictObject({ title: text(200), demo: v.boolean() }),
  'plan-issued': IssuedPlanSchema,
  'plan-amended': v.strictObject({
    reason,
    change: v.variant('kind', [
      v.strictObject({ kind: v.literal('add-session'), session: PlannedSessionSchema }),
      v.strictObject({ kind: v.literal('drop-session'), session: sessionId }),
      v.strictObject({ kind: v.literal('slot-service'), machine: text(40), slot: natural, inService: v.boolean() }),
      v.strictObject({ kind: v.literal('replace-plan'), plan: PlanSchema })
    ])
  }),
  'shift-opened': v.strictObject({ shift: natural, operator: text(120) }),
  'shift-closed': v.strictObject({ shift: natural, operator: text(120), handOver: text(4000) }),
  'precautions-acknowledged': v.strictObject({ session: sessionId }),
  'conditions-recorded': v.strictObject({
    session: sessionId,
    values: v.array(
      v.strictObject({
        condition: text(40),
        raw: text(200),
        value: v.nullable(finite),
        raised: v.array(RaisedSchema),
        because: v.nullable(text(1000))
      })
    )
  }),
  'specimen-loaded': v.strictObject({
    session: sessionId,
    slot: natural,
    specimen: text(24),
    how: v.picklist(['tap', 'scan', 'typed']),
    /** Why another than the planned specimen is really in the slot; null when as planned. */
    because: v.nullable(text(1000))
  }),
  'session-started': v.strictObject({ session: sessionId, seconds: v.nullable(finite) }),
  'session-stopped': v.strictObject({ session: sessionId, early: v.nullable(text(1000)) }),
  'reading-recorded': v.strictObject({
    ...readingFields,
    source: v.picklist(['keypad', 'keyboard', 'serial', 'paper', 'imported']),
    /** When it was read, if not now (typed in later from paper); RFC 3339. */
    readAt: v.nullable(text(40)),
    raised: v.array(RaisedSchema),
    /** Why a warned value was kept. */
    because: v.nullable(text(1000))
  }),
  'reading-corrected': v.strictObject({ ...readingFields, target: uuid, reason, raised: v.array(RaisedSchema) }),
  'reading-missing': v.strictObject({ session: sessionId, slot: natural, reading: text(40), repeat: natural, reason }),
  ruined: v.strictObject({
    session: sessionId,
    /** null: the whole session. */
    slot: v.nullable(natural),
    reason,
    next: v.nullable(v.picklist(['repeat-later', 'spare-now', 'leave-out']))
  }),
  reinstated: v.strictObject({ target: uuid, reason }),
  noted: v.strictObject({
    about: v.picklist(['campaign', 'shift', 'session', 'run']),
    session: v.nullable(sessionId),
    slot: v.nullable(natural),
    text: v.pipe(v.string(), v.minLength(1), v.maxLength(4000))
  }),
  undone: v.strictObject({ target: uuid, reason: text(1000) }),
  'session-closed': v.strictObject({ session: sessionId }),
  'session-reopened': v.strictObject({ session: sessionId, reason }),
  'contradiction-decided': v.strictObject({
    about: text(300),
    chosen: uuid,
    reason,
    /** The events that were weighed; a contradicting event that is not among them opens the question again. */
    among: v.exactOptional(v.pipe(v.array(uuid), v.maxLength(1000)))
  }),
  exported: v.strictObject({
    events: natural,
    sha256: v.pipe(v.string(), v.regex(/^[0-9a-f]{64}$/)),
    how: text(40),
    /** Sequence number of this device's last event in the file. */
    upTo: v.exactOptional(natural)
  }),
  imported: v.strictObject({
    sha256: v.pipe(v.string(), v.regex(/^[0-9a-f]{64}$/)),
    added: natural,
    known: natural,
    name: text(300),
    /** What was known of where the file came from when it was taken in, and the fingerprint of the key that signed it. */
    origin: v.exactOptional(text(40)),
    key: v.exactOptional(v.pipe(v.string(), v.regex(/^[0-9a-f]{64}$/)))
  }),
  'device-fault': v.strictObject({ what: text(80), detail: text(2000) })
} as const;

export type Kind = keyof typeof kinds;
export type DataOf<K extends Kind> = v.InferOutput<(typeof kinds)[K]>;

/** What every event carries beside its kind and data. */
export const EnvelopeSchema = v.strictObject({
  /** Version of the event format. */
  v: v.literal(1),
  id: uuid,
  campaign: uuid,
  device: uuid,
  /** 1-based number of the event of this device in this campaign, without gaps. */
  seq: v.pipe(natural, v.minValue(1)),
  /** RFC 3339 with offset, to the millisecond. */
  at: v.pipe(v.string(), v.regex(/^\d{4}-\d\d-\d\dT\d\d:\d\d:\d\d\.\d{3}[+-]\d\d:\d\d$/)),
  /** Milliseconds of a clock that only goes forward, since the program started; with `run` it shows a clock that jumped. */
  mono: finite,
  /** Random word of this start of the program. */
  run: text(16),
  /**
   * Orders what a device knew: at least the time in milliseconds, and above the tick of every event the device held when
   * it recorded this one. Absent in events of other makers: the time stands in.
   * Source: Lamport (1978), Time, clocks, and the ordering of events in a distributed system, rule IR2.
   */
  tick: v.exactOptional(v.pipe(v.number(), v.integer(), v.minValue(0), v.maxValue(lastTick))),
  who: text(120),
  /** Program version. */
  app: text(40),
  /** SHA-256 of the canonical JSON of the event before on this device in this campaign; 64 zeros for the first. */
  prev: v.pipe(v.string(), v.regex(/^[0-9a-f]{64}$/)),
  kind: text(40),
  data: v.unknown()
});

export type Envelope = v.InferOutput<typeof EnvelopeSchema>;
/** An event whose kind this version of the program understands. */
export type CampaignEvent = { [K in Kind]: Omit<Envelope, 'kind' | 'data'> & { kind: K; data: DataOf<K> } }[Kind];
/** An event of a later program: kept, exported and shown as not understood. */
export type UnknownEvent = Envelope;
