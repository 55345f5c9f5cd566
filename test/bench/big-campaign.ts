import type { CampaignEvent } from '#lib/core/campaign/event.ts';
import type { IssuedPlan } from '#lib/core/campaign/plan.ts';
import { issued, plan, Recorder } from '../core/campaign/story.ts';

/**
 * An invented campaign of the largest size the program is measured at: 1,000 sessions of 8 slots, 50,000 events by one
 * device (with a correction, an undone act, a ruin or a note here and there).
 */
export function bigCampaign(device: string, sessions = 1000, slots = 8): CampaignEvent[] {
  const [reading] = plan.readings;
  const [machine] = plan.machines;
  if (!reading || !machine) throw new Error('the plan has a reading and a machine');
  const treatments = Array.from({ length: 40 }, (_, n) => `T${n + 1}`);
  const big: IssuedPlan = {
    ...issued,
    plan: {
      ...plan,
      treatments: treatments.map((id) => ({ id, name: `Paint ${id}`, specimens: null, control: false, note: '' })),
      machines: [
        { ...machine, slots: Array.from({ length: slots }, (_, n) => ({ name: `${n + 1}`, inService: true })) }
      ],
      readings: ['before', 'after', 'third', 'loss'].map((id) => ({ ...reading, id, label: id }))
    },
    sessions: Array.from({ length: sessions }, (_, s) => ({
      id: `s${s + 1}`,
      number: s + 1,
      shift: Math.floor(s / 5) + 1,
      machine: machine.id,
      slots: Array.from({ length: slots }, (_, slot) => ({
        treatment: treatments[(s * 3 + slot * 5) % 40] as string,
        specimen: code(s, slot)
      })),
      repeats: null
    }))
  };
  const a = new Recorder(device);
  a.record('campaign-created', { title: 'Invented large campaign', demo: false });
  a.record('plan-issued', big);
  for (let s = 0; s < sessions; s++) recordSession(a, s, slots);
  return a.events;
}

const code = (s: number, slot: number): string => `P${(s * 8 + slot).toString(36)}`;

function recordSession(a: Recorder, s: number, slots: number): void {
  const session = `s${s + 1}`;
  a.record('precautions-acknowledged', { session });
  for (let slot = 0; slot < slots; slot++)
    a.record('specimen-loaded', { session, slot, specimen: code(s, slot), how: 'scan', because: null });
  a.record('session-started', { session, seconds: null });
  a.record('session-stopped', { session, early: null });
  let last: CampaignEvent | null = null;
  for (const name of ['before', 'after', 'third', 'loss'])
    for (let slot = 0; slot < slots; slot++) {
      const value = 10 + ((s * 7 + slot * 13) % 90) / 10;
      last = a.record('reading-recorded', {
        session,
        slot,
        specimen: code(s, slot),
        reading: name,
        repeat: 1,
        raw: value.toFixed(1),
        value,
        limit: 'none',
        source: 'keypad',
        readAt: null,
        raised: [],
        because: null
      });
    }
  if (s % 3 === 0)
    a.record('noted', { about: 'run', session, slot: s % slots, text: 'film looks thin at the edge of the track' });
  if (s % 7 === 0) a.record('ruined', { session, slot: s % slots, reason: 'Film torn', next: 'leave-out' });
  if (s % 4 === 0 && last) {
    a.record('undone', { target: last.id, reason: '' });
    a.record('reading-recorded', {
      ...(last.data as never as Extract<CampaignEvent, { kind: 'reading-recorded' }>['data']),
      raw: '11.0',
      value: 11
    });
  }
  a.record('session-closed', { session });
  // Fills up to fifty events a session.
  for (let n = a.events.length; n < 50 * (s + 1); n++)
    a.record('noted', { about: 'session', session, slot: null, text: `water at ${20 + (n % 5)} °C` });
}
