import { logGamma } from '../../numerics/distributions/stirling-error.ts';
import { seededRandom } from '../../numerics/random/seeded-random.ts';
import { fail, ok } from '../../result.ts';
import type { Section } from '../reason.ts';

export interface RuinCount {
  ruined: number;
  kept: number;
}

/** Different tables beyond which the distribution is simulated. */
const MOST_STATES = 20_000;
const DRAWS = 20_000;
/** Tables whose probabilities agree to this are equally likely. */
const SAME = 1e-7;

/**
 * Tests whether ruin is spread over the treatments as chance would do it, given how many runs each treatment had and how many
 * were ruined in all: the probability of all tables that are no likelier than the one observed.
 *
 *     P(x) = Π_i C(n_i, x_i) / C(N, m)
 *
 * Exact while tables with equal probability are few enough to be gathered; else simulated with the seed, and `error` is the
 * standard error of p.
 *
 * Source: G. H. Freeman & J. H. Halton (1951), Biometrika 38, 141–149 (the r×c form of Fisher's exact test).
 * Checked by: test/core/analysis/ruined/ruin-association.test.ts (R's fisher.test)
 */
export function ruinAssociation(
  counts: readonly RuinCount[],
  seed: number
): Section<{ p: number; method: 'exact' | 'simulated'; error: number }> {
  const used = counts.filter(({ ruined, kept }) => ruined + kept > 0);
  const kept = used.reduce((s, count) => s + count.kept, 0);
  if (used.length < 2) return fail({ tag: 'too-few-readings', have: used.length, need: 2 });
  if (kept === 0) return fail({ tag: 'no-kept-readings' });
  const sizes = used.map(({ ruined, kept: k }) => ruined + k);
  const observed = used.reduce((s, { ruined }, i) => s + logChoose(sizes[i]!, ruined), 0);
  const m = used.reduce((s, { ruined }) => s + ruined, 0);
  const exact = exactTail(sizes, m, observed);
  if (exact !== null) return ok({ p: Math.min(1, exact), method: 'exact', error: 0 });
  const p = simulatedTail(sizes, m, observed, seed);
  return ok({ p, method: 'simulated', error: Math.sqrt((p * (1 - p)) / DRAWS) });
}

const logChoose = (n: number, k: number): number => logGamma(n + 1) - logGamma(k + 1) - logGamma(n - k + 1);

/** Adds treatment after treatment, gathering partial tables with as many ruined runs and the same weight. */
function exactTail(sizes: readonly number[], m: number, observed: number): number | null {
  const left = sizes.map((_, i) => sizes.slice(i + 1).reduce((s, n) => s + n, 0));
  let states = new Map<string, { used: number; log: number; tables: number }>();
  states.set('0 0', { used: 0, log: 0, tables: 1 });
  for (const [i, n] of sizes.entries()) {
    const next: typeof states = new Map();
    for (const { used, log, tables } of states.values()) {
      const least = Math.max(0, m - used - left[i]!);
      for (let x = least; x <= Math.min(n, m - used); x++) {
        const sum = log + logChoose(n, x);
        const key = `${used + x} ${Math.round(sum * 1e8)}`;
        const known = next.get(key);
        if (known) known.tables += tables;
        else next.set(key, { used: used + x, log: sum, tables });
      }
    }
    if (next.size > MOST_STATES) return null;
    states = next;
  }
  const total = logChoose(
    sizes.reduce((s, n) => s + n, 0),
    m
  );
  let p = 0;
  for (const { log, tables } of states.values()) if (log <= observed + SAME) p += tables * Math.exp(log - total);
  return p;
}

function simulatedTail(sizes: readonly number[], m: number, observed: number, seed: number): number {
  const random = seededRandom(`ruin-association ${seed}`);
  const owner = sizes.flatMap((n, i) => new Array<number>(n).fill(i));
  const weight = sizes.map((n) => Float64Array.from({ length: n + 1 }, (_, k) => logChoose(n, k)));
  let hits = 0;
  for (let draw = 0; draw < DRAWS; draw++) {
    const x = new Int32Array(sizes.length);
    for (let k = 0; k < m; k++) {
      const at = k + random.below(owner.length - k);
      [owner[k], owner[at]] = [owner[at]!, owner[k]!];
      x[owner[k]!]!++;
    }
    const log = weight.reduce((s, table, i) => s + table[x[i]!]!, 0);
    if (log <= observed + SAME) hits++;
  }
  // Counting the observed table keeps the estimate above zero.
  return (hits + 1) / (DRAWS + 1);
}
