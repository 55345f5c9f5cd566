import type { Plan } from '../plan.ts';
import type { DraftFault } from './draft-fault.ts';
import type { PlanDraft } from './plan-draft.ts';
import { DraftReader } from './draft-reader.ts';
import { readConstants, readMeasurands, readReadings } from './read-quantities.ts';
import { readConditions, readMachines, readPrimary, readTreatments } from './read-parts.ts';

export interface ReadDraft {
  /** As far as it can be read; what stands in the way is among the faults. */
  plan: Plan;
  faults: DraftFault[];
  /** True when no fault keeps the plan from being issued. */
  complete: boolean;
}

/**
 * Returns the plan that a draft means, and every fault in it. Numbers may be typed with comma or point; a number with
 * two meanings is a fault, never a guess.
 *
 * **Checked by** test/core/campaign/draft/read-draft.test.ts
 */
export function readDraft(draft: PlanDraft): ReadDraft {
  const reader = new DraftReader();
  if (draft.title.trim() === '') reader.fault('title', { tag: 'title-empty' });
  const treatments = readTreatments(draft, reader);
  const machines = readMachines(draft, reader);
  const ids = new Set<string>();
  const readings = readReadings(draft, reader, ids);
  const constants = readConstants(draft, reader, ids);
  const { measurands, idOf, read } = readMeasurands(draft, reader, ids);
  const slots = Math.max(0, ...machines.map((machine) => machine.slots.filter((slot) => slot.inService).length));
  if (treatments.length >= 2 && slots >= treatments.length) {
    reader.tell('machines', { tag: 'complete-sessions', slots, treatments: treatments.length });
  }
  const runMinutes = reader.positive('runMinutes', draft.runMinutes);
  const plan: Plan = {
    title: reader.text('title', draft.title, 200),
    question: reader.text('question', draft.question, 2000),
    treatments,
    machines,
    readings: [...readings, ...read],
    constants,
    measurands,
    conditions: readConditions(draft, reader),
    sessionsPerShift: reader.whole('sessionsPerShift', draft.sessionsPerShift, 1, 1000),
    minutesPerSession: reader.positive('minutesPerSession', draft.minutesPerSession),
    runSeconds: runMinutes === null ? null : Math.round(runMinutes * 60),
    operator: reader.text('operator', draft.operator, 120),
    precautions: reader.lines('precautions', draft.precautions, 1000),
    ruinReasons: reader.lines('ruinReasons', draft.ruinReasons, 200),
    open: draft.open,
    primary: readPrimary(draft, reader, measurands, idOf, treatments)
  };
  return { plan, faults: reader.faults, complete: reader.faults.every(({ weight }) => weight !== 'stop') };
}
