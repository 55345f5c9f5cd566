import fc from 'fast-check';
import * as v from 'valibot';
import { describe, expect, it } from 'vitest';
import { EnvelopeSchema, kinds } from '#lib/core/campaign/event.ts';
import { fits } from '#lib/core/campaign/fits.ts';
import { IssuedPlanSchema } from '#lib/core/campaign/plan.ts';
import { deviceA, issued, Recorder } from './story.ts';

type Schema = v.GenericSchema;
const schemas: Record<string, Schema> = { ...kinds, envelope: EnvelopeSchema as Schema, plan: IssuedPlanSchema };

/** Values of the kinds that events are made of, and what just is not one. */
const anything = fc.oneof(
  fc.constantFrom<unknown>(null, undefined, '', 0, 1, -1, 1.5, 1e9, 1e9 + 1, NaN, Infinity, true, [], {}, [null], 'x'),
  fc.string({ maxLength: 60 }),
  fc.double(),
  fc.constantFrom('campaign', 'session', 'none', 'keypad', 'row', 'row-x', 's1', '0'.repeat(64), 'a'.repeat(5000))
);

const events = (() => {
  const a = new Recorder(deviceA).begin();
  a.reading(1, 0, 1);
  a.record('noted', { about: 'campaign', session: null, slot: null, text: 'note' });
  a.record('ruined', { session: 's1', slot: 0, reason: 'torn', next: 'leave-out' });
  a.record('exported', { events: 3, sha256: '0'.repeat(64), how: 'file', upTo: 2 });
  return a.events;
})();

/** The same value with one place of it changed: another value, a field gone (in a list: a hole), one more. */
function changed(value: unknown, path: number, to: unknown, how: number): unknown {
  const copy: unknown = structuredClone(value);
  const places: [Record<string, unknown>, string][] = [];
  const walk = (one: unknown): void => {
    if (one === null || typeof one !== 'object') return;
    for (const key of Object.keys(one)) {
      places.push([one as Record<string, unknown>, key]);
      walk((one as Record<string, unknown>)[key]);
    }
  };
  walk(copy);
  const place = places[path % Math.max(1, places.length)];
  if (!place) return to;
  const [owner, key] = place;
  if (how === 0) owner[key] = to;
  else if (how === 1) delete owner[key];
  else if (Array.isArray(owner)) owner.push(to);
  else owner[`${key}x`] = to;
  return copy;
}

describe('fits', () => {
  it('fits(schema) is true of every event that is recorded, so that the schema is not asked for each', () => {
    expect(events.length).toBeGreaterThan(4);
    for (const event of events) {
      expect(fits(EnvelopeSchema as Schema)(event)).toBe(true);
      expect(fits(kinds[event.kind] as Schema)(event.data)).toBe(true);
    }
    expect(fits(IssuedPlanSchema)(issued)).toBe(true);
  });

  it('fits(schema) of an event changed in one place says what the schema says, and hands back the same value', () => {
    const seeds: [string, unknown][] = [
      ...events.map((event): [string, unknown] => ['envelope', event]),
      ...events.map((event): [string, unknown] => [event.kind, event.data])
    ];
    const counts = { accepted: 0, refused: 0 };
    fc.assert(
      fc.property(fc.constantFrom(...seeds), fc.nat(), anything, fc.nat(2), ([name, value], path, to, how) => {
        const schema = schemas[name] as Schema;
        const one = changed(value, path, to, how);
        const parsed = v.safeParse(schema, one);
        expect(fits(schema)(one)).toBe(parsed.success);
        if (parsed.success) expect(parsed.output).toEqual(one);
        counts[parsed.success ? 'accepted' : 'refused']++;
      }),
      { numRuns: 1500 }
    );
    expect(counts.accepted).toBeGreaterThan(100);
    expect(counts.refused).toBeGreaterThan(100);
  });

  it('fits(schema of a type it does not know) is false: the schema is asked', () => {
    expect(fits(v.date())(new Date(0))).toBe(false);
    expect(fits(v.pipe(v.string(), v.email()))('a@example.org')).toBe(false);
    expect(fits(v.strictObject({ a: v.optional(v.string(), 'b') }))({})).toBe(false);
  });
});
