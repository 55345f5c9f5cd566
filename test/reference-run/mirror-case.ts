import { analyse } from '#lib/core/analysis/analyse.ts';
import type { Analysis, DesignCounts, Efficiency } from '#lib/core/analysis/analysis-result.ts';
import { mirrorFixed } from './mirror-fixed.ts';
import { mirrorRandom } from './mirror-random.ts';
import { mirrorTests } from './mirror-tests.ts';
import { observationsOfCase, type ReferenceCase } from './reference-case.ts';
import { object, type Tree } from './tree.ts';

/** What the mirrors need: the case file, our analysis, and the labels in the order of our indices. */
export interface Mirrored {
  file: ReferenceCase;
  analysis: Analysis;
  treatments: string[];
  sessions: string[];
}

/** Our own results for a case, in the shape of the case file, for a comparison field by field. */
export function mirrorCase(file: ReferenceCase): Tree {
  const observations = observationsOfCase(file);
  const result = analyse(observations);
  if (!result.ok) throw new Error(`${file.id}: ${result.error.tag}`);
  const it: Mirrored = {
    file,
    analysis: result.value,
    treatments: observations.treatments.map((t) => t.id),
    sessions: observations.sessions.map((s) => s.id)
  };
  return {
    design: mirrorDesign(it),
    efficiency: mirrorEfficiency(it),
    intra: mirrorFixed(it),
    reml: mirrorRandom(it),
    tests: mirrorTests(it)
  };
}

function mirrorDesign(it: Mirrored): Tree {
  const { planned, kept } = it.analysis.design;
  const counts = (c: DesignCounts): Tree => {
    const present = it.treatments.flatMap((_, i) => (c.replication[i]! > 0 ? [i] : []));
    const sessions = c.parts.flatMap((part) => part.sessions).sort((a, b) => a - b);
    return {
      nTreatments: c.treatments,
      nBlocks: c.sessions,
      nObs: c.runs,
      replication: present.map((i) => c.replication[i]!),
      blockSize: c.sessionSize,
      binary: c.binary,
      equireplicate: c.equireplicate,
      proper: c.proper,
      balanced: c.balanced,
      complete: c.complete,
      lambda: c.lambda,
      concurrenceCounts: Object.fromEntries(c.concurrenceCounts.map(({ meetings, pairs }) => [meetings, pairs])),
      connected: c.connected,
      nComponents: c.parts.length,
      componentOfTreatment: present.map((i) => c.parts.findIndex((part) => part.treatments.includes(i)) + 1),
      treatmentLabels: present.map((i) => it.treatments[i]!),
      blockLabels: sessions.map((j) => it.sessions[j]!)
    };
  };
  const fixed = it.analysis.fixed.ok ? it.analysis.fixed.value : null;
  return {
    planned: counts(planned),
    observed: counts(kept),
    nMissing: it.analysis.counts.unread,
    estimability: kept.connected
      ? null
      : {
          components: kept.parts.map((part) => part.treatments.map((i) => it.treatments[i]!)),
          nEstimablePairs: fixed?.pairSummary.estimable ?? null
        }
  };
}

function mirrorEfficiency({ analysis, file }: Mirrored): Tree {
  const one = (e: Efficiency): Tree => ({
    eliminated: e.eliminated.map((name) => ({ session: 'block', slot: 'position' })[name] ?? name),
    canonical: e.canonical,
    nZero: e.zeros,
    average: e.average,
    min: e.min,
    max: e.max,
    ...(e.pairVariance === null
      ? {}
      : {
          averagePairVariance: e.pairVariance.average,
          minPairVariance: e.pairVariance.min,
          maxPairVariance: e.pairVariance.max,
          pairwiseEfficiency: e.pairVariance.efficiency
        })
  });
  const { planned, kept, keptAllFactors } = analysis.design;
  const observed: Tree = { blocks: one(kept.efficiency) };
  if (keptAllFactors !== null) observed['all'] = one(keptAllFactors);
  const before: Tree = { blocks: one(planned.efficiency) };
  // The efficiency as planned under all factors is that of the same analysis on runs that all have a reading.
  if (object(object(file['efficiency'])['planned'])['all'] !== undefined) {
    const complete = { ...file, data: { ...file.data, y: file.data.y.map((y, i) => y ?? i % 7) } };
    const full = analyse({ ...observationsOfCase(complete), control: null });
    if (full.ok && full.value.design.keptAllFactors) before['all'] = one(full.value.design.keptAllFactors);
  }
  return { observed, planned: before };
}
