import { aValue, pairVariance } from '../a-value.ts';
import { criterionBound } from '../bounds.ts';
import { concurrenceRange, replications } from '../concurrence.ts';
import { isConnected } from '../connected-parts.ts';
import { designPrecision } from '../design-precision.ts';
import { efficiencyFactors } from '../efficiency-factors.ts';
import { informationMatrix } from '../information-matrix.ts';
import { moorePenrose } from '../moore-penrose.ts';
import type { Construction, DesignChoice, DesignRequest } from '../propose-types.ts';
import { controlPairs } from '../search/search-problem.ts';
import { assignMachines } from './assign-machines.ts';
import { labelClasses, searchProblem } from './session-plan.ts';

/**
 * Returns a design as a choice: everything about it is counted or computed from its sessions, nothing is taken on the word
 * of a construction.
 *
 * @param blocks treatments of each session, of a connected design
 * @param groupOf shift group of each session, or null
 *
 * **Checked by** test/core/design/propose/propose-designs.test.ts
 */
export function makeChoice(
  request: DesignRequest,
  id: string,
  blocks: number[][],
  groupOf: number[] | null,
  construction: Construction
): DesignChoice {
  const t = request.treatments;
  const sizes = blocks.map((block) => block.length);
  const r = replications(blocks, t);
  const meets = concurrenceRange(blocks, t);
  const range = (list: readonly number[]): { min: number; max: number } => ({
    min: Math.min(...list),
    max: Math.max(...list)
  });
  const sessionSize = range(sizes);
  const replication = range(r);
  const binary = blocks.every((block) => new Set(block).size === block.length);
  const balanced =
    binary && sessionSize.min === sessionSize.max && replication.min === replication.max && meets.min === meets.max;
  const variances = criterion(request, blocks);
  const bound = criterionBound(searchProblem(request, { sizes, groupOf }, groupOf === null));
  const machines = assignMachines(
    blocks,
    t,
    request.machines.map((machine) => machine.slots)
  );
  const specimens = sizes.reduce((sum, size) => sum + size, 0);
  return {
    id,
    blocks,
    machineOf: machines.machineOf,
    groupOf,
    labelClass: labelClasses(request),
    construction,
    sessions: blocks.length,
    specimens,
    sessionSize,
    replication,
    concurrence: meets,
    balanced,
    connected: isConnected(blocks, t),
    efficiency: efficiencyFactors(blocks, t).mean,
    aValue: aValue(blocks, t),
    bound,
    ofBound: Math.min(1, bound.aValue / variances.value),
    control: variances.control,
    connectedMachines: machines.connectedMachines,
    precision: designPrecision(blocks, t, request),
    time: timeOf(request, machines.machineOf, groupOf),
    fits: {
      sessions: request.maxSessions === null || request.sessionSizes !== null || blocks.length <= request.maxSessions,
      specimens: r.every((count, i) => count <= (request.specimens?.[i] ?? count))
    }
  };
}

/** The criterion that counts, and with controls the mean variances apart. */
function criterion(
  request: DesignRequest,
  blocks: readonly (readonly number[])[]
): { value: number; control: DesignChoice['control'] } {
  const t = request.treatments;
  if (!request.control) return { value: aValue(blocks, t), control: null };
  const inverse = moorePenrose(informationMatrix(blocks, t), t)!;
  const mean = (pairs: [number, number][]): number =>
    pairs.reduce((sum, [i, l]) => sum + pairVariance(inverse, t, i, l), 0) / pairs.length;
  const pairs = controlPairs(t, request.control.treatments);
  const control = { testControl: mean(pairs.testControl), testTest: mean(pairs.testTest) };
  const value = {
    'test-control': control.testControl,
    'test-test': control.testTest,
    half: 0.5 * (control.testControl + control.testTest)
  }[request.control.weigh];
  return { value, control };
}

function timeOf(
  request: DesignRequest,
  machineOf: readonly number[],
  groupOf: readonly number[] | null
): DesignChoice['time'] {
  const loads = (sessions: readonly number[]): number =>
    Math.max(...request.machines.map((_, m) => sessions.filter((machine) => machine === m).length));
  const perShift = request.sessionsPerShift;
  const groups = groupOf ? [...new Set(groupOf)] : [0];
  const shifts = (sessions: readonly number[]): number => Math.ceil(loads(sessions) / perShift!);
  return {
    rounds: loads(machineOf),
    machineMinutes: request.minutesPerSession === null ? null : machineOf.length * request.minutesPerSession,
    // A shift group starts a new shift.
    shifts:
      perShift === null
        ? null
        : groups.reduce((sum, group) => sum + shifts(machineOf.filter((_, j) => !groupOf || groupOf[j] === group)), 0)
  };
}
