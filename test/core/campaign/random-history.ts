import type { CampaignEvent } from '#lib/core/campaign/event.ts';
import { issued, Recorder, specimen } from './story.ts';

/** A small seeded generator (Marsaglia 2003, xorshift32): tests need to be repeatable, not random in earnest. */
export class Dice {
  #state: number;
  constructor(seed: number) {
    this.#state = (Math.imul(seed, 2654435761) ^ 0x9e3779b9) >>> 0 || 1;
    for (let i = 0; i < 8; i++) this.below(2);
  }
  below(n: number): number {
    let x = this.#state;
    x ^= x << 13;
    x ^= x >>> 17;
    x ^= x << 5;
    this.#state = x >>> 0;
    return this.#state % n;
  }
  one<T>(list: readonly T[]): T {
    return list[this.below(list.length)] as T;
  }
  shuffled<T>(list: readonly T[]): T[] {
    const out = [...list];
    for (let i = out.length - 1; i > 0; i--) {
      const j = this.below(i + 1);
      [out[i], out[j]] = [out[j] as T, out[i] as T];
    }
    return out;
  }
}

export interface History {
  devices: Recorder[];
  /** Keys of the contradictions put in on purpose. */
  planted: string[];
}

const deviceId = (n: number): string => `01890000-0000-7000-8000-00000000000${'abcde'[n]}`;

/**
 * What one to five devices recorded: every slot of every session belongs to one of them, clocks disagree by up to an
 * hour, files go back and forth between them, acts are corrected, undone, ruined, reinstated. Contradictions come
 * only where they are planted, at the end.
 */
export function randomHistory(seed: number): History {
  const dice = new Dice(seed);
  const devices = Array.from(
    { length: 1 + dice.below(5) },
    (_, n) => new Recorder(deviceId(n), Date.UTC(2026, 2, 2, 7) + (dice.below(121) - 60) * 60_000)
  );
  const first = (devices[0] as Recorder).begin();
  for (const other of devices) if (other !== first) other.learn(first.events);
  const owner = Array.from({ length: 12 }, () => dice.below(devices.length));
  const acts = 8 + dice.below(50);
  for (let act = 0; act < acts; act++) actOnce(dice, devices, owner);
  return { devices, planted: plant(dice, devices) };
}

function actOnce(dice: Dice, devices: Recorder[], owner: number[]): void {
  const cell = dice.below(12);
  const recorder = devices[owner[cell] as number] as Recorder;
  const session = 1 + Math.floor(cell / 3);
  const slot = cell % 3;
  const id = `s${session}`;
  if (dice.below(10) === 0) recorder.now -= dice.below(300_000);
  switch (dice.below(13)) {
    case 0:
    case 1:
      recorder.load(session, slot);
      break;
    case 2:
    case 3:
    case 4: {
      const last = lastReading(recorder, id, slot);
      if (last) recorder.correct(last.id, session, slot, dice.below(400) / 10);
      else recorder.reading(session, slot, dice.below(400) / 10);
      break;
    }
    case 5: {
      const target = recorder.events.findLast((e) => isActed(e) && !undoneIn(recorder, e.id));
      if (target) recorder.record('undone', { target: target.id, reason: '' });
      break;
    }
    case 6:
      if (standingRuin(recorder, id, slot)) break;
      recorder.record('ruined', { session: id, slot, reason: 'Film torn', next: dice.one(['leave-out', null]) });
      if (dice.below(2)) {
        const spare = `Z${recorder.head.seq}${recorder.head.device.at(-1)}`;
        recorder.load(session, slot, spare);
        recorder.reading(session, slot, dice.below(400) / 10, spare);
      }
      if (dice.below(2)) {
        const ruin = standingRuin(recorder, id, slot);
        if (ruin) recorder.record('reinstated', { target: ruin.id, reason: 'was fine' });
      }
      break;
    case 7: {
      const ruin = standingRuin(recorder, id, slot);
      if (ruin) recorder.record('reinstated', { target: ruin.id, reason: 'was fine' });
      break;
    }
    case 8:
      recorder.record('noted', { about: 'run', session: id, slot, text: `note ${dice.below(100)}` });
      break;
    case 9:
      recorder.record('session-started', { session: id, seconds: null });
      break;
    case 10:
      recorder.record('session-stopped', { session: id, early: null });
      break;
    case 11:
      recorder.record(dice.below(2) ? 'session-closed' : 'precautions-acknowledged', { session: id });
      break;
    default:
      recorder.learn(dice.one(devices).events);
  }
}

const undoneIn = (recorder: Recorder, id: string): boolean =>
  recorder.events.some((e) => e.kind === 'undone' && e.data.target === id);

const isActed = (e: CampaignEvent): boolean =>
  !['campaign-created', 'plan-issued', 'undone', 'reinstated'].includes(e.kind);

const standingRuin = (recorder: Recorder, session: string, slot: number): CampaignEvent | undefined =>
  recorder.events.find(
    (e) =>
      e.kind === 'ruined' &&
      e.data.session === session &&
      e.data.slot === slot &&
      !undoneIn(recorder, e.id) &&
      !recorder.events.some((r) => r.kind === 'reinstated' && r.data.target === e.id && !undoneIn(recorder, r.id))
  );

/** The reading that counts at this device; what was corrected and undone again is left alone. */
const lastReading = (recorder: Recorder, session: string, slot: number): CampaignEvent | undefined =>
  recorder.events.findLast(
    (e) =>
      (e.kind === 'reading-recorded' || e.kind === 'reading-corrected') &&
      e.data.session === session &&
      e.data.slot === slot &&
      !undoneIn(recorder, e.id)
  );

/** Two devices say what cannot both be true, each without knowing of the other, on a cell nobody has touched. */
function plant(dice: Dice, devices: Recorder[]): string[] {
  const planted: string[] = [];
  if (devices.length < 2) return planted;
  const all = devices.flatMap(({ events }) => events);
  const free = dice
    .shuffled(Array.from({ length: 12 }, (_, cell) => ({ session: 1 + Math.floor(cell / 3), slot: cell % 3 })))
    .filter(({ session, slot }) => !all.some((e) => touches(e, `s${session}`, slot)));
  const kinds = dice.shuffled(['two-values', 'two-specimens', 'specimen-twice', 'two-ruins', 'two-plans'] as const);
  for (const kind of kinds.slice(0, dice.below(kinds.length + 1))) {
    const [a, b] = dice.shuffled(devices) as [Recorder, Recorder];
    if (kind === 'two-plans') {
      b.record('plan-issued', { ...issued, spares: [] });
      planted.push('two-plans');
      continue;
    }
    const cell = free.pop();
    if (!cell) continue;
    const { session, slot } = cell;
    const code = specimen(session, slot);
    const place = `s${session}/${slot}`;
    if (kind === 'two-values') {
      a.reading(session, slot, 10);
      b.reading(session, slot, 20);
      planted.push(`two-values:${place}/loss/1/${code}`);
    } else if (kind === 'two-specimens') {
      a.load(session, slot);
      b.load(session, slot, `X${session}${slot}`, 'label was wet');
      planted.push(`two-specimens:${place}/${code}`);
    } else if (kind === 'two-ruins') {
      a.record('ruined', { session: `s${session}`, slot, reason: 'Film torn', next: null });
      b.record('ruined', { session: `s${session}`, slot, reason: 'Water leaked', next: null });
      planted.push(`two-ruins:${place}/${code}`);
    } else {
      const other = free.pop();
      if (!other) continue;
      a.load(session, slot, `Y${session}${slot}`, 'found in the rack');
      b.load(other.session, other.slot, `Y${session}${slot}`, 'found in the rack');
      planted.push(`specimen-twice:Y${session}${slot}`);
    }
  }
  return planted;
}

const touches = (e: CampaignEvent, session: string, slot: number): boolean =>
  'session' in e.data && e.data.session === session && 'slot' in e.data && e.data.slot === slot;
