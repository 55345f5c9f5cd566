import { finiteField } from '../../../numerics/finite-field.ts';
import { affineFlats } from '../constructions/finite-geometry.ts';
import { generateGroup, type Permutation, type PermutationGroup } from './permutation-group.ts';

/**
 * The 56 maps x → ax + b of GF(8), a ≠ 0, acting on 71 points: the 56 ordered pairs of different elements, the 14 planes
 * of AG(3, 2) (the same field seen as a space over GF(2)), and one fixed point.
 *
 * Checked by: test/core/design/catalogue/orbits/permutation-group.test.ts
 */
export function affineOnPairsAndPlanes(): PermutationGroup {
  const field = finiteField(8)!;
  const planes = affineFlats(3, 2, 2)!;
  const planeNumber = new Map(planes.map((plane, i) => [plane.join(), i]));
  const elements = Array.from({ length: 8 }, (_, x) => x);
  const pairs = elements.flatMap((x) => elements.filter((y) => y !== x).map((y) => [x, y] as const));
  const pairNumber = new Map(pairs.map((pair, i) => [pair.join(), i]));
  const act = (map: (x: number) => number): Permutation => [
    ...pairs.map(([x, y]) => pairNumber.get([map(x), map(y)].join())!),
    ...planes.map(
      (plane) =>
        pairs.length +
        planeNumber.get(
          plane
            .map(map)
            .sort((a, b) => a - b)
            .join()
        )!
    ),
    pairs.length + planes.length
  ];
  return generateGroup(
    [act((x) => field.add(x, 1)), act((x) => field.multiply(x, field.primitive))],
    'the maps ax + b of GF(8) on ordered pairs, planes and a fixed treatment'
  );
}
