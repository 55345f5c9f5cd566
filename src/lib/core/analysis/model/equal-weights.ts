import type { RunTable } from './run-table.ts';

/** Equal weights over the levels of the further factors; treatments and covariate (centred) at zero. */
export function equalWeights(table: RunTable): Float64Array {
  const g = new Float64Array(table.p);
  for (const term of table.terms.slice(1)) {
    if (term.scaling !== null) continue;
    for (let c = term.start; c < term.start + term.size; c++) g[c] = 1 / term.size;
  }
  return g;
}
