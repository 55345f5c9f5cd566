import type { ObservationRow, Observations } from '#lib/core/analysis/observations.ts';
import { normalQuantile } from '#lib/core/numerics/distributions/normal.ts';
import type { SeededRandom } from '#lib/core/numerics/random/seeded-random.ts';

export const normal = (random: SeededRandom): number => normalQuantile((random.bits() + 0.5) / 4294967296);

/** Runs of a design: treatments by session, with runs left out. */
export function campaignOf(blocks: readonly (readonly number[])[], missing: readonly number[] = []): Observations {
  const treatments = Math.max(...blocks.flat()) + 1;
  const all = blocks.flatMap((block, session) => block.map((treatment, slot) => ({ treatment, session, slot })));
  const rows = all
    .filter((_, i) => !missing.includes(i))
    .map((run, i): ObservationRow => ({ ...run, y: 0, ruined: false, limit: 'none', runId: `r${i}` }));
  const named = (n: number) => Array.from({ length: n }, (_, i) => ({ id: String(i), name: String(i) }));
  return {
    treatments: named(treatments),
    sessions: named(blocks.length),
    rows,
    direction: 'lower',
    control: null,
    alpha: 0.05,
    equivalenceMargin: null,
    primary: 'fixed',
    factors: { slot: false, machine: false, shift: false },
    kind: 'number',
    seed: 1
  };
}

/** A design with nearly equal replication: each session takes the treatments used least, at random among equals. */
export function spreadDesign(t: number, b: number, k: number, random: SeededRandom): number[][] {
  const used = new Array<number>(t).fill(0);
  return Array.from({ length: b }, () => {
    const order = used.map((count, i) => ({ i, key: count + 0.99 * random.next() })).sort((x, y) => x.key - y.key);
    return order.slice(0, k).map(({ i }) => {
      used[i]!++;
      return i;
    });
  });
}

/** New readings: session offsets of standard deviation `between`, runs of 1, treatments as given. */
export function drawReadings(
  input: Observations,
  effects: readonly number[],
  between: number,
  random: SeededRandom
): Observations {
  const offsets = input.sessions.map(() => between * normal(random));
  const rows = input.rows.map((row) => ({
    ...row,
    y: 50 + effects[row.treatment]! + offsets[row.session]! + normal(random)
  }));
  return { ...input, rows };
}
