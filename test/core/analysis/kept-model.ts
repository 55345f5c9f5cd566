import { fitFixed, solveFixed } from '#lib/core/analysis/fixed/fit-fixed.ts';
import type { FixedFit, RandomFit } from '#lib/core/analysis/analysis-result.ts';
import { buildRunTable } from '#lib/core/analysis/model/build-run-table.ts';
import { momentsOf } from '#lib/core/analysis/model/moments.ts';
import { partsOf } from '#lib/core/analysis/model/parts.ts';
import { withoutBetween, type RunTable } from '#lib/core/analysis/model/run-table.ts';
import type { ObservationRow, Observations } from '#lib/core/analysis/observations.ts';
import { fitRandom, solveRandom } from '#lib/core/analysis/random/fit-random.ts';

/** Observations from a compact list of [treatment, session, y] or [treatment, session, y, slot]. */
export function observations(
  runs: readonly (readonly [number, number, number, number?])[],
  more: Partial<Observations> = {}
): Observations {
  const count = (at: 0 | 1): number => Math.max(...runs.map((run) => run[at])) + 1;
  const rows = runs.map(([treatment, session, y, slot], i): ObservationRow => {
    return { treatment, session, y, slot: slot ?? null, ruined: false, limit: 'none', runId: `r${i}` };
  });
  const named = (letter: string, n: number): { id: string; name: string }[] =>
    Array.from({ length: n }, (_, i) => ({ id: `${letter}${i + 1}`, name: `${letter}${i + 1}` }));
  return {
    treatments: named('T', count(0)),
    sessions: named('S', count(1)),
    rows,
    direction: 'lower',
    control: null,
    alpha: 0.05,
    equivalenceMargin: null,
    primary: 'fixed',
    factors: { slot: false, machine: false, shift: false },
    kind: 'number',
    seed: 1,
    ...more
  };
}

/** The run table of all rows with a reading. */
export function tableOf(input: Observations): RunTable {
  const rows = [...input.rows.keys()].filter((r) => input.rows[r]!.y !== null && !input.rows[r]!.ruined);
  return buildRunTable(input, rows).table;
}

export function fixedOf(input: Observations): FixedFit {
  const table = withoutBetween(tableOf(input));
  return fitFixed(solveFixed(table, momentsOf(table)), partsOf(table), input.alpha, null);
}

export function randomOf(input: Observations): RandomFit {
  const table = tableOf(input);
  const solved = solveRandom(table, momentsOf(table));
  if (!solved.ok) throw new Error(solved.error.tag);
  const fit = fitRandom(solved.value, input.alpha);
  if (!fit.ok) throw new Error(fit.error.tag);
  return fit.value;
}
