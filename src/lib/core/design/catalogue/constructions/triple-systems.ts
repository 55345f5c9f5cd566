import type { Blocks } from '../../blocks.ts';
import type { Construction } from '../candidate.ts';

/**
 * A Steiner triple system of t treatments: every pair once, three to a session. Bose's construction for t = 6n + 3 on
 * Z_(2n+1) × {0, 1, 2}, Skolem's for t = 6n + 1 on Z_(2n) × {0, 1, 2} and one more treatment.
 *
 * Source: R. C. Bose (1939), Ann. Eugenics 9, 353–399; T. Skolem (1958), Math. Scand. 6, 273–280, both as told by
 * C. C. Lindner & C. A. Rodger (2008), Design Theory, 2nd ed., sections 1.2 and 1.3.
 * Checked by: test/core/design/catalogue/constructions/families.test.ts
 */
export const steinerTriples: Construction = ({ t, k, lambda }) => {
  if (k !== 3 || lambda !== 1 || (t % 6 !== 1 && t % 6 !== 3) || t < 7) return null;
  const bose = t % 6 === 3;
  return {
    blocks: (bose ? boseTriples((t - 3) / 6) : skolemTriples((t - 1) / 6)).map((block) =>
      block.toSorted((a, b) => a - b)
    ),
    construction: `${bose ? "Bose's" : "Skolem's"} Steiner triple system of ${t} treatments.`,
    constructionId: 'steiner-triples',
    source: bose ? 'R. C. Bose (1939), Ann. Eugenics 9, 353–399' : 'T. Skolem (1958), Math. Scand. 6, 273–280'
  };
};

function boseTriples(n: number): Blocks {
  const m = 2 * n + 1;
  const at = (x: number, level: number): number => (level % 3) * m + x;
  // Idempotent and commutative: half of x + y.
  const product = (x: number, y: number): number => ((x + y) * (n + 1)) % m;
  const triples = Array.from({ length: m }, (_, x) => [at(x, 0), at(x, 1), at(x, 2)]);
  for (let x = 0; x < m; x++) {
    for (let y = x + 1; y < m; y++) {
      for (let level = 0; level < 3; level++) triples.push([at(x, level), at(y, level), at(product(x, y), level + 1)]);
    }
  }
  return triples;
}

function skolemTriples(n: number): Blocks {
  const m = 2 * n;
  const at = (x: number, level: number): number => (level % 3) * m + x;
  const last = 3 * m;
  // Half-idempotent and commutative.
  const product = (x: number, y: number): number => {
    const sum = (x + y) % m;
    return sum % 2 === 0 ? sum / 2 : (sum - 1) / 2 + n;
  };
  const triples: number[][] = [];
  for (let x = 0; x < n; x++) {
    triples.push([at(x, 0), at(x, 1), at(x, 2)]);
    for (let level = 0; level < 3; level++) triples.push([last, at(n + x, level), at(x, level + 1)]);
  }
  for (let x = 0; x < m; x++) {
    for (let y = x + 1; y < m; y++) {
      for (let level = 0; level < 3; level++) triples.push([at(x, level), at(y, level), at(product(x, y), level + 1)]);
    }
  }
  return triples;
}
