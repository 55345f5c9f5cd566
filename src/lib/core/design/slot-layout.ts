import type { SeededRandom } from '#lib/core/numerics/random/seeded-random.ts';
import { edgeColouring } from './edge-colouring.ts';
import { expectedSlotCounts, slotCounts, slotImbalance } from './slot-counts.ts';
import type { SlotRow } from './slot-counts.ts';

/** Which treatment lies in which slot of each session, and how well the slots are balanced. */
export interface SlotLayout {
  /** One row a session, as long as the machine has slots. */
  rows: SlotRow[];
  /** `counts[i][p]`: how often treatment i visits slot p. */
  counts: number[][];
  /** Largest difference between a treatment's counts over the slots. */
  range: number;
  /** Σ (count − expected)²; see slot-counts.ts. */
  imbalance: number;
  /**
   * `exact`: every treatment visits every slot equally often; `within-one`: its counts differ by at most one, which is
   * the best possible; `near`: found by a search, because slots in service differ from session to session.
   */
  balance: 'exact' | 'within-one' | 'near';
}

const rangeOf = (row: readonly number[]): number => Math.max(...row) - Math.min(...row);

/**
 * Returns a random slot layout in which each treatment visits each slot as equally often as can be.
 *
 * Where the same S slots are in service in every session, each treatment is split into vertices of at most S visits and
 * the treatment–session graph is coloured with S colours (slots): a full vertex sees each slot once, so counts differ by
 * at most one. Where slots in service differ, the imbalance is brought down by exchanging slots inside sessions.
 *
 * @param blocks treatments of each session, 0 … treatments − 1
 * @param inService for each session, which slots are in service (at least as many as treatments)
 *
 * **Source**: König (1916) for the colouring; the use for balancing positions is common practice.
 * **Checked by** test/core/design/slot-layout.test.ts
 */
export function layOutSlots(
  blocks: readonly (readonly number[])[],
  inService: readonly (readonly boolean[])[],
  treatments: number,
  random: SeededRandom
): SlotLayout {
  blocks.forEach((block, j) => {
    const usable = inService[j]!.filter(Boolean).length;
    if (block.length > usable) throw new RangeError(`layOutSlots: session ${j} has ${block.length} in ${usable} slots`);
  });
  const slots = Math.max(0, ...inService.map((flags) => flags.length));
  const usable = inService.map((flags) => [...flags.keys()].filter((slot) => flags[slot]));
  const same = usable.every((row) => row.join() === usable[0]!.join());
  const rows = same
    ? colouredRows(blocks, usable[0] ?? [], slots, treatments, random)
    : searchedRows(blocks, inService, usable, slots, treatments, random);
  const counts = slotCounts(rows, treatments, slots);
  const open = same ? (usable[0] ?? []) : [...Array(slots).keys()];
  const range = Math.max(0, ...counts.map((row) => (open.length ? rangeOf(open.map((slot) => row[slot]!)) : 0)));
  const imbalance = slotImbalance(counts, expectedSlotCounts(blocks, inService, treatments, slots));
  const balance = range === 0 ? 'exact' : same ? 'within-one' : 'near';
  return { rows, counts, range, imbalance, balance };
}

function colouredRows(
  blocks: readonly (readonly number[])[],
  usable: readonly number[],
  slots: number,
  treatments: number,
  random: SeededRandom
): (number | null)[][] {
  const colours = usable.length;
  const visits: number[][] = Array.from({ length: treatments }, () => []);
  blocks.forEach((block, j) => block.forEach((treatment) => visits[treatment]!.push(j)));
  const left: number[] = [];
  const right: number[] = [];
  const treatmentOf: number[] = [];
  let vertices = 0;
  visits.forEach((sessions, treatment) => {
    random.shuffle(sessions).forEach((session, visit) => {
      if (visit % colours === 0) vertices++;
      left.push(vertices - 1);
      right.push(session);
      treatmentOf.push(treatment);
    });
  });
  const colourOf = edgeColouring(left, right, vertices, blocks.length, colours, random);
  const slotOf = random.shuffle([...usable]);
  const rows = blocks.map(() => new Array<number | null>(slots).fill(null));
  colourOf.forEach((colour, edge) => (rows[right[edge]!]![slotOf[colour]!] = treatmentOf[edge]!));
  return rows;
}

/** Exchanges inside sessions, kept while they do not raise the imbalance; the best of several random starts. */
function searchedRows(
  blocks: readonly (readonly number[])[],
  inService: readonly (readonly boolean[])[],
  usable: readonly (readonly number[])[],
  slots: number,
  treatments: number,
  random: SeededRandom
): (number | null)[][] {
  const expected = expectedSlotCounts(blocks, inService, treatments, slots);
  const movable = [...blocks.keys()].filter((j) => usable[j]!.length > 1 && blocks[j]!.length > 0);
  let best: (number | null)[][] = [];
  let bestImbalance = Infinity;
  for (let start = 0; start < 12; start++) {
    const rows = blocks.map((block, j) => {
      const row = new Array<number | null>(slots).fill(null);
      const places = random.shuffle([...usable[j]!]);
      block.forEach((treatment, at) => (row[places[at]!] = treatment));
      return row;
    });
    const counts = slotCounts(rows, treatments, slots);
    let imbalance = slotImbalance(counts, expected);
    const excess = (i: number, p: number): number => counts[i]![p]! - expected[i]![p]!;
    const move = (row: number[], from: number, to: number): void => {
      row[from]! -= 1;
      row[to]! += 1;
    };
    const tries = movable.length === 0 ? 0 : 400 * blocks.length * slots;
    for (let attempt = 0; attempt < tries; attempt++) {
      const j = movable[random.below(movable.length)]!;
      const p = usable[j]![random.below(usable[j]!.length)]!;
      const q = usable[j]![random.below(usable[j]!.length)]!;
      const a = rows[j]![p]!;
      const b = rows[j]![q]!;
      if (a === b) continue;
      let change = 0;
      if (a !== null) change += 2 + 2 * (excess(a, q) - excess(a, p));
      if (b !== null) change += 2 + 2 * (excess(b, p) - excess(b, q));
      // A worse exchange is taken now and then, so that the walk leaves the plateaus of a small count.
      if (change > 1e-9 && random.below(1 + Math.ceil(change * (4 + (60 * attempt) / tries))) > 0) continue;
      if (change > 1e-9 && attempt > 0.8 * tries) continue;
      rows[j]![p] = b;
      rows[j]![q] = a;
      if (a !== null) move(counts[a]!, p, q);
      if (b !== null) move(counts[b]!, q, p);
      imbalance += change;
      if (imbalance < bestImbalance - 1e-9) {
        bestImbalance = imbalance;
        best = rows.map((row) => [...row]);
      }
    }
    if (bestImbalance === Infinity) best = rows;
  }
  return best;
}
