import { aValue, pairVariance } from '../a-value.ts';
import { connectedParts } from '../connected-parts.ts';
import { informationMatrix } from '../information-matrix.ts';
import { moorePenrose } from '../moore-penrose.ts';
import { bestExtraSession, sessionPricing } from './extra-session.ts';

export interface RepairRequest {
  /** Number of treatments t. */
  treatments: number;
  /** The design as planned: treatments of each session. */
  planned: readonly (readonly number[])[];
  /** What counts of each planned session so far; empty when nothing does. */
  kept: readonly (readonly number[])[];
  /** Slots of one more session. */
  slots: number;
  /** Specimens left of each treatment; null where there are enough; the whole list may be null. */
  specimens: readonly (number | null)[] | null;
}

/** A way to mend a design, with its price. A-values are null while some difference cannot be estimated. */
export type RepairOption =
  | { kind: 'leave'; aValue: number | null; runs: 0 }
  /** The planned session again, as a session of its own; `possible` is false when a specimen is missing. */
  | { kind: 'rerun'; session: number; treatments: number[]; aValue: number | null; runs: number; possible: boolean }
  /** The one more session that brings the A-value down most, and others that are as good. */
  | {
      kind: 'extra';
      treatments: number[];
      equallyGood: number[][];
      exhaustive: boolean;
      aValue: number;
      runs: number;
    };

export interface RepairReport {
  plannedAValue: number;
  /** Null while some difference cannot be estimated. */
  aValue: number | null;
  /** Treatments that can still be compared among themselves; one part when nothing is lost for good. */
  parts: number[][];
  /** Variances of differences in units of σ², now and planned; `now` is null where it cannot be estimated. */
  pairs: { a: number; b: number; planned: number; now: number | null }[];
  /** Leave it, the best extra session, and each spoilt session again; cheapest A-value first. */
  options: RepairOption[];
}

/**
 * Returns what ruined runs cost a design and what mends it.
 *
 * **Checked by** test/core/design/repair/plan-repair.test.ts
 */
export function planRepair({ treatments: t, planned, kept, slots, specimens }: RepairRequest): RepairReport {
  if (kept.length !== planned.length)
    throw new RangeError(`planRepair: ${kept.length} sessions, not ${planned.length}`);
  const now = kept.filter((block) => block.length > 0);
  const left = (i: number): number => specimens?.[i] ?? Infinity;
  const finite = (value: number): number | null => (value === Infinity ? null : value);
  const available = Array.from({ length: t }, (_, i) => i).filter((i) => left(i) >= 1);

  const before = designOf(planned, t);
  const after = designOf(now, t);
  const priced = after.aValue === Infinity ? null : sessionPricing(now, t);

  const options: RepairOption[] = [{ kind: 'leave', aValue: finite(after.aValue), runs: 0 }];
  const extra = bestExtraSession(now, t, available, slots, priced);
  if (extra) {
    options.push({
      kind: 'extra',
      treatments: extra.sessions[0]!,
      equallyGood: extra.sessions.slice(1),
      exhaustive: extra.exhaustive,
      aValue: extra.aValue,
      runs: extra.sessions[0]!.length
    });
  }
  planned.forEach((block, session) => {
    if (kept[session]!.length >= block.length) return;
    // The session again is a session of its own: its offset is a new one.
    options.push({
      kind: 'rerun',
      session,
      treatments: [...block],
      aValue: finite(priced ? priced(block) : joins(after.parts, block) ? aValue([...now, block], t) : Infinity),
      runs: block.length,
      possible: block.every((i) => left(i) >= 1)
    });
  });
  options.sort((a, b) => (a.aValue ?? Infinity) - (b.aValue ?? Infinity));
  return {
    plannedAValue: before.aValue,
    aValue: finite(after.aValue),
    parts: after.parts,
    pairs: pairsOf(before, after, t),
    options
  };
}

const joins = (parts: readonly (readonly number[])[], block: readonly number[]): boolean =>
  parts.every((part) => part.some((i) => block.includes(i)));

interface Design {
  parts: number[][];
  /** Infinite while it is in parts. */
  aValue: number;
  /** Variance of a difference in units of σ²; null between parts. */
  variance: (a: number, b: number) => number | null;
}

function pairsOf(before: Design, after: Design, t: number): RepairReport['pairs'] {
  const pairs: RepairReport['pairs'] = [];
  for (let a = 0; a < t; a++)
    for (let b = a + 1; b < t; b++)
      pairs.push({ a, b, planned: before.variance(a, b) ?? Infinity, now: after.variance(a, b) });
  return pairs;
}

/** Each connected part with its own Moore–Penrose inverse. */
function designOf(blocks: readonly (readonly number[])[], t: number): Design {
  const parts = connectedParts(blocks, t);
  const partOf = new Int32Array(t);
  const placeOf = new Int32Array(t);
  parts.forEach((part, at) =>
    part.forEach((i, place) => {
      partOf[i] = at;
      placeOf[i] = place;
    })
  );
  const own = parts.map((): number[][] => []);
  for (const block of blocks) if (block.length > 0) own[partOf[block[0]!]!]!.push(block.map((i) => placeOf[i]!));
  const inverses = parts.map((part, at) => moorePenrose(informationMatrix(own[at]!, part.length), part.length));
  const variance: Design['variance'] = (a, b) => {
    const inverse = partOf[a] === partOf[b] ? inverses[partOf[a]!] : undefined;
    return inverse ? pairVariance(inverse, parts[partOf[a]!]!.length, placeOf[a]!, placeOf[b]!) : null;
  };
  const whole = parts.length === 1 ? inverses[0] : undefined;
  let trace = 0;
  if (whole) for (let i = 0; i < t; i++) trace += whole[i * t + i]!;
  return { parts, aValue: whole ? (2 * trace) / (t - 1) : Infinity, variance };
}
