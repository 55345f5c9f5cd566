import { expect, test } from 'vitest';
import type { Construction } from '#lib/core/design/catalogue/candidate.ts';
import { hadamardHalves, hadamardSymmetric } from '#lib/core/design/catalogue/constructions/hadamard.ts';
import { hyperovalBiplane } from '#lib/core/design/catalogue/constructions/hyperoval-biplane.ts';
import { inversivePlane } from '#lib/core/design/catalogue/constructions/inversive-plane.ts';
import { kirkmanTriples } from '#lib/core/design/catalogue/constructions/kirkman.ts';
import { mcFarland } from '#lib/core/design/catalogue/constructions/mcfarland.ts';
import { powerResidues } from '#lib/core/design/catalogue/constructions/power-residues.ts';
import { rotationalClasses } from '#lib/core/design/catalogue/constructions/rotational-classes.ts';
import { steinerTriples } from '#lib/core/design/catalogue/constructions/triple-systems.ts';
import { parametersOf } from '#lib/core/design/catalogue/parameters.ts';
import { isResolution } from '#lib/core/design/catalogue/resolution/find-resolution.ts';
import { verifyBalanced } from '#lib/core/design/catalogue/verify-balanced.ts';

/** Asks a construction for t, k, λ; gives what it says and what its sessions count out to. */
function count(construction: Construction, t: number, k: number, lambda: number) {
  const p = parametersOf(t, k, (lambda * (t - 1)) / (k - 1))!;
  const candidate = construction(p);
  return { candidate, asked: p, counted: candidate && verifyBalanced(candidate.blocks, t) };
}

const between = (from: number, to: number): number[] => Array.from({ length: to - from + 1 }, (_, i) => from + i);

test('steinerTriples(t) is a triple system for every t ≡ 1 or 3 modulo 6 from 7 to 99', () => {
  // T. P. Kirkman (1847), Cambridge and Dublin Math. J. 2, 191–204: these t and no others.
  for (const t of between(7, 99).filter((x) => x % 6 === 1 || x % 6 === 3)) {
    const { asked, counted } = count(steinerTriples, t, 3, 1);
    expect(counted).toEqual(asked);
  }
});

test('kirkmanTriples(t) has (t − 1)/2 parallel classes where t/3 or (t − 1)/2 is a prime power ≡ 1 modulo 6', () => {
  for (const t of [15, 21, 27, 39, 51, 57, 63, 75, 87, 93, 99]) {
    const { candidate, asked, counted } = count(kirkmanTriples, t, 3, 1);
    expect([t, counted]).toEqual([t, asked]);
    expect(candidate!.resolution).toHaveLength((t - 1) / 2);
    expect(isResolution(candidate!.resolution!, candidate!.blocks, t)).toBe(true);
  }
});

test('hadamardSymmetric(4m − 1) and hadamardHalves(4m) count out wherever there is a matrix', () => {
  for (const m of [2, 3, 4, 5, 6, 7, 8, 9, 10, 11, 12, 13, 14, 15, 25]) {
    const symmetric = count(hadamardSymmetric, 4 * m - 1, 2 * m - 1, m - 1);
    expect([m, symmetric.counted]).toEqual([m, symmetric.asked]);
    const halves = count(hadamardHalves, 4 * m, 2 * m, 2 * m - 1);
    expect([m, halves.counted]).toEqual([m, halves.asked]);
    expect(isResolution(halves.candidate!.resolution!, halves.candidate!.blocks, 4 * m)).toBe(true);
  }
});

test('inversivePlane(q² + 1) gives all circles, and for odd q a balanced half of them', () => {
  for (const q of [2, 3, 4, 5, 7]) {
    const whole = count(inversivePlane, q * q + 1, q + 1, q + 1);
    expect([q, whole.counted]).toEqual([q, whole.asked]);
    // q³ + q circles (Hughes & Piper 1985, section 3.7, from memory).
    expect(whole.counted!.b).toBe(q ** 3 + q);
  }
  for (const q of [3, 5, 7]) {
    const half = count(inversivePlane, q * q + 1, q + 1, (q + 1) / 2);
    expect([q, half.counted]).toEqual([q, half.asked]);
  }
});

test('mcFarland(t, k, λ) counts out for the first members of the family', () => {
  // McFarland (1973): (16,6,2), (45,12,3), (64,28,12), (96,20,4).
  for (const [t, k, lambda] of [
    [16, 6, 2],
    [45, 12, 3],
    [64, 28, 12],
    [96, 20, 4]
  ] as const) {
    const { asked, counted } = count(mcFarland, t, k, lambda);
    expect(counted).toEqual(asked);
  }
});

test('powerResidues(t, k, λ) gives the designs of Paley, and the quartic residues modulo 37', () => {
  for (const q of [7, 11, 19, 23, 27, 31, 43, 47, 59, 67, 71, 79, 83]) {
    const { asked, counted } = count(powerResidues, q, (q - 1) / 2, (q - 3) / 4);
    expect(counted).toEqual(asked);
  }
  // E. Lehmer (1953): quartic residues for 37 = 1 + 4·3², with zero for 13 = 9 + 4·1².
  expect(count(powerResidues, 37, 9, 2).counted).toMatchObject({ b: 37, lambda: 2 });
  expect(count(powerResidues, 13, 4, 1).counted).toMatchObject({ b: 13, lambda: 1 });
});

test('powerResidues(t, k, λ) gives null where residues do not balance', () => {
  expect(count(powerResidues, 31, 6, 1).candidate).toBeNull();
  expect(count(powerResidues, 15, 7, 3).candidate).toBeNull();
});

test('hyperovalBiplane gives 56 treatments, 11 to a session, each pair twice, and nothing else', () => {
  const { asked, counted } = count(hyperovalBiplane, 56, 11, 2);
  expect(counted).toEqual(asked);
  expect(count(hyperovalBiplane, 37, 9, 2).candidate).toBeNull();
});

test('rotationalClasses(t, k, k − 1) turns one parallel class into all', () => {
  for (const [t, k] of [
    [9, 3],
    [12, 3],
    [12, 4],
    [15, 3],
    [18, 3],
    [20, 4]
  ] as const) {
    const { candidate, asked, counted } = count(rotationalClasses, t, k, k - 1);
    expect([t, k, counted]).toEqual([t, k, asked]);
    expect(isResolution(candidate!.resolution!, candidate!.blocks, t)).toBe(true);
  }
});

test('rotationalClasses(6, 3, 2) gives null: six treatments cannot be halved five times in balance', () => {
  expect(count(rotationalClasses, 6, 3, 2).candidate).toBeNull();
});
