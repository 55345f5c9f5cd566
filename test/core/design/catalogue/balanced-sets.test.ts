import { readFileSync } from 'node:fs';
import { expect, test } from 'vitest';
import { balancedSets } from '#lib/core/design/catalogue/balanced-sets.ts';

test('balancedSets({t, k, maxReplication}) lists the admissible sets smallest first', () => {
  expect(balancedSets({ t: 6, k: 3, maxReplication: 15 })).toEqual([
    { t: 6, b: 10, r: 5, k: 3, lambda: 2, status: 'admissible' },
    { t: 6, b: 20, r: 10, k: 3, lambda: 4, status: 'admissible' },
    { t: 6, b: 30, r: 15, k: 3, lambda: 6, status: 'admissible' }
  ]);
  expect(balancedSets({ t: 15, k: 5, maxReplication: 14 }).map(({ r, status }) => [r, status])).toEqual([
    [7, 'impossible'],
    [14, 'admissible']
  ]);
});

test('balancedSets({t, k, maxReplication}) lists exactly the anchors, with what is known of them', () => {
  const { sets } = JSON.parse(readFileSync('test/reference/designs/existence.json', 'utf8')) as {
    sets: { v: number; b: number; r: number; k: number; lam: number; status: string }[];
  };
  const STATUS: Record<string, string> = { exists: 'admissible', 'does not exist': 'impossible', open: 'open' };
  const listed: string[] = [];
  for (let t = 4; t <= 100; t++) {
    for (let k = 2; 2 * k <= t; k++) {
      // The anchors leave sets that fail Fisher's inequality to a list of their own.
      const found = balancedSets({ t, k, maxReplication: 15 }).filter(({ b }) => b >= t);
      listed.push(...found.map((set) => [set.t, set.b, set.r, set.k, set.lambda, set.status].join(' ')));
    }
  }
  const anchors = sets.map(({ v, b, r, k, lam, status }) => [v, b, r, k, lam, STATUS[status]].join(' '));
  expect(listed.sort()).toEqual(anchors.sort());
});

test('balancedSets({t, k, maxReplication}) gives nothing for sessions that hold all treatments', () => {
  expect(balancedSets({ t: 5, k: 5, maxReplication: 10 })).toEqual([]);
});
