import { describe, expect, it } from 'vitest';
import type { CampaignEvent } from '#lib/core/campaign/event.ts';
import { canonicalJson } from '#lib/core/campaign/seal.ts';
import { replay } from '#lib/core/campaign/replay.ts';
import { stateHash } from '#lib/core/campaign/state-hash.ts';
import { writeCampaignFile } from '#lib/core/exchange/campaign-file.ts';
import { readCampaignFile } from '#lib/core/exchange/read-campaign-file.ts';
import { weighImport } from '#lib/core/exchange/summarise-import.ts';
import { Dice } from '../campaign/random-history.ts';
import { campaign, deviceA, Recorder } from '../campaign/story.ts';

// The long form (npm run test:fuzz) mutates 20,000 files.
const files = Number(process.env.FUZZ_FILES ?? 300);

const a = new Recorder(deviceA).begin();
a.load(1, 0);
const first = a.reading(1, 0, 12.5);
a.correct(first.id, 1, 0, 12.6);
a.record('ruined', { session: 's1', slot: 1, reason: 'Film torn', next: null });
a.record('noted', { about: 'run', session: 's1', slot: 0, text: '=1+1 <script>alert(1)</script> Ränder' });
const whole = writeCampaignFile(a.events, {
  campaign,
  title: 'T',
  device: deviceA,
  at: '2026-03-02T08:00:00.000+01:00',
  app: '0.0.0'
});
const held = a.events.slice(0, 3);
const heldHash = stateHash(replay(held));

type Mutation = (text: string, dice: Dice) => Uint8Array | string;
const lines = (text: string): string[] => text.trimEnd().split('\n');
const joined = (list: string[]): string => `${list.join('\n')}\n`;
const hostile = ['__proto__', 'constructor', 'toString', 'x'.repeat(5000), '\\ud800', 'hasOwnProperty'];
const numbers = ['1e308', '-1e308', '1e400', '9007199254740993', '-0', '1E2', '0.1e1', '"NaN"', 'null', '[]', '{}'];

const mutations: Record<string, Mutation> = {
  'bytes flipped': (text, dice) => {
    const bytes = new TextEncoder().encode(text);
    for (let n = 1 + dice.below(4); n > 0; n--) {
      const at = dice.below(bytes.length);
      bytes[at] = (bytes[at] ?? 0) ^ (1 + dice.below(255));
    }
    return bytes;
  },
  'file cut': (text, dice) => new TextEncoder().encode(text).subarray(0, dice.below(text.length)),
  'line cut out': (text, dice) => {
    const list = lines(text);
    list.splice(dice.below(list.length), 1 + dice.below(2));
    return joined(list);
  },
  'line doubled': (text, dice) => {
    const list = lines(text);
    list.splice(dice.below(list.length), 0, dice.one(list));
    return joined(list);
  },
  'lines reordered': (text, dice) => joined(dice.shuffled(lines(text))),
  'number replaced': (text, dice) => {
    const found = [...text.matchAll(/(?<=[:,[])-?\d+(\.\d+)?(?=[,}\]])/g)];
    const one = dice.one(found);
    return `${text.slice(0, one.index)}${dice.one(numbers)}${text.slice(one.index + one[0].length)}`;
  },
  'key replaced': (text, dice) => {
    const one = dice.one([...text.matchAll(/"[a-z]\w*":/gi)]);
    return `${text.slice(0, one.index)}"${dice.one(hostile)}":${text.slice(one.index + one[0].length)}`;
  },
  'key put in': (text, dice) => {
    const one = dice.one([...text.matchAll(/\{/g)]);
    return `${text.slice(0, one.index + 1)}"${dice.one(hostile)}":{"x":1},${text.slice(one.index + 1)}`;
  },
  'version of the future': (text, dice) =>
    dice.below(2) ? text.replace('"version":1', `"version":${2 + dice.below(9)}`) : text.replaceAll('"v":1', '"v":7'),
  'deep nesting': (text, dice) => {
    const one = dice.one([...text.matchAll(/"data":/g)]);
    const depth = 50 + dice.below(20_000);
    return `${text.slice(0, one.index)}"data":${'['.repeat(depth)}${']'.repeat(depth)},"was":${text.slice(one.index + 7)}`;
  },
  'event forged anew': (text, dice) => {
    const list = lines(text);
    const at = 1 + dice.below(list.length - 2);
    const event = JSON.parse(list[at] ?? '{}') as CampaignEvent;
    list[at] = canonicalJson({ ...event, who: 'Somebody else', ...(dice.below(2) ? { kind: 'of-the-future' } : {}) });
    return joined(list);
  }
};

describe('readCampaignFile', () => {
  it(`readCampaignFile(${files} mutated files) never throws, never passes one as whole, names line and cause`, () => {
    const dice = new Dice(20_260_302);
    const names = Object.keys(mutations);
    let refused = 0;
    let damaged = 0;
    for (let n = 0; n < files; n++) {
      const name = names[n % names.length] as string;
      const made = (mutations[name] as Mutation)(whole, dice);
      const bytes = typeof made === 'string' ? new TextEncoder().encode(made) : made;
      if (new TextDecoder().decode(bytes) === whole) continue;
      const read = readCampaignFile(bytes);
      if (!read.ok) {
        refused++;
        expect(read.error.tag, name).toMatch(/^[a-z-]+$/);
        continue;
      }
      damaged++;
      const { damage, events } = read.value;
      expect(damage, `${name}, file ${n}`).not.toBeNull();
      for (const bad of damage?.badLines ?? []) expect(bad.line, name).toBeGreaterThan(1);
      // What could be read may be summed up without a throw, and summing up changes nothing that is held.
      const { summary } = weighImport(
        campaign,
        held,
        events.map(({ event }) => event)
      );
      expect(summary.added + summary.known + summary.quarantined, name).toBe(events.length);
      expect(stateHash(replay(held))).toBe(heldHash);
    }
    console.log(`fuzz: ${files} mutated files, ${refused} refused whole, ${damaged} read with their damage named`);
    expect(refused).toBeGreaterThan(0);
    expect(damaged).toBeGreaterThan(0);
    expect(Object.getOwnPropertyNames(Object.prototype)).not.toContain('x');
  }, 600_000);
});
