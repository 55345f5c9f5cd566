import { seededRandom } from '#lib/core/numerics/random/seeded-random.ts';
import { connectedParts } from '../connected-parts.ts';

/** How a design's sessions are shared out among machines. */
export interface MachineShare {
  /** Machine (index) of each session. */
  machineOf: number[];
  /** How many machines have a part that compares all treatments by itself. */
  connectedMachines: number;
}

/**
 * Shares the sessions out among machines so that each machine's part is connected where that can be, and every treatment
 * is on every machine about equally often.
 *
 * Sessions go in turn to the machine with the fewest loadings that has the slots; then random exchanges of two sessions of
 * two machines are kept while they lower 1000 × (parts beyond one, summed over machines) + Σ (visits of a treatment to a
 * machine)². A fixed number of tries, so the same design gives the same answer.
 *
 * @param slots slots of each machine
 *
 * Errors: throws when a session fits no machine.
 *
 * **Checked by** test/core/design/propose/assign-machines.test.ts
 */
export function assignMachines(
  blocks: readonly (readonly number[])[],
  treatments: number,
  slots: readonly number[]
): MachineShare {
  const machineOf = new Array<number>(blocks.length).fill(0);
  const load = new Array<number>(slots.length).fill(0);
  for (const j of [...blocks.keys()].sort((a, b) => blocks[b]!.length - blocks[a]!.length || a - b)) {
    const fitting = [...slots.keys()].filter((m) => slots[m]! >= blocks[j]!.length);
    if (fitting.length === 0) throw new RangeError(`assignMachines: no machine holds ${blocks[j]!.length} specimens`);
    const chosen = fitting.reduce((best, m) =>
      load[m]! < load[best]! || (load[m] === load[best] && slots[m]! < slots[best]!) ? m : best
    );
    machineOf[j] = chosen;
    load[chosen]! += 1;
  }
  if (slots.length > 1) improve(blocks, treatments, slots, machineOf);
  const connectedMachines = slots.filter((_, m) => partsOf(blocks, treatments, machineOf, m) === 1).length;
  return { machineOf, connectedMachines };
}

const partsOf = (
  blocks: readonly (readonly number[])[],
  treatments: number,
  machineOf: readonly number[],
  machine: number
): number =>
  connectedParts(
    blocks.filter((_, j) => machineOf[j] === machine),
    treatments
  ).length;

function improve(
  blocks: readonly (readonly number[])[],
  treatments: number,
  slots: readonly number[],
  machineOf: number[]
): void {
  const random = seededRandom(`machines ${blocks.length} ${treatments} ${slots.join()}`);
  const visits = slots.map(() => new Int32Array(treatments));
  blocks.forEach((block, j) => block.forEach((i) => (visits[machineOf[j]!]![i]! += 1)));
  const penalty = (machine: number): number =>
    1000 * (partsOf(blocks, treatments, machineOf, machine) - 1) +
    visits[machine]!.reduce((sum, count) => sum + count * count, 0);
  const move = (j: number, to: number): void => {
    for (const i of blocks[j]!) {
      visits[machineOf[j]!]![i]! -= 1;
      visits[to]![i]! += 1;
    }
    machineOf[j] = to;
  };
  const now = slots.map((_, m) => penalty(m));
  const tries = Math.min(4000, Math.ceil(3e6 / (blocks.length * 4 + treatments)));
  for (let attempt = 0; attempt < tries; attempt++) {
    const [j, l] = [random.below(blocks.length), random.below(blocks.length)];
    const [m, n] = [machineOf[j]!, machineOf[l]!];
    if (m === n || blocks[j]!.length > slots[n]! || blocks[l]!.length > slots[m]!) continue;
    move(j, n);
    move(l, m);
    const [pm, pn] = [penalty(m), penalty(n)];
    if (pm + pn <= now[m]! + now[n]!) [now[m], now[n]] = [pm, pn];
    else {
      move(j, m);
      move(l, n);
    }
  }
}
