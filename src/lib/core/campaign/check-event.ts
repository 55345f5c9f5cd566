import * as v from 'valibot';
import { fail, ok, type Result } from '../result.ts';
import { type CampaignEvent, EnvelopeSchema, kinds, type UnknownEvent } from './event.ts';
import { fits } from './fits.ts';

export type BadEvent = { tag: 'bad-event'; path: string; cause: string };

/** Is it an event whose kind this program understands? */
export const isKnown = (event: CampaignEvent | UnknownEvent): event is CampaignEvent =>
  Object.hasOwn(kinds, event.kind);

const fitsEnvelope = fits(EnvelopeSchema);
const fitsKind = new Map(Object.entries(kinds).map(([kind, schema]) => [kind, fits(schema)]));

/**
 * Reads an event from a parsed JSON value. An unknown kind is let through as it is; a known kind must fit its schema.
 * Errors: `bad-event` with the path to the field and the cause in a few words.
 * Checked by: test/core/campaign/make-event.test.ts.
 */
export function checkEvent(value: unknown): Result<CampaignEvent | UnknownEvent, BadEvent> {
  // Nearly every event is as it should be; the schema is asked for the rest, and says what is wrong.
  if (fitsEnvelope(value)) {
    const event = value as UnknownEvent;
    if (fitsKind.get(event.kind)?.(event.data) ?? true) return ok(event);
  }
  const envelope = v.safeParse(EnvelopeSchema, value, { abortEarly: true });
  if (!envelope.success) return bad(envelope.issues[0], '');
  const { kind, data } = envelope.output;
  if (!Object.hasOwn(kinds, kind)) return ok(envelope.output);
  const parsed = v.safeParse(kinds[kind as keyof typeof kinds] as v.GenericSchema, data, { abortEarly: true });
  if (!parsed.success) return bad(parsed.issues[0], 'data.');
  return ok(envelope.output as CampaignEvent);
}

const bad = (issue: v.BaseIssue<unknown>, at: string): Result<never, BadEvent> =>
  fail({ tag: 'bad-event', path: at + (v.getDotPath(issue) ?? ''), cause: issue.message });
