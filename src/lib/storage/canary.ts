import * as v from 'valibot';
import type { CampaignSummary } from '#lib/core/campaign/summary.ts';

/**
 * What the device remembers outside the database about what is in it: enough to notice that something is gone, never
 * enough to replace it. Kept in localStorage, which survives when the browser replaces a damaged database by an empty one.
 */
const RememberedSchema = v.strictObject({
  title: v.string(),
  events: v.number(),
  /** Id of the last event written here. */
  last: v.string(),
  at: v.string(),
  /** RFC 3339 time of this device's last verified file; null before the first. */
  exported: v.nullable(v.string()),
  /** Events that no verified file held. */
  notExported: v.number()
});
const CanarySchema = v.strictObject({ device: v.string(), campaigns: v.record(v.string(), RememberedSchema) });

export type Canary = v.InferOutput<typeof CanarySchema>;

const key = 'evenload-canary';

/** What is remembered; null when nothing is, or when it cannot be read. */
export function readCanary(): Canary | null {
  try {
    const text = localStorage.getItem(key);
    const parsed = text === null ? null : v.safeParse(CanarySchema, JSON.parse(text));
    return parsed?.success ? parsed.output : null;
  } catch {
    return null;
  }
}

function writeCanary(canary: Canary): void {
  try {
    localStorage.setItem(key, JSON.stringify(canary));
  } catch {
    // No room or no localStorage: the canary is a second line of defence, the record is in the database.
  }
}

/** Remembers how a campaign stands after a completed write. A smaller count never replaces a larger one. */
export function remember(device: string, summary: CampaignSummary, last: string, at: string, exported: boolean): void {
  const canary = readCanary() ?? { device, campaigns: {} };
  const before = canary.campaigns[summary.id];
  if (before && before.events > summary.events) return;
  const { title, events, notExported } = summary;
  const campaigns = {
    ...canary.campaigns,
    [summary.id]: { title, events, last, at, exported: exported ? at : (before?.exported ?? null), notExported }
  };
  writeCanary({ device, campaigns });
}

/** Forgets a campaign that was taken off the device on purpose, or whose loss somebody has acknowledged. */
export function forget(campaign: string): void {
  const canary = readCanary();
  if (!canary) return;
  const { [campaign]: _gone, ...campaigns } = canary.campaigns;
  writeCanary({ ...canary, campaigns });
}

/** Forgets everything, with the rest of the device. */
export function forgetAll(): void {
  localStorage.removeItem(key);
}
