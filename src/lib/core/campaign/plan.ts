import * as v from 'valibot';

/**
 * What was planned: the shapes that the issue of a plan fixes. Plain objects, validated on every read and import.
 * A limit that is not set is null; nothing is ever NaN.
 */

const text = (most: number) => v.pipe(v.string(), v.maxLength(most));
const id = v.pipe(v.string(), v.regex(/^[a-z][a-z0-9_]{0,39}$/i));
const finite = v.pipe(v.number(), v.finite());
const count = (most: number) => v.pipe(v.number(), v.integer(), v.minValue(0), v.maxValue(most));

/** A pair of limits; null on a side means no limit there. */
export const RangeSchema = v.strictObject({ min: v.nullable(finite), max: v.nullable(finite) });

export const TreatmentSchema = v.strictObject({
  id,
  name: text(120),
  /** Specimens at hand; null when there are enough. */
  specimens: v.nullable(count(100_000)),
  control: v.boolean(),
  note: text(2000)
});

export const MachineSchema = v.strictObject({
  id,
  name: text(120),
  /** How the slots lie, so that the screen can draw the machine as it stands. */
  layout: v.variant('kind', [
    v.strictObject({ kind: v.literal('row') }),
    v.strictObject({ kind: v.literal('ring') }),
    v.strictObject({ kind: v.literal('grid'), columns: v.pipe(count(50), v.minValue(1)) })
  ]),
  slots: v.pipe(v.array(v.strictObject({ name: text(40), inService: v.boolean() })), v.minLength(1), v.maxLength(100))
});

/** One number to be read for every run. */
export const ReadingDefinitionSchema = v.strictObject({
  /** The name a formula uses. */
  id,
  label: text(120),
  unit: text(40),
  decimals: count(12),
  /** Cannot be. */
  possible: RangeSchema,
  /** Look again. */
  expected: RangeSchema,
  /** When it is taken: before the machine starts, after it stops, or at a point of the run. */
  when: v.variant('kind', [
    v.strictObject({ kind: v.literal('before') }),
    v.strictObject({ kind: v.literal('after') }),
    v.strictObject({ kind: v.literal('at'), point: finite, unit: text(40) })
  ]),
  /** How often each specimen is read; the mean counts. */
  repeats: v.pipe(count(20), v.minValue(1)),
  /** Smallest step of the instrument; null when not known. */
  resolution: v.nullable(finite),
  /** May stop at a limit: "did not fail by", "below detection". */
  mayStopAtLimit: v.boolean()
});

export const ConstantSchema = v.strictObject({ id, label: text(120), value: finite, unit: text(40) });

export const DirectionSchema = v.variant('kind', [
  v.strictObject({ kind: v.literal('lower') }),
  v.strictObject({ kind: v.literal('higher') }),
  v.strictObject({ kind: v.literal('target'), value: finite })
]);

/** The quantity to be compared: a reading, or a formula of readings and constants. */
export const MeasurandSchema = v.strictObject({
  id,
  label: text(120),
  unit: text(40),
  decimals: count(12),
  /** Expression over ids of readings and constants; null: the one reading with the measurand's own id. */
  formula: v.nullable(text(1000)),
  direction: DirectionSchema,
  kind: v.picklist(['number', 'rank']),
  possible: RangeSchema,
  expected: RangeSchema,
  /** Expected scatter between runs in one session (standard deviation); null when not known. */
  scatter: v.nullable(finite),
  /** Smallest difference that matters; null when not said. */
  difference: v.nullable(finite),
  /** Margin within which a treatment counts as equivalent to the control; null: not asked. */
  equivalenceMargin: v.nullable(finite)
});

/** A machine setting or the room, recorded once a session. */
export const ConditionSchema = v.strictObject({
  id,
  label: text(120),
  kind: v.picklist(['number', 'text']),
  unit: text(40),
  window: RangeSchema
});

/** The analysis fixed before any data, so that nobody chooses it after seeing the answer. */
export const PrimaryAnalysisSchema = v.strictObject({
  measurand: id,
  sessions: v.picklist(['fixed', 'random']),
  comparison: v.picklist(['all-pairs', 'to-control', 'to-best']),
  adjustment: v.picklist(['tukey', 'holm', 'none', 'dunnett', 'hsu']),
  alpha: v.pipe(finite, v.gtValue(0), v.ltValue(1)),
  slotInModel: v.boolean()
});

/** One planned loading of the machine; slot i of `slots` is slot i of the machine. */
export const PlannedSessionSchema = v.strictObject({
  id,
  /** 1-based number in loading order. */
  number: v.pipe(count(100_000), v.minValue(1)),
  /** 1-based planned shift. */
  shift: v.pipe(count(100_000), v.minValue(1)),
  machine: id,
  slots: v.array(v.nullable(v.strictObject({ treatment: id, specimen: text(24) }))),
  /** The session this one repeats, when it is a repair. */
  repeats: v.nullable(id)
});

/** How chance was used; enough to draw the same loading order again. */
export const RandomisationSchema = v.strictObject({
  seed: text(80),
  generator: text(80),
  generatorVersion: count(1000),
  algorithm: text(80),
  algorithmVersion: count(1000),
  /** What was restricted and why, one sentence each. */
  restrictions: v.array(text(500))
});

export const DesignOriginSchema = v.strictObject({
  /** Blocks over 0-based design labels, before randomisation. */
  blocks: v.array(v.array(count(10_000))),
  construction: text(500),
  source: text(500),
  balanced: v.boolean(),
  randomisation: RandomisationSchema
});

/** What the engineer fills in before the plan is issued. */
export const PlanSchema = v.strictObject({
  title: text(200),
  question: text(2000),
  treatments: v.pipe(v.array(TreatmentSchema), v.maxLength(1000)),
  machines: v.pipe(v.array(MachineSchema), v.maxLength(50)),
  readings: v.pipe(v.array(ReadingDefinitionSchema), v.maxLength(100)),
  constants: v.pipe(v.array(ConstantSchema), v.maxLength(100)),
  measurands: v.pipe(v.array(MeasurandSchema), v.maxLength(50)),
  conditions: v.pipe(v.array(ConditionSchema), v.maxLength(50)),
  sessionsPerShift: v.nullable(v.pipe(count(1000), v.minValue(1))),
  minutesPerSession: v.nullable(finite),
  /** Planned length of a run shown as a countdown, seconds; null: none. */
  runSeconds: v.nullable(finite),
  operator: text(120),
  precautions: v.array(text(1000)),
  ruinReasons: v.array(text(200)),
  /** May the technician see treatment names? */
  open: v.boolean(),
  primary: v.nullable(PrimaryAnalysisSchema)
});

/** A plan as issued: what was asked, and the loading order that chance gave. */
export const IssuedPlanSchema = v.strictObject({
  plan: PlanSchema,
  design: DesignOriginSchema,
  sessions: v.array(PlannedSessionSchema),
  /** Codes of spare specimens by treatment. */
  spares: v.array(v.strictObject({ treatment: id, specimen: text(24) }))
});

export type Range = v.InferOutput<typeof RangeSchema>;
export type Treatment = v.InferOutput<typeof TreatmentSchema>;
export type Machine = v.InferOutput<typeof MachineSchema>;
export type ReadingDefinition = v.InferOutput<typeof ReadingDefinitionSchema>;
export type Constant = v.InferOutput<typeof ConstantSchema>;
export type Direction = v.InferOutput<typeof DirectionSchema>;
export type Measurand = v.InferOutput<typeof MeasurandSchema>;
export type Condition = v.InferOutput<typeof ConditionSchema>;
export type PrimaryAnalysis = v.InferOutput<typeof PrimaryAnalysisSchema>;
export type PlannedSession = v.InferOutput<typeof PlannedSessionSchema>;
export type Plan = v.InferOutput<typeof PlanSchema>;
export type IssuedPlan = v.InferOutput<typeof IssuedPlanSchema>;
