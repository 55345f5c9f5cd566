/* Finds every balanced parameter set of the anchors and prints a table: tsx test/bench/designs-existence.ts */
import { readFileSync } from 'node:fs';
import { join } from 'node:path';
import { pathToFileURL } from 'node:url';
import { balancedDesign } from '#lib/core/design/catalogue/balanced-design.ts';
import { isResolution } from '#lib/core/design/catalogue/resolution/find-resolution.ts';
import { verifyBalanced } from '#lib/core/design/catalogue/verify-balanced.ts';

interface AnchorSet {
  v: number;
  b: number;
  r: number;
  k: number;
  lam: number;
  status: string;
}

export interface ExistenceRow {
  t: number;
  b: number;
  r: number;
  k: number;
  lambda: number;
  expected: string;
  answered: string;
  how: string;
  milliseconds: number;
  right: boolean;
}

const STATUS: Record<string, string> = { exists: 'exists', 'does not exist': 'impossible', open: 'open' };

/** Asks the catalogue for each set of existence.json, counts what it returns, and times it. */
export function runExistence(folder = process.env.DESIGNS_DIR ?? 'test/reference/designs'): ExistenceRow[] {
  const anchors = JSON.parse(readFileSync(join(folder, 'existence.json'), 'utf8')) as {
    sets: AnchorSet[];
    complements: AnchorSet[];
    trivial_leave_one_out: AnchorSet[];
    fails_fisher: AnchorSet[];
  };
  const all = [...anchors.sets, ...anchors.complements, ...anchors.trivial_leave_one_out, ...anchors.fails_fisher];
  return all.map((set) => {
    const start = performance.now();
    const answer = balancedDesign(set.v, set.k, set.r);
    const milliseconds = performance.now() - start;
    const expected = STATUS[set.status] ?? set.status;
    const counted = answer.status === 'exists' ? verifyBalanced(answer.design.blocks, set.v) : null;
    const asAsked = counted?.b === set.b && counted.r === set.r && counted.k === set.k && counted.lambda === set.lam;
    return {
      t: set.v,
      b: set.b,
      r: set.r,
      k: set.k,
      lambda: set.lam,
      expected,
      answered: answer.status,
      how:
        answer.status === 'exists'
          ? answer.design.constructionId
          : answer.status === 'impossible'
            ? answer.theorem
            : answer.why,
      milliseconds,
      right: answer.status === expected && (answer.status !== 'exists' || asAsked)
    };
  });
}

const median = (values: number[]): number => values.toSorted((a, b) => a - b)[Math.floor(values.length / 2)] ?? NaN;

function summary(title: string, rows: ExistenceRow[]): string {
  const times = rows.map((row) => row.milliseconds);
  const count = (status: string) => {
    const of = rows.filter((row) => row.expected === status);
    return `${of.filter((row) => row.right).length}/${of.length}`;
  };
  return `${title.padEnd(28)} exist ${count('exists')}  impossible ${count('impossible')}  open ${count('open')}  median ${median(times).toFixed(1)} ms  worst ${Math.max(...times).toFixed(0)} ms`;
}

/** Asks for parallel classes wherever the anchors say whether they exist. */
function resolvableSummary(folder = process.env.DESIGNS_DIR ?? 'test/reference/designs'): string {
  const { sets } = JSON.parse(readFileSync(join(folder, 'existence.json'), 'utf8')) as {
    sets: (AnchorSet & { resolvable?: { status: string } })[];
  };
  const found = (status: string, wanted: string) => {
    const of = sets.filter((set) => set.status === 'exists' && set.resolvable?.status === status);
    const right = of.filter(({ v, k, r, b }) => {
      const answer = balancedDesign(v, k, r, { resolvable: true });
      if (answer.status !== 'exists') return answer.status === wanted;
      const { resolution, blocks } = answer.design;
      return wanted === 'exists' && verifyBalanced(blocks, v)?.b === b && isResolution(resolution ?? [], blocks, v);
    });
    return `${right.length}/${of.length}`;
  };
  return `${'in shifts (parallel classes)'.padEnd(28)} exist ${found('yes', 'exists')}  impossible ${found('no', 'impossible')}  open ${found('open', 'open')}`;
}

/** Longest time that an answer with r ≤ 10 may take, in milliseconds. */
const LIMIT = 2000;

if (import.meta.url === pathToFileURL(process.argv[1] ?? '').href) {
  const rows = runExistence();
  for (const row of rows.filter((each) => !each.right || each.milliseconds > 200)) {
    const { t, b, r, k, lambda } = row;
    console.log(
      `${row.right ? 'slow ' : 'WRONG'} t=${t} b=${b} r=${r} k=${k} λ=${lambda}: ${row.expected}, answered ${row.answered} (${row.how}) in ${row.milliseconds.toFixed(0)} ms`
    );
  }
  const half = rows.filter((row) => 2 * row.k <= row.t);
  const main = half.filter((row) => row.r <= 10);
  console.log(summary('k ≤ t/2, r ≤ 10', main));
  console.log(summary('k ≤ t/2, r ≤ 15', half));
  console.log(
    summary(
      'k > t/2',
      rows.filter((row) => 2 * row.k > row.t)
    )
  );
  console.log(resolvableSummary());
  if (main.some((row) => !row.right || row.milliseconds > LIMIT)) {
    console.log(`FAILED: a set with r ≤ 10 is answered wrongly or takes more than ${LIMIT} ms`);
    process.exitCode = 1;
  }
}
