import type { PlannedSession, ReadingDefinition } from '#lib/core/campaign/plan.ts';
import type { Desk } from './bench-campaign.ts';

/** How far a session is when the test takes it over. */
export type Until = 'prepared' | 'loaded' | 'ready' | 'running' | 'stopped' | 'read' | 'closed';
const order: Until[] = ['prepared', 'loaded', 'ready', 'running', 'stopped', 'read', 'closed'];

/** Value of a reading as typed; null: none is written. */
export type ReadingOf = (slot: number, reading: ReadingDefinition, repeat: number) => string | null;

/**
 * Writes what a bench would have recorded of one session, as events of another device: a test then begins where it wants to
 * look, and does not walk there.
 */
export function recordSession(
  desk: Desk,
  readings: readonly ReadingDefinition[],
  { id, slots }: PlannedSession,
  until: Until,
  valueOf: ReadingOf
): void {
  const reached = (step: Until) => order.indexOf(until) >= order.indexOf(step);
  const every = (act: (slot: number, specimen: string) => void) =>
    slots.forEach((planned, slot) => planned && act(slot, planned.specimen));
  const read = (kind: ReadingDefinition['when']['kind']) =>
    every((slot, specimen) => {
      for (const definition of readings.filter(({ when }) => when.kind === kind))
        for (let repeat = 1; repeat <= definition.repeats; repeat++) {
          const raw = valueOf(slot, definition, repeat);
          if (raw === null) continue;
          desk.write('reading-recorded', {
            session: id,
            slot,
            specimen,
            reading: definition.id,
            repeat,
            raw,
            value: Number(raw),
            limit: 'none',
            source: 'keyboard',
            readAt: null,
            raised: [],
            because: null
          });
        }
    });
  desk.write('precautions-acknowledged', { session: id });
  if (reached('loaded'))
    every((slot, specimen) =>
      desk.write('specimen-loaded', { session: id, slot, specimen, how: 'tap', because: null })
    );
  if (reached('ready')) read('before');
  if (reached('running')) desk.write('session-started', { session: id, seconds: null });
  if (reached('stopped')) {
    read('at');
    desk.write('session-stopped', { session: id, early: null });
  }
  if (reached('read')) read('after');
  if (reached('closed')) desk.write('session-closed', { session: id });
}
