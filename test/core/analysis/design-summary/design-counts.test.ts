import { expect, test } from 'vitest';
import { designCounts } from '#lib/core/analysis/design-summary/design-counts.ts';
import { campaignOf } from '../../../simulation/simulate-campaign.ts';
import { tableOf } from '../kept-model.ts';

const counted = (blocks: number[][], missing: number[] = []) => designCounts(tableOf(campaignOf(blocks, missing)));
/** The seven points and lines of Fano's plane, from memory; any two points lie on one line. */
const fano = Array.from({ length: 7 }, (_, j) => [0, 1, 3].map((d) => (d + j) % 7));

test('designCounts(Fano’s plane) is balanced with λ = 1', () => {
  const counts = counted(fano);
  expect(counts).toMatchObject({ treatments: 7, sessions: 7, runs: 21, balanced: true, complete: false, lambda: 1 });
  expect(counts.replication).toEqual(new Array(7).fill(3));
  expect(counts.concurrenceCounts).toEqual([{ meetings: 1, pairs: 21 }]);
  expect(counts.parts).toHaveLength(1);
});

test('designCounts(Fano’s plane with a run lost) is no longer balanced', () => {
  const counts = counted(fano, [0]);
  expect(counts).toMatchObject({ runs: 20, balanced: false, proper: false, equireplicate: false, connected: true });
  expect(counts.concurrenceCounts).toEqual([
    { meetings: 0, pairs: 2 },
    { meetings: 1, pairs: 19 }
  ]);
});

test('designCounts(complete sessions) is complete and balanced', () => {
  expect(
    counted([
      [0, 1, 2],
      [2, 0, 1]
    ])
  ).toMatchObject({ complete: true, balanced: true, lambda: 2 });
});

test('designCounts(a treatment twice in a session) is not binary, and counts meetings by products', () => {
  const counts = counted([
    [0, 0, 1],
    [1, 2, 0]
  ]);
  expect(counts.binary).toBe(false);
  expect(counts.balanced).toBe(false);
  expect(counts.concurrence[0]).toEqual([5, 3, 1]);
});

test('designCounts(two halves that never meet) names the parts', () => {
  const counts = counted([
    [0, 2],
    [1, 3],
    [2, 0],
    [3, 1]
  ]);
  expect(counts.connected).toBe(false);
  expect(counts.parts).toEqual([
    { treatments: [0, 2], sessions: [0, 2] },
    { treatments: [1, 3], sessions: [1, 3] }
  ]);
});
