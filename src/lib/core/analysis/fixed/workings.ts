import type { Workings } from '../fit-result.ts';
import { treatmentOfRun, type RunTable } from '../model/run-table.ts';
import type { Parts } from '../model/parts.ts';
import type { IntraSolution } from './intra-projection.ts';

/**
 * Returns the handbook's workings: treatment totals T, session totals, adjusted totals Q = T − Σ session means, effects that
 * add to zero in each connected part; for a balanced design also B (sum of the totals of the sessions that hold the
 * treatment) and k·Q = k·T − B, with effect = k·Q/(λ·t).
 *
 * Totals are those of the readings as typed.
 *
 * Source: D. C. Montgomery, Design and Analysis of Experiments, the balanced incomplete block design.
 * Checked by: test/core/analysis/fixed/workings.test.ts (the catalyst example)
 */
export function workingsOf(
  table: RunTable,
  solution: IntraSolution,
  parts: Parts,
  balanced: Workings['balanced']
): Workings {
  const t = table.terms[0]!.size;
  const T = new Float64Array(t);
  const n = new Int32Array(t);
  const means = new Float64Array(t);
  const B = new Float64Array(t);
  const Q = new Float64Array(t);
  const sessions: Workings['sessions'] = [];
  for (let j = 0; j < table.b; j++) {
    const size = table.start[j + 1]! - table.start[j]!;
    let centred = 0;
    for (let i = table.start[j]!; i < table.start[j + 1]!; i++) centred += table.y[i]!;
    const total = centred + size * table.centre;
    sessions.push({ session: table.sessionIndex[j]!, total, size });
    for (let i = table.start[j]!; i < table.start[j + 1]!; i++) {
      const treatment = treatmentOfRun(table, i);
      n[treatment]!++;
      T[treatment]! += table.y[i]!;
      Q[treatment]! += table.y[i]! - centred / size;
      means[treatment]! += total / size;
      B[treatment]! += total;
    }
  }
  const sum = new Float64Array(parts.count);
  const members = new Int32Array(parts.count);
  for (let i = 0; i < t; i++) {
    const part = parts.ofTreatment[i]!;
    if (part < 0) continue;
    sum[part]! += solution.beta[i]!;
    members[part]!++;
  }
  return {
    sessions,
    balanced,
    furtherFactors: table.terms.length > 1,
    lines: Array.from(T, (total, treatment) => {
      const part = parts.ofTreatment[treatment]!;
      return {
        treatment,
        T: total + n[treatment]! * table.centre,
        sessionMeans: means[treatment]!,
        Q: Q[treatment]!,
        B: balanced === null ? null : B[treatment]!,
        kQ: balanced === null ? null : balanced.k * Q[treatment]!,
        effect: part < 0 ? null : solution.beta[treatment]! - sum[part]! / members[part]!
      };
    })
  };
}
