import { treatmentOfRun, type RunTable } from './run-table.ts';

/** Returns number and plain average of the kept readings of each treatment (null without readings). */
export function plainMeans(table: RunTable): { treatment: number; n: number; mean: number | null }[] {
  const t = table.terms[0]!.size;
  const n = new Int32Array(t);
  const total = new Float64Array(t);
  for (let i = 0; i < table.n; i++) {
    const treatment = treatmentOfRun(table, i);
    n[treatment]!++;
    total[treatment]! += table.y[i]!;
  }
  return Array.from(n, (count, treatment) => ({
    treatment,
    n: count,
    mean: count === 0 ? null : table.centre + total[treatment]! / count
  }));
}
