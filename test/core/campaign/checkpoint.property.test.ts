import { describe, expect, it } from 'vitest';
import type { CoreCheckpoint, SessionHead } from '#lib/core/campaign/checkpoint.ts';
import type { CampaignEvent } from '#lib/core/campaign/event.ts';
import { Replay, replay } from '#lib/core/campaign/replay.ts';
import { canonicalJson } from '#lib/core/campaign/seal.ts';
import { stateHash } from '#lib/core/campaign/state-hash.ts';
import type { CampaignState } from '#lib/core/campaign/state.ts';
import { Dice, randomHistory } from './random-history.ts';
import { campaign, Recorder } from './story.ts';

/** A checkpoint as a database would hold it: text, session by session. */
interface Kept {
  core: string;
  parts: Map<string, { head: string; runs: string; events: string }>;
}

const everything = (state: CampaignState): string =>
  `${stateHash(state)} ${canonicalJson([state.devices, state.flags, state.events])}`;

/** Keeps what has changed since the last checkpoint over what was kept then. */
function keep(from: Replay, before: Kept | null): Kept {
  const parts = new Map(before?.parts);
  for (const id of [...from.changed]) {
    const { head, runs, events } = from.part(id);
    parts.set(id, { head: JSON.stringify(head), runs, events: JSON.stringify(events) });
    from.settle(id);
  }
  return { core: JSON.stringify(from.core()), parts };
}

function resume({ core, parts }: Kept): Replay {
  const heads = [...parts].map(
    ([id, { head, runs }]) => [id, { head: JSON.parse(head) as SessionHead, runs }] as const
  );
  const resumed = Replay.from(JSON.parse(core) as CoreCheckpoint, new Map(heads));
  if (!resumed) throw new Error('a session is missing');
  return resumed;
}

/** Applies an event as the program does; false when the checkpoint does not help with it. */
function applied(to: Replay, event: CampaignEvent, kept: Kept, log: readonly CampaignEvent[]): boolean {
  for (let needs = to.needs(event); ; needs = to.needs(event)) {
    if (needs === 'everything') return false;
    if (needs.event !== null) {
      const target = needs.event;
      to.supplyEvent(target, log.find(({ id }) => id === target) ?? null);
    } else if (needs.sessions.length === 0) break;
    else
      for (const id of needs.sessions) {
        const events = JSON.parse(kept.parts.get(id)?.events ?? '[]') as CampaignEvent[];
        expect(to.supply(id, events), `session ${id} says what the checkpoint says`).toBe(true);
      }
  }
  to.apply(event);
  return true;
}

/** The events of all devices as they might reach one of them: each chain in order, the chains mixed. */
function arrival(dice: Dice, devices: readonly Recorder[]): CampaignEvent[] {
  const chains = devices.map(({ events, head }) => events.filter(({ device }) => device === head.device));
  const log: CampaignEvent[] = [];
  for (let left = chains.filter((chain) => chain.length > 0); left.length > 0; left = left.filter((c) => c.length > 0))
    log.push(...dice.one(left).splice(0, 1 + dice.below(5)));
  return log;
}

const histories = Number(process.env.CHECKPOINT_HISTORIES ?? 40);

describe('Replay', () => {
  it(`from(checkpoint at a random point of ${histories} random histories) and the rest of the log give the full replay`, () => {
    let resumed = 0;
    let asked = 0;
    for (let seed = 1; seed <= histories; seed++) {
      const dice = new Dice(seed + 77_000);
      const log = arrival(dice, randomHistory(seed).devices);
      const [first, second] = [dice.below(log.length + 1), dice.below(log.length + 1)].sort((a, b) => a - b) as [
        number,
        number
      ];
      const begun = new Replay(campaign);
      for (const event of log.slice(0, first)) begun.apply(event);
      let kept = keep(begun, null);
      let now = resume(kept);
      expect(everything(now.state), `history ${seed} at ${first}`).toBe(
        everything(replay(log.slice(0, first), campaign))
      );
      for (const [at, event] of log.entries()) {
        if (at < first) continue;
        if (at === second) now = resume((kept = keep(now, kept)));
        asked++;
        const takenBack = dice.below(3) === 0;
        if (!applied(now, event, kept, log.slice(0, at))) {
          now = new Replay(campaign);
          for (const one of log.slice(0, at + 1)) now.apply(one);
          continue;
        }
        resumed++;
        if (!takenBack) continue;
        // The event could not be written, and is tried again.
        void now.state;
        now.retract();
        if (dice.below(4) === 0)
          expect(everything(now.state), `history ${seed} without ${at}`).toBe(
            everything(replay(log.slice(0, at), campaign))
          );
        now.apply(event);
      }
      expect(everything(now.state), `history ${seed} from ${first} and ${second}`).toBe(
        everything(replay(log, campaign))
      );
    }
    // Plans and decisions between plans need the whole log; nearly everything else goes on from the checkpoint.
    expect(resumed / asked).toBeGreaterThan(0.9);
  }, 120_000);

  it.each<[string, (a: Recorder, second: string) => CampaignEvent]>([
    ['undone', (a, second) => a.record('undone', { target: second, reason: '' })],
    ['loaded otherwise', (a) => a.load(2, 1, 'Y2', 'read again')],
    ['loaded a third time', (a) => a.load(3, 0, 'Y1', 'found in the rack')],
    [
      'decided',
      (a, chosen) => a.record('contradiction-decided', { about: 'specimen-twice:Y1', chosen, reason: 'label seen' })
    ]
  ])('from(checkpoint) goes on when one specimen in two cold sessions is %s', (_what, act) => {
    const a = new Recorder('01890000-0000-7000-8000-00000000000a').begin();
    a.load(1, 0, 'Y1', 'found in the rack');
    const second = a.load(2, 1, 'Y1', 'found in the rack');
    const whole = new Replay(campaign);
    for (const event of a.events) whole.apply(event);
    const kept = keep(whole, null);
    const now = resume(kept);
    expect(now.state.contradictions.map(({ key }) => key)).toEqual(['specimen-twice:Y1']);
    expect(applied(now, act(a, second.id), kept, a.events)).toBe(true);
    expect(everything(now.state)).toBe(everything(replay(a.events, campaign)));
  });

  it('supply(events that say otherwise than the checkpoint) is refused', () => {
    const a = new Recorder('01890000-0000-7000-8000-00000000000a').begin();
    a.load(1, 0);
    a.reading(1, 0, 12.5);
    const whole = new Replay(campaign);
    for (const event of a.events) whole.apply(event);
    const kept = keep(whole, null);
    const events = JSON.parse(kept.parts.get('s1')?.events ?? '[]') as CampaignEvent[];
    const other = events.map((event) =>
      event.kind === 'reading-recorded' ? { ...event, data: { ...event.data, value: 99 } } : event
    );
    expect(resume(kept).supply('s1', events)).toBe(true);
    expect(resume(kept).supply('s1', other)).toBe(false);
    expect(resume(kept).supply('s1', events.slice(1))).toBe(false);
  });

  it('from(checkpoint without a session) is no replay', () => {
    const whole = new Replay(campaign);
    for (const event of new Recorder('01890000-0000-7000-8000-00000000000a').begin().events) whole.apply(event);
    const kept = keep(whole, null);
    kept.parts.delete('s2');
    expect(() => resume(kept)).toThrow('a session is missing');
  });
});
