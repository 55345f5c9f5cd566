import { readdirSync, readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import { compareCase } from './compare-case.ts';
import { readCase } from './read-case.ts';
import type { ReferenceCase } from './reference-case.ts';

const cases = readdirSync(new URL('../reference/cases/', import.meta.url))
  .filter((name) => /^(pub|pkg|sim)_/.test(name))
  .map((name) => name.replace(/\.json$/, ''));

describe('compareCase', () => {
  it.each(cases)('compareCase(%s) finds every field within its tolerance', (id) => {
    const check = compareCase(readCase(id));
    expect(check.failures).toEqual([]);
    expect(check.compared).toBeGreaterThan(300);
  });

  it('compareCase fails on a changed figure, a field that it does not know and another schema', () => {
    const text = JSON.stringify(readCase('pub_catalyst'));
    const changed = JSON.parse(text) as ReferenceCase & { intra: { sigma: number; novelty?: number } };
    changed.intra.sigma *= 1 + 1e-8;
    expect(compareCase(changed).failures).toEqual([expect.stringContaining('intra.sigma')]);
    const novel = JSON.parse(text) as ReferenceCase & { intra: { novelty?: number } };
    novel.intra.novelty = 1;
    expect(compareCase(novel).failures).toEqual(['intra.novelty: not covered, reference 1']);
    expect(compareCase({ ...novel, schema: 'refcase/2' }).failures).toEqual([expect.stringContaining('refcase/2')]);
  });

  it('every case of the index is there', () => {
    const index = JSON.parse(readFileSync(new URL('../reference/cases/index.json', import.meta.url), 'utf8')) as {
      files: { file: string; kind: string }[];
    };
    const listed = index.files.filter(({ kind }) => kind === 'case').map(({ file }) => file.replace(/\.json$/, ''));
    expect([...cases].sort()).toEqual(listed.sort());
  });
});
