import * as v from 'valibot';

/**
 * A plan while it is being written: every number as it was typed, so that nothing typed is lost or guessed. `readDraft`
 * makes the plan of it, or says what stands in the way.
 */

const typed = v.pipe(v.string(), v.maxLength(4000));
const typedRange = v.strictObject({ min: typed, max: typed });
const list = <T extends v.GenericSchema>(of: T, most: number) => v.pipe(v.array(of), v.maxLength(most));

export const DraftTreatmentSchema = v.strictObject({
  key: typed,
  name: typed,
  specimens: typed,
  control: v.boolean(),
  note: typed
});

export const DraftMachineSchema = v.strictObject({
  key: typed,
  name: typed,
  layout: v.picklist(['row', 'ring', 'grid']),
  columns: typed,
  slots: list(v.strictObject({ name: typed, inService: v.boolean() }), 100)
});

const takenSchema = {
  when: v.picklist(['before', 'after', 'at']),
  /** For `at`: the point of the run and its unit ("500", "cycles"). */
  point: typed,
  pointUnit: typed,
  repeats: typed,
  resolution: typed,
  mayStopAtLimit: v.boolean()
};

export const DraftReadingSchema = v.strictObject({
  key: typed,
  /** The name a formula uses. */
  id: typed,
  label: typed,
  unit: typed,
  decimals: typed,
  possible: typedRange,
  expected: typedRange,
  ...takenSchema
});

export const DraftConstantSchema = v.strictObject({ key: typed, id: typed, label: typed, value: typed, unit: typed });

export const DraftMeasurandSchema = v.strictObject({
  key: typed,
  /** Id in the plan once it is fixed; "" while it follows the label. */
  id: typed,
  label: typed,
  unit: typed,
  decimals: typed,
  /** Read as it is, computed by a formula, or a rank or score given to each specimen. */
  source: v.picklist(['read', 'formula', 'rank']),
  formula: typed,
  direction: v.picklist(['lower', 'higher', 'target']),
  target: typed,
  possible: typedRange,
  expected: typedRange,
  scatter: typed,
  difference: typed,
  equivalenceMargin: typed,
  /** How it is taken when it is read as it is. */
  ...takenSchema
});

export const DraftConditionSchema = v.strictObject({
  key: typed,
  label: typed,
  kind: v.picklist(['number', 'text']),
  unit: typed,
  window: typedRange
});

export const PlanDraftSchema = v.strictObject({
  v: v.literal(1),
  title: typed,
  question: typed,
  operator: typed,
  treatments: list(DraftTreatmentSchema, 1000),
  machines: list(DraftMachineSchema, 50),
  sessionsPerShift: typed,
  minutesPerSession: typed,
  runMinutes: typed,
  readings: list(DraftReadingSchema, 100),
  constants: list(DraftConstantSchema, 100),
  measurands: list(DraftMeasurandSchema, 50),
  conditions: list(DraftConditionSchema, 50),
  /** One a line. */
  precautions: v.pipe(v.string(), v.maxLength(20_000)),
  ruinReasons: v.pipe(v.string(), v.maxLength(20_000)),
  open: v.boolean(),
  primary: v.strictObject({
    /** Key of a measurand; "" is the first. */
    measurand: typed,
    sessions: v.picklist(['fixed', 'random']),
    comparison: v.picklist(['all-pairs', 'to-control', 'to-best']),
    adjustment: v.picklist(['tukey', 'holm', 'none', 'dunnett', 'hsu']),
    alpha: typed,
    slotInModel: v.boolean()
  }),
  design: v.strictObject({
    maxSessions: typed,
    /** Each shift is to hold every treatment once. */
    resolvable: v.boolean(),
    /** Which comparisons count when there are controls. */
    controlWeigh: v.picklist(['test-control', 'test-test', 'half']),
    /** Whether the controls are in every session. */
    controlInEverySession: v.boolean(),
    /** Keys of two treatments that must not share a session. */
    apart: list(v.strictObject({ one: typed, other: typed }), 200),
    /** Name of the chosen design; "" follows the recommendation. */
    chosen: typed,
    seed: typed,
    order: v.picklist(['early-stop', 'chance']),
    spares: typed
  })
});

export type PlanDraft = v.InferOutput<typeof PlanDraftSchema>;
export type DraftTreatment = v.InferOutput<typeof DraftTreatmentSchema>;
export type DraftMachine = v.InferOutput<typeof DraftMachineSchema>;
export type DraftReading = v.InferOutput<typeof DraftReadingSchema>;
export type DraftConstant = v.InferOutput<typeof DraftConstantSchema>;
export type DraftMeasurand = v.InferOutput<typeof DraftMeasurandSchema>;
export type DraftCondition = v.InferOutput<typeof DraftConditionSchema>;
export type DraftRange = v.InferOutput<typeof typedRange>;

/** Returns the draft that was stored, or null when it is not one this version of the program can read. */
export function parseDraft(stored: unknown): PlanDraft | null {
  const parsed = v.safeParse(PlanDraftSchema, stored);
  return parsed.success ? parsed.output : null;
}
