import type { CampaignEvent, UnknownEvent } from '#lib/core/campaign/event.ts';
import { Replay, replay } from '#lib/core/campaign/replay.ts';
import { canonicalJson } from '#lib/core/campaign/seal.ts';
import type { CampaignState } from '#lib/core/campaign/state.ts';
import { stateHash } from '#lib/core/campaign/state-hash.ts';
import { mergeEvents } from '#lib/core/exchange/summarise-import.ts';
import { Dice, randomHistory } from './random-history.ts';

type Any = CampaignEvent | UnknownEvent;

export interface MergeCheck {
  events: number;
  planted: number;
  faults: string[];
}

/**
 * What is wrong with the merge of one random history; empty when order, repetition and partition change nothing and
 * every planted contradiction, and no other, is reported exactly once.
 */
export function checkMerge(seed: number): MergeCheck {
  const { devices, planted } = randomHistory(seed);
  const dice = new Dice(seed + 1_000_000);
  const files = devices.map(({ events }) => events as Any[]);
  const all = files.flat();
  const state = replay(all);
  const whole = JSON.stringify(state);
  const faults: string[] = [];
  const expectSame = (what: string, other: CampaignState): void => {
    // Equal texts are equal states; different texts may still be equal but for the order of keys.
    if (JSON.stringify(other) === whole) return;
    if (canonicalJson(other) !== canonicalJson(state) || stateHash(other) !== stateHash(state))
      faults.push(`${what} differs`);
  };
  expectSame('another order', replay(dice.shuffled(all)));
  expectSame('repetition', replay(dice.shuffled([...all, ...all.filter(() => dice.below(3) === 0)])));
  const growing = new Replay(state.id);
  for (const event of dice.shuffled(all)) {
    growing.apply(event);
    if (dice.below(4) === 0) void growing.state;
  }
  expectSame('growth with looks in between', growing.state);
  // Events of other makers may bear no tick: then time and sequence number order them, as purely.
  const bare = all.map(({ tick: _tick, ...event }) => event as Any);
  if (JSON.stringify(replay(bare)) !== JSON.stringify(replay(dice.shuffled(bare))))
    faults.push('another order without ticks differs');
  // Split into overlapping files, merged two by two in any order.
  const parts = Array.from({ length: 1 + dice.below(6) }, () => all.filter(() => dice.below(2) === 0));
  const pile = dice.shuffled([...files, ...parts]);
  while (pile.length > 1) {
    const [a = [], b = []] = [pile.pop(), pile.pop()];
    const { added, aside } = mergeEvents(a, b);
    if (aside.length > 0) faults.push('an event of the same bytes was set aside');
    pile.splice(dice.below(pile.length + 1), 0, [...a, ...added]);
  }
  expectSame('partition', replay(pile[0] ?? []));
  const found = state.contradictions.filter(({ decided }) => decided === null).map(({ key }) => key);
  for (const key of planted)
    if (found.filter((one) => one === key).length !== 1) faults.push(`planted ${key} reported ${found.join(' ')}`);
  for (const key of found) if (!planted.includes(key)) faults.push(`not planted: ${key}`);
  return { events: all.length, planted: planted.length, faults };
}
