import { readFileSync } from 'node:fs';
import { join } from 'node:path';
import {
  chiSquaredCdf,
  chiSquaredUpper,
  chiSquaredUpperQuantile
} from '#lib/core/numerics/distributions/chi-squared.ts';
import { dunnettUpperQuantile } from '#lib/core/numerics/distributions/dunnett.ts';
import { fCdf, fUpper, fUpperQuantile } from '#lib/core/numerics/distributions/f.ts';
import { noncentralFCdf, noncentralFUpper } from '#lib/core/numerics/distributions/noncentral-f.ts';
import { noncentralTCdf, noncentralTUpper } from '#lib/core/numerics/distributions/noncentral-t.ts';
import { normalCdf, normalQuantile, normalUpper } from '#lib/core/numerics/distributions/normal.ts';
import { tCdf, tUpper, tUpperQuantile } from '#lib/core/numerics/distributions/student-t.ts';
import { tukeyCdf, tukeyUpper, tukeyUpperQuantile } from '#lib/core/numerics/distributions/tukey.ts';

export interface TableCheck {
  /** The function and how its error is measured. */
  readonly function: string;
  readonly worst: number;
  readonly n: number;
  readonly tolerance: number;
  readonly ok: boolean;
  /** The row of the worst error. */
  readonly at: string;
}

type Row = Readonly<Record<string, number>>;
type Measure = 'relative' | 'absolute';

interface Check {
  readonly table: string;
  readonly name: string;
  readonly measure: Measure;
  readonly tolerance: number;
  readonly got: (row: Row) => number;
  readonly wanted: (row: Row) => number;
  readonly where?: (row: Row) => boolean;
}

/** Below this doubles are subnormal: reference and result must then both be so small. */
const SMALLEST = 1e-300;

const check = (
  table: string,
  name: string,
  got: Check['got'],
  wanted: Check['wanted'],
  more: Partial<Pick<Check, 'measure' | 'tolerance' | 'where'>> = {}
): Check => ({ table, name, got, wanted, measure: 'relative', tolerance: 1e-11, ...more });

const CHECKS: readonly Check[] = [
  check(
    'normal_prob',
    'normalCdf',
    (r) => normalCdf(r.q!),
    (r) => r.lower!
  ),
  check(
    'normal_prob',
    'normalUpper',
    (r) => normalUpper(r.q!),
    (r) => r.upper!
  ),
  // Near 1 a probability no longer tells its quantile.
  check(
    'normal_prob',
    'normalQuantile',
    (r) => normalQuantile(r.lower!),
    (r) => r.q!,
    {
      where: (r) => r.lower! > 0 && r.lower! < 0.9
    }
  ),
  check(
    't_prob',
    'tCdf',
    (r) => tCdf(r.q!, r.df!),
    (r) => r.lower!
  ),
  check(
    't_prob',
    'tUpper',
    (r) => tUpper(r.q!, r.df!),
    (r) => r.upper!
  ),
  // R's qt is off by 2e-11 at upper tail 1e-300 with 9 df (mpmath 1.3 at 40 digits sides with this code).
  check(
    't_quant',
    'tUpperQuantile',
    (r) => tUpperQuantile(r.upperP!, r.df!),
    (r) => r.q!,
    { tolerance: 3e-11 }
  ),
  check(
    'f_prob',
    'fCdf',
    (r) => fCdf(r.q!, r.df1!, r.df2!),
    (r) => r.lower!
  ),
  check(
    'f_prob',
    'fUpper',
    (r) => fUpper(r.q!, r.df1!, r.df2!),
    (r) => r.upper!
  ),
  // R's qf is off by 6e-10 at upper tail 0.999 with (1, 16) df (mpmath 1.3 at 40 digits sides with this code).
  check(
    'f_quant',
    'fUpperQuantile',
    (r) => fUpperQuantile(r.upperP!, r.df1!, r.df2!),
    (r) => r.q!,
    {
      tolerance: 1e-9
    }
  ),
  check(
    'chisq_prob',
    'chiSquaredCdf',
    (r) => chiSquaredCdf(r.q!, r.df!),
    (r) => r.lower!
  ),
  check(
    'chisq_prob',
    'chiSquaredUpper',
    (r) => chiSquaredUpper(r.q!, r.df!),
    (r) => r.upper!
  ),
  check(
    'chisq_quant',
    'chiSquaredUpperQuantile',
    (r) => chiSquaredUpperQuantile(r.upperP!, r.df!),
    (r) => r.q!
  ),
  check(
    't_noncentral',
    'noncentralTCdf',
    (r) => noncentralTCdf(r.q!, r.df!, r.ncp!),
    (r) => r.lower!
  ),
  check(
    't_noncentral',
    'noncentralTUpper',
    (r) => noncentralTUpper(r.q!, r.df!, r.ncp!),
    (r) => r.upper!
  ),
  check(
    'f_noncentral',
    'noncentralFCdf',
    (r) => noncentralFCdf(r.q!, r.df1!, r.df2!, r.ncp!),
    (r) => r.lower!
  ),
  check(
    'f_noncentral',
    'noncentralFUpper',
    (r) => noncentralFUpper(r.q!, r.df1!, r.df2!, r.ncp!),
    (r) => r.upper!
  ),
  check(
    'tukey_prob',
    'tukeyUpper',
    (r) => tukeyUpper(r.q!, r.k!, r.df!),
    (r) => r.upper!,
    {
      measure: 'absolute',
      tolerance: 1e-10
    }
  ),
  check(
    'tukey_prob',
    'tukeyCdf',
    (r) => tukeyCdf(r.q!, r.k!, r.df!),
    (r) => r.lower!,
    {
      measure: 'absolute',
      tolerance: 1e-10
    }
  ),
  // Below 1e-15 the reference integration has lost digits: at q 25, 7 means, infinite df it gives 3.0e-69, where
  // the Bonferroni bound 42 Q(25/√2), exact to many digits so far out, is 1.3e-68.
  check(
    'tukey_prob',
    'tukeyUpper',
    (r) => tukeyUpper(r.q!, r.k!, r.df!),
    (r) => r.upper!,
    {
      tolerance: 1e-8,
      where: (r) => r.upper! > 1e-15
    }
  ),
  check(
    'tukey_quant',
    'tukeyUpperQuantile',
    (r) => tukeyUpperQuantile(1 - r.p!, r.k!, r.df!),
    (r) => r.q!,
    {
      tolerance: 1e-10
    }
  ),
  check(
    'dunnett',
    'dunnettUpperQuantile',
    (r) => dunnettUpperQuantile(r.alpha!, r.m!, r.df!, r.sides === 2 ? 'two' : 'one'),
    (r) => r.crit!,
    { tolerance: 1e-9 }
  )
];

/**
 * Holds every distribution function to the reference tables of a folder.
 *
 * @param directory folder with the `table_*.json` files
 */
export function checkTables(directory: string): TableCheck[] {
  return CHECKS.map((one) => run(one, readRows(directory, one.table)));
}

function run(one: Check, all: readonly Row[]): TableCheck {
  let worst = 0;
  let n = 0;
  let at = '';
  for (const row of all) {
    const wanted = one.wanted(row);
    if (one.where && !one.where(row)) continue;
    n += 1;
    const got = one.got(row);
    const gap = Math.abs(got - wanted);
    const same = got === wanted || (Math.abs(wanted) < SMALLEST && Math.abs(got) < SMALLEST);
    const error = same ? 0 : one.measure === 'absolute' ? gap : gap / Math.abs(wanted);
    if (!(error <= worst)) {
      worst = error;
      at = `${JSON.stringify(row)}: ${got}, reference ${wanted}`;
    }
  }
  return {
    function: `${one.name} (${one.measure})`,
    worst,
    n,
    tolerance: one.tolerance,
    ok: n > 0 && worst <= one.tolerance,
    at
  };
}

function readRows(directory: string, table: string): Row[] {
  const file = JSON.parse(readFileSync(join(directory, `table_${table}.json`), 'utf8')) as {
    columns: Record<string, (number | string)[]>;
  };
  const names = Object.keys(file.columns);
  const length = file.columns[names[0]!]!.length;
  return Array.from({ length }, (_, i) =>
    Object.fromEntries(
      names.map((name) => {
        const value = file.columns[name]![i]!;
        return [name, value === 'Inf' ? Infinity : Number(value)];
      })
    )
  );
}
