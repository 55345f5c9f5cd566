import { GENERATOR, seededRandom } from '#lib/core/numerics/random/seeded-random.ts';
import type { SeededRandom } from '#lib/core/numerics/random/seeded-random.ts';
import { chanceOrder, earlyStop, earlyStopOrder } from './early-stop-order.ts';
import { layOutSlots } from './slot-layout.ts';
import type { SlotLayout } from './slot-layout.ts';
import { drawSpecimenCodes } from './specimen-codes.ts';

/** Name and version of the rules by which chance makes a loading order. Any change of the rules is a new version. */
export const LAYOUT_ALGORITHM = { name: 'loading-order', version: 2 } as const;

export interface LayoutRequest {
  /** Ids of the treatments, in the person's order. */
  treatments: readonly string[];
  /** The design: treatments of each session as labels 0 … t − 1. */
  blocks: readonly (readonly number[])[];
  /** Machines with the slots that are in service, in the machine's order. */
  machines: readonly { id: string; inService: readonly boolean[] }[];
  /** Machine (index) of each block; without it sessions go to the machines in turn. */
  machineOf?: readonly number[] | undefined;
  /** Shift group of each block when the design is resolvable: a group is never torn apart. */
  groupOf?: readonly number[] | null | undefined;
  /** Sessions a machine does in one shift; null when shifts do not matter. */
  sessionsPerShift: number | null;
  /**
   * Class of each design label; label i belongs to treatment i at first, and chance exchanges only labels of one class.
   * Needed when treatments are not alike (control, few specimens, forbidden pairs). Without it all are of one class.
   */
  labelClass?: readonly number[] | undefined;
  /** `early-stop` prefers orders whose first sessions are connected; `chance` restricts nothing. */
  order: 'early-stop' | 'chance';
  /** Spare specimens of each treatment that get a code too. */
  sparesPerTreatment?: number | undefined;
  /** Recorded seed, any text. */
  seed: string;
}

export interface LaidOutSession {
  /** 1-based place in the loading order. */
  number: number;
  /** 1-based shift. */
  shift: number;
  /** Id of the machine. */
  machine: string;
  /** Which block of the design this is. */
  block: number;
  /** One entry a slot of the machine; null where the slot stays empty. */
  slots: ({ treatment: string; specimen: string } | null)[];
}

/** What the draw was not free to do; the screen says each in a sentence. */
export type Restriction =
  | { tag: 'early-stop'; connectedAfter: number }
  | { tag: 'shift-groups' }
  | { tag: 'label-classes'; classes: number }
  | { tag: 'slots-balanced' };

export interface LaidOutPlan {
  seed: string;
  generator: string;
  generatorVersion: number;
  algorithm: string;
  algorithmVersion: number;
  sessions: LaidOutSession[];
  /** `labelOf[i]`: the design label that treatment i (in the request's order) was given. */
  labelOf: number[];
  spares: { treatment: string; specimen: string }[];
  /** Slot balance of each machine; treatments in the request's order. */
  slotBalance: { machine: string; balance: SlotLayout['balance']; range: number; counts: number[][] }[];
  /** Sessions after which all treatments can be compared; null when never. */
  connectedAfter: number | null;
  restrictions: Restriction[];
}

/**
 * Returns the randomised loading order of a design: treatments to design labels, order of sessions, slot of each
 * specimen, specimen codes, all from one seed. The same request gives the same answer on every device, for ever.
 *
 * Each of the four draws has its own stream, seeded with the seed and a word, so that a change in one does not move the
 * others.
 *
 * Errors: throws when the request contradicts itself (a block larger than its machine, unknown labels).
 *
 * **Checked by** test/core/design/lay-out-plan.test.ts
 */
export function layOutPlan(request: LayoutRequest): LaidOutPlan {
  const { treatments, machines, seed } = request;
  check(request);
  const stream = (word: string): SeededRandom => seededRandom(`${LAYOUT_ALGORITHM.name} ${word} ${seed}`);
  const groupOf = request.groupOf ?? null;

  const labelOf = drawLabels(treatments.length, request.labelClass, stream('labels'));
  const treatmentOf = new Array<number>(treatments.length);
  labelOf.forEach((label, treatment) => (treatmentOf[label] = treatment));
  const blocks = request.blocks.map((block) => block.map((label) => treatmentOf[label]!));

  const order =
    request.order === 'early-stop'
      ? earlyStopOrder(blocks, treatments.length, groupOf, stream('order'))
      : chanceOrder(blocks.length, groupOf, stream('order'));
  const machineOf = order.map((block, at) => request.machineOf?.[block] ?? at % machines.length);

  const rows: (readonly (number | null)[])[] = new Array<readonly (number | null)[]>(order.length);
  const slotRandom = stream('slots');
  const slotBalance = machines.map((machine, m) => {
    const mine = [...order.keys()].filter((at) => machineOf[at] === m);
    const layout = layOutSlots(
      mine.map((at) => blocks[order[at]!]!),
      mine.map(() => machine.inService),
      treatments.length,
      slotRandom
    );
    mine.forEach((at, row) => (rows[at] = layout.rows[row]!));
    return { machine: machine.id, balance: layout.balance, range: layout.range, counts: layout.counts };
  });

  const runs = blocks.reduce((sum, block) => sum + block.length, 0);
  const spares = request.sparesPerTreatment ?? 0;
  const codes = drawSpecimenCodes(runs + spares * treatments.length, stream('codes'));
  let used = 0;
  const shiftOf = drawShifts(order, machineOf, groupOf, request.sessionsPerShift);
  const sessions = order.map((block, at) => ({
    number: at + 1,
    shift: shiftOf[at]!,
    machine: machines[machineOf[at]!]!.id,
    block,
    slots: rows[at]!.map((i) => (i === null ? null : { treatment: treatments[i]!, specimen: codes[used++]! }))
  }));

  const { connectedAfter } = earlyStop(
    order.map((block) => blocks[block]!),
    treatments.length
  );
  return {
    seed,
    generator: GENERATOR.name,
    generatorVersion: GENERATOR.version,
    algorithm: LAYOUT_ALGORITHM.name,
    algorithmVersion: LAYOUT_ALGORITHM.version,
    sessions,
    labelOf,
    spares: treatments.flatMap((treatment) =>
      Array.from({ length: spares }, () => ({ treatment, specimen: codes[used++]! }))
    ),
    slotBalance,
    connectedAfter,
    restrictions: restrictions(request, connectedAfter)
  };
}

function check({ treatments, blocks, machines, machineOf, labelClass, groupOf }: LayoutRequest): void {
  const t = treatments.length;
  if (new Set(treatments).size !== t) throw new RangeError('layOutPlan: a treatment id is there twice');
  if (machines.length === 0) throw new RangeError('layOutPlan: there is no machine');
  for (const [name, list] of Object.entries({ machineOf, groupOf })) {
    if (list && list.length !== blocks.length) throw new RangeError(`layOutPlan: ${name} has ${list.length} entries`);
  }
  if (labelClass && labelClass.length !== t) throw new RangeError(`layOutPlan: ${labelClass.length} label classes`);
  for (const block of blocks) {
    for (const label of block) {
      if (!(Number.isInteger(label) && label >= 0 && label < t)) throw new RangeError(`layOutPlan: no label ${label}`);
    }
  }
}

/** The label of each treatment: a random permutation inside each class. */
function drawLabels(t: number, labelClass: readonly number[] | undefined, random: SeededRandom): number[] {
  const labelOf = new Array<number>(t);
  for (const one of new Set(labelClass ?? [0])) {
    const members = Array.from({ length: t }, (_, i) => i).filter((i) => (labelClass?.[i] ?? 0) === one);
    const labels = random.shuffle([...members]);
    members.forEach((treatment, at) => (labelOf[treatment] = labels[at]!));
  }
  return labelOf;
}

/** A machine does so many sessions a shift, one after the other; a shift group of a resolvable design starts a new shift. */
function drawShifts(
  order: readonly number[],
  machineOf: readonly number[],
  groupOf: readonly number[] | null,
  sessionsPerShift: number | null
): number[] {
  const shifts: number[] = [];
  let start = 1;
  let latest = 1;
  let done = new Map<number, number>();
  order.forEach((block, at) => {
    if (at > 0 && groupOf && groupOf[block] !== groupOf[order[at - 1]!]) {
      start = latest + 1;
      done = new Map();
    }
    const before = done.get(machineOf[at]!) ?? 0;
    done.set(machineOf[at]!, before + 1);
    const shift = start + (sessionsPerShift === null ? 0 : Math.floor(before / sessionsPerShift));
    latest = Math.max(latest, shift);
    shifts.push(shift);
  });
  return shifts;
}

function restrictions(request: LayoutRequest, connectedAfter: number | null): Restriction[] {
  const list: Restriction[] = [{ tag: 'slots-balanced' }];
  if (request.order === 'early-stop' && connectedAfter !== null) list.push({ tag: 'early-stop', connectedAfter });
  if (request.groupOf) list.push({ tag: 'shift-groups' });
  const classes = new Set(request.labelClass ?? [0]).size;
  if (classes > 1) list.push({ tag: 'label-classes', classes });
  return list;
}
