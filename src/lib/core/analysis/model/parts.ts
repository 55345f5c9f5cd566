import { treatmentOfRun, type RunTable } from './run-table.ts';

/** The connected parts of the kept runs: treatments that meet, directly or through others. */
export interface Parts {
  count: number;
  /** Part of each treatment, −1 without kept runs. */
  ofTreatment: Int32Array;
  /** Part of each session of the run table. */
  ofSession: Int32Array;
}

/**
 * Finds the connected parts of the treatment–session graph by union–find, numbered by their first treatment.
 *
 * Checked by: test/core/analysis/model/parts.test.ts
 */
export function partsOf(table: RunTable): Parts {
  const t = table.terms[0]!.size;
  const parent = Int32Array.from({ length: t }, (_, i) => i);
  const root = (i: number): number => {
    let r = i;
    while (parent[r] !== r) r = parent[r] = parent[parent[r]!]!;
    return r;
  };
  const present = new Uint8Array(t);
  for (let j = 0; j < table.b; j++) {
    const first = treatmentOfRun(table, table.start[j]!);
    for (let i = table.start[j]!; i < table.start[j + 1]!; i++) {
      const treatment = treatmentOfRun(table, i);
      present[treatment] = 1;
      parent[root(treatment)] = root(first);
    }
  }
  const number = new Map<number, number>();
  const ofTreatment = new Int32Array(t).fill(-1);
  for (let i = 0; i < t; i++) {
    if (present[i] === 0) continue;
    const r = root(i);
    if (!number.has(r)) number.set(r, number.size);
    ofTreatment[i] = number.get(r)!;
  }
  const ofSession = Int32Array.from(
    { length: table.b },
    (_, j) => ofTreatment[treatmentOfRun(table, table.start[j]!)]!
  );
  return { count: number.size, ofTreatment, ofSession };
}
