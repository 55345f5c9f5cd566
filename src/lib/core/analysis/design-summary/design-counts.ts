import type { DesignCounts } from '../analysis-result.ts';
import { momentsOf } from '../model/moments.ts';
import { partsOf } from '../model/parts.ts';
import { treatmentOfRun, type RunTable } from '../model/run-table.ts';
import { efficiencyOf } from './efficiency.ts';

/**
 * Returns replication, session sizes, meetings, connected parts and efficiency of a set of runs, by counting.
 *
 * @param table runs with the treatments as only term
 *
 * Balanced: no treatment twice in a session, all equally replicated, all sessions of one size, every pair together equally
 * often; a complete design is one too.
 *
 * Checked by: test/reference-run, test/core/analysis/design-summary/design-counts.test.ts
 */
export function designCounts(table: RunTable): DesignCounts {
  const t = table.terms[0]!.size;
  const replication = new Array<number>(t).fill(0);
  const concurrence = Array.from({ length: t }, () => new Array<number>(t).fill(0));
  const sessionSize: number[] = [];
  let binary = true;
  for (let j = 0; j < table.b; j++) {
    const runs = Array.from({ length: table.start[j + 1]! - table.start[j]! }, (_, i) =>
      treatmentOfRun(table, table.start[j]! + i)
    );
    sessionSize.push(runs.length);
    if (new Set(runs).size < runs.length) binary = false;
    for (const a of runs) {
      replication[a]!++;
      for (const b of runs) concurrence[a]![b]!++;
    }
  }
  const present = [...replication.keys()].filter((i) => replication[i]! > 0);
  const counts = new Map<number, number>();
  for (const a of present) {
    for (const b of present) if (a < b) counts.set(concurrence[a]![b]!, (counts.get(concurrence[a]![b]!) ?? 0) + 1);
  }
  const concurrenceCounts = [...counts].map(([meetings, pairs]) => ({ meetings, pairs }));
  concurrenceCounts.sort((a, b) => a.meetings - b.meetings);
  const equireplicate = new Set(present.map((i) => replication[i])).size <= 1;
  const proper = new Set(sessionSize).size <= 1;
  const parts = partsOf(table);
  const connected = parts.count <= 1;
  const balanced = binary && equireplicate && proper && connected && counts.size === 1 && present.length > 1;
  return {
    treatments: present.length,
    sessions: table.b,
    runs: table.n,
    replication,
    sessionSize,
    binary,
    equireplicate,
    proper,
    balanced,
    complete: binary && sessionSize.every((k) => k === present.length),
    lambda: balanced ? concurrenceCounts[0]!.meetings : null,
    concurrenceCounts,
    concurrence,
    parts: Array.from({ length: parts.count }, (_, part) => ({
      treatments: [...parts.ofTreatment.keys()].filter((i) => parts.ofTreatment[i] === part),
      sessions: [...parts.ofSession.keys()]
        .filter((j) => parts.ofSession[j] === part)
        .map((j) => table.sessionIndex[j]!)
    })),
    connected,
    efficiency: efficiencyOf(table, momentsOf(table))
  };
}
