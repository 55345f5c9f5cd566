import type { Plan, ReadingDefinition } from '../plan.ts';
import type { ReadingState, RunState, SessionState } from '../state.ts';

/** One place for one number. */
export interface ReadingPlace {
  slot: number;
  reading: string;
  /** 1-based. */
  repeat: number;
}

export type Phase = 'before' | 'at' | 'after';

/** Key of a place in lists and drafts. */
export const placeKey = (place: ReadingPlace) => `${place.slot}/${place.reading}/${place.repeat}`;

/**
 * Returns the definitions in the order they are read: before the machine starts, at the points of the run in rising order, after
 * it stops; the plan's own order inside each.
 */
export function readingOrder(plan: Plan): ReadingDefinition[] {
  const rank = ({ when }: ReadingDefinition) =>
    when.kind === 'before' ? -Infinity : when.kind === 'after' ? Infinity : when.point;
  return plan.readings
    .map((definition, i) => ({ definition, i }))
    .sort((a, b) => (rank(a.definition) === rank(b.definition) ? a.i - b.i : rank(a.definition) - rank(b.definition)))
    .map(({ definition }) => definition);
}

/**
 * Returns every place of a session that waits for a number, in the order of work: what is read at one moment first, and there
 * slot by slot, so that a specimen is taken in hand once. A ruined run waits for nothing, and a place said to be missing
 * neither. Phases keep only readings of these moments.
 *
 * Checked by: test/core/campaign/steps/due-readings.test.ts
 */
export function dueReadings(plan: Plan, session: SessionState, phases: readonly Phase[]): ReadingPlace[] {
  if (session.ruined || session.status === 'dropped') return [];
  const places: ReadingPlace[] = [];
  for (const moment of moments(plan)) {
    for (const run of session.runs) {
      if (run.ruined) continue;
      for (const definition of moment) {
        if (!phases.includes(definition.when.kind)) continue;
        for (let repeat = 1; repeat <= definition.repeats; repeat++)
          if (isDue(run, definition.id, repeat)) places.push({ slot: run.slot, reading: definition.id, repeat });
      }
    }
  }
  return places;
}

/** The reading of a place as recorded so far; null when nothing was. */
export function readingAt(run: RunState, reading: string, repeat: number): ReadingState | null {
  return run.readings.find((r) => r.reading === reading && r.repeat === repeat) ?? null;
}

function isDue(run: RunState, reading: string, repeat: number): boolean {
  const state = readingAt(run, reading, repeat);
  return state === null || (state.current === null && state.missing === null && state.contradiction === null);
}

/** Definitions grouped by the moment they are read at. */
function moments(plan: Plan): ReadingDefinition[][] {
  const groups: ReadingDefinition[][] = [];
  for (const definition of readingOrder(plan)) {
    const last = groups.at(-1);
    if (last?.[0] && sameMoment(last[0], definition)) last.push(definition);
    else groups.push([definition]);
  }
  return groups;
}

const sameMoment = (a: ReadingDefinition, b: ReadingDefinition) =>
  a.when.kind === b.when.kind &&
  (a.when.kind !== 'at' || b.when.kind !== 'at' || (a.when.point === b.when.point && a.when.unit === b.when.unit));
