import { bruckRyserChowla } from './bruck-ryser-chowla.ts';
import type { Parameters } from './parameters.ts';

export type NonExistenceTheorem =
  | 'divisibility'
  | 'bose'
  | 'equal-halves'
  | 'fisher'
  | 'bruck-ryser-chowla'
  | 'hall-connor'
  | 'affine-plane'
  | 'computer-search';

/** Parameter sets (t, k, λ with 2k ≤ t) that an exhaustive search in print has ruled out. */
const COMPUTER_SEARCHES: readonly { t: number; k: number; lambda: number; source: string }[] = [
  {
    t: 46,
    k: 6,
    lambda: 1,
    source: 'S. K. Houghten, L. H. Thiel, J. Janssen & C. W. H. Lam (2001), J. Combin. Des. 9, 60–71'
  },
  {
    t: 22,
    k: 8,
    lambda: 4,
    source:
      'R. Bilous, C. W. H. Lam, L. H. Thiel, P. C. Li, G. H. J. van Rees, S. P. Radziszowski, W. H. Holzmann & H. Kharaghani (2007), J. Combin. Des. 15, 262–267'
  },
  { t: 111, k: 11, lambda: 1, source: 'C. W. H. Lam, L. H. Thiel & S. Swiercz (1989), Canad. J. Math. 41, 1117–1123' },
  {
    t: 100,
    k: 10,
    lambda: 1,
    source:
      'C. W. H. Lam, L. H. Thiel & S. Swiercz (1989), Canad. J. Math. 41, 1117–1123 (it would extend to a projective plane of order 10)'
  }
];

/** Parameter sets (t, k, λ with 2k ≤ t) that the Handbook of Combinatorial Designs (2007), table II.1.1, leaves undecided. */
const OPEN: readonly { t: number; k: number; lambda: number }[] = [
  { t: 51, k: 6, lambda: 1 },
  { t: 61, k: 6, lambda: 1 },
  { t: 40, k: 10, lambda: 3 },
  { t: 85, k: 7, lambda: 1 },
  { t: 46, k: 10, lambda: 3 }
];

/**
 * Why no balanced design of these parameters can exist, or null where nothing known forbids it.
 *
 * @param p parameters that already satisfy bk = rt and λ(t−1) = r(k−1), with 2k ≤ t
 *
 * Source: R. A. Fisher (1940), Ann. Eugenics 10, 52–75 (b ≥ t); M. Hall & W. S. Connor (1954), Canad. J. Math. 6, 35–41
 * (r = k + λ with λ = 2); the sources of `bruckRyserChowla`; the searches named in the list.
 * Checked by: test/core/design/catalogue/non-existence.test.ts
 */
export function nonExistence(p: Parameters): { theorem: NonExistenceTheorem; why: string } | null {
  const { t, b, r, k, lambda } = p;
  if (b < t) {
    return { theorem: 'fisher', why: `Fisher's inequality: ${b} sessions are fewer than ${t} treatments.` };
  }
  if (b === t) {
    const why = bruckRyserChowla(t, k, lambda);
    if (why) return { theorem: 'bruck-ryser-chowla', why: `Theorem of Bruck, Ryser and Chowla: ${why}.` };
  }
  // r = k + λ: for λ = 1 and 2 the design would be the residual of a symmetric one.
  if (r === k + lambda && lambda <= 2) {
    const why = bruckRyserChowla(t + r, r, lambda);
    const symmetric = `the symmetric design of ${t + r} treatments, ${r} to a session, each pair ${lambda === 1 ? 'once' : 'twice'}`;
    if (why && lambda === 1) {
      return {
        theorem: 'affine-plane',
        why: `An affine plane of order ${k} would extend to the projective plane, ${symmetric}, which the theorem of Bruck and Ryser excludes: ${why}.`
      };
    }
    if (why) {
      return {
        theorem: 'hall-connor',
        why: `Theorem of Hall and Connor: it would be the residual of ${symmetric}, which the theorem of Bruck, Ryser and Chowla excludes: ${why}.`
      };
    }
  }
  const search = COMPUTER_SEARCHES.find((s) => s.t === t && s.k === k && s.lambda === lambda);
  return search
    ? { theorem: 'computer-search', why: `An exhaustive computer search found none: ${search.source}.` }
    : null;
}

/** Whether existence of these parameters (2k ≤ t) is undecided in print. */
export function isOpen(p: Parameters): boolean {
  return OPEN.some((o) => o.t === p.t && o.k === p.k && o.lambda === p.lambda);
}
