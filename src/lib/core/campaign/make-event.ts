import * as v from 'valibot';
import { fail, ok, type Result } from '../result.ts';
import { type CampaignEvent, type DataOf, type Envelope, kinds, type Kind, lastTick } from './event.ts';
import { rfc3339 } from './rfc3339.ts';
import { canonicalJson, rememberSeal, sha256OfText } from './seal.ts';
import { uuid7 } from './uuid7.ts';

/** Where a device's chain in a campaign stands: the next event is tied to it. */
export interface Head {
  campaign: string;
  device: string;
  /** Sequence number of the last event; 0 before the first. */
  seq: number;
  /** Seal of the last event; `noHash` before the first. */
  hash: string;
  /** Highest tick of any event of the campaign that this device holds. */
  tick: number;
}

/** What the surroundings give an event: clocks, chance, the program. */
export interface Stamp {
  /** Wall clock, milliseconds since 1970. */
  now: number;
  /** Minutes east of UTC. */
  offset: number;
  /** Forward-only clock, milliseconds since the program started. */
  mono: number;
  run: string;
  app: string;
  /** Ten random bytes. */
  random: Uint8Array;
}

export interface Sealed {
  event: CampaignEvent;
  /** Canonical JSON of the event: the bytes that are kept, hashed and exported. */
  text: string;
  seal: string;
  /** Where the chain stands after it. */
  head: Head;
}

export type BadData = { tag: 'bad-data'; kind: string; path: string; cause: string };

const lone = /[\uD800-\uDBFF](?![\uDC00-\uDFFF])|(?<![\uD800-\uDBFF])[\uDC00-\uDFFF]/g;

/** A copy that JSON can carry: half characters (a cut emoji) become the replacement character, undefined keys go. */
function plain(value: unknown): unknown {
  if (typeof value === 'string') return value.replace(lone, '\uFFFD');
  if (Array.isArray(value)) return value.map(plain);
  if (value !== null && typeof value === 'object')
    return Object.fromEntries(Object.entries(value).flatMap(([k, x]) => (x === undefined ? [] : [[k, plain(x)]])));
  return value;
}

/**
 * The next event of a device's chain: validated, numbered, tied to the event before, sealed.
 * Errors: `bad-data` with the path to the field that the schema refuses; nothing has happened then.
 * Checked by: test/core/campaign/make-event.test.ts.
 */
export function makeEvent<K extends Kind>(
  what: { kind: K; data: DataOf<K>; who: string },
  head: Head,
  stamp: Stamp
): Result<Sealed, BadData> {
  const parsed = v.safeParse(kinds[what.kind], plain(what.data));
  if (!parsed.success) {
    const issue = parsed.issues[0];
    return fail({ tag: 'bad-data', kind: what.kind, path: v.getDotPath(issue) ?? '', cause: issue.message });
  }
  const tick = Math.min(lastTick, Math.max(0, Math.trunc(stamp.now), head.tick + 1));
  const envelope: Envelope = {
    v: 1,
    id: uuid7(Math.max(0, stamp.now), stamp.random),
    campaign: head.campaign,
    device: head.device,
    seq: head.seq + 1,
    at: rfc3339(stamp.now, stamp.offset),
    mono: stamp.mono,
    run: stamp.run,
    tick,
    who: String(plain(what.who)).slice(0, 120),
    app: stamp.app,
    prev: head.hash,
    kind: what.kind,
    data: parsed.output
  };
  const event = envelope as CampaignEvent;
  const text = canonicalJson(event);
  const seal = sha256OfText(text);
  rememberSeal(event, seal);
  return ok({ event, text, seal, head: { ...head, seq: head.seq + 1, hash: seal, tick } });
}
