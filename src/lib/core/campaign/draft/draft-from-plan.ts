import type { Plan, Range, ReadingDefinition } from '../plan.ts';
import { newDraft, newMeasurand } from './new-draft.ts';
import type { DraftMeasurand, DraftReading, PlanDraft } from './plan-draft.ts';

/** A number as text with one meaning: 1.234 could be a thousand and more, 1.2340 could not. */
const typed = (value: number | null) =>
  value === null ? '' : String(value).replace(/^(-?[1-9]\d{0,2}\.\d{3})$/, '$&0');
const typedRange = ({ min, max }: Range) => ({ min: typed(min), max: typed(max) });

/** Returns the draft of a new campaign in the frame of an earlier one: all but title, question and fixed ids. */
export function draftFromTemplate(plan: Plan): PlanDraft {
  const draft = draftFromPlan(plan);
  return {
    ...draft,
    title: '',
    question: '',
    measurands: draft.measurands.map((measurand) => ({ ...measurand, id: '' }))
  };
}

/**
 * Returns a draft that means the same plan: for an issued plan that is to be amended.
 *
 * `readDraft(draftFromPlan(plan)).plan` equals the plan.
 *
 * **Checked by** test/core/campaign/draft/draft-from-plan.test.ts
 */
export function draftFromPlan(plan: Plan): PlanDraft {
  const alone = new Set(plan.measurands.filter(({ formula }) => formula === null).map(({ id }) => id));
  const measurands = plan.measurands.map((measurand, i): DraftMeasurand => {
    const { formula, direction, kind } = measurand;
    const reading = plan.readings.find(({ id }) => id === measurand.id);
    return {
      ...newMeasurand([]),
      ...(reading && formula === null ? takenOf(reading) : {}),
      key: `y${i + 1}`,
      id: measurand.id,
      label: measurand.label,
      unit: measurand.unit,
      decimals: typed(measurand.decimals),
      source: formula !== null ? 'formula' : kind === 'rank' ? 'rank' : 'read',
      formula: formula ?? '',
      direction: direction.kind,
      target: direction.kind === 'target' ? typed(direction.value) : '',
      possible: typedRange(measurand.possible),
      expected: typedRange(measurand.expected),
      scatter: typed(measurand.scatter),
      difference: typed(measurand.difference),
      equivalenceMargin: typed(measurand.equivalenceMargin)
    };
  });
  const primaryAt = plan.measurands.findIndex(({ id }) => id === plan.primary?.measurand);
  const blank = newDraft({ precautions: plan.precautions, ruinReasons: plan.ruinReasons });
  return {
    ...blank,
    title: plan.title,
    question: plan.question,
    operator: plan.operator,
    treatments: plan.treatments.map(({ id, name, specimens, control, note }) => ({
      key: id,
      name,
      specimens: typed(specimens),
      control,
      note
    })),
    machines: plan.machines.map(({ id, name, layout, slots }) => ({
      key: id,
      name,
      layout: layout.kind,
      columns: layout.kind === 'grid' ? typed(layout.columns) : '2',
      slots: slots.map((slot) => ({ ...slot }))
    })),
    sessionsPerShift: typed(plan.sessionsPerShift),
    minutesPerSession: typed(plan.minutesPerSession),
    runMinutes: typed(plan.runSeconds === null ? null : plan.runSeconds / 60),
    readings: plan.readings
      .filter(({ id }) => !alone.has(id))
      .map((reading, i): DraftReading => ({
        key: `r${i + 1}`,
        id: reading.id,
        label: reading.label,
        unit: reading.unit,
        decimals: typed(reading.decimals),
        possible: typedRange(reading.possible),
        expected: typedRange(reading.expected),
        ...takenOf(reading)
      })),
    constants: plan.constants.map(({ id, label, value, unit }, i) => ({
      key: `c${i + 1}`,
      id,
      label,
      value: typed(value),
      unit
    })),
    measurands,
    conditions: plan.conditions.map(({ id, label, kind, unit, window }) => ({
      key: id,
      label,
      kind,
      unit,
      window: typedRange(window)
    })),
    open: plan.open,
    primary: plan.primary
      ? {
          measurand: measurands[primaryAt]?.key ?? '',
          sessions: plan.primary.sessions,
          comparison: plan.primary.comparison,
          adjustment: plan.primary.adjustment,
          alpha: typed(plan.primary.alpha),
          slotInModel: plan.primary.slotInModel
        }
      : blank.primary
  };
}

const takenOf = ({ when, repeats, resolution, mayStopAtLimit }: ReadingDefinition) => ({
  when: when.kind,
  point: when.kind === 'at' ? typed(when.point) : '',
  pointUnit: when.kind === 'at' ? when.unit : '',
  repeats: typed(repeats),
  resolution: typed(resolution),
  mayStopAtLimit
});
