import { existsSync, readdirSync, readFileSync } from 'node:fs';
import { dirname, join } from 'node:path';
import { expect, test } from 'vitest';

/** Every "Checked by" of a source file with the tests it names: a path from the root, or a file beside the one before. */
function namedChecks(file: string): { named: string; path: string }[] {
  const comments = readFileSync(file, 'utf8').match(/Checked by[\s\S]*?(\*\/|\n\s*\*\s*\n|\n\s*\*\s*@|\n\n)/g) ?? [];
  return comments.flatMap((comment) => {
    let folder = '';
    return (comment.match(/[\w./-]+\.(?:test|spec)\.ts|test\/[\w/-]+[\w]/g) ?? []).map((named) => {
      const path = named.startsWith('test/') ? named : join(folder, named);
      if (path.endsWith('.ts')) folder = dirname(path);
      return { named, path };
    });
  });
}

const sources = readdirSync('src', { recursive: true, encoding: 'utf8' })
  .filter((name) => /\.(ts|svelte)$/.test(name))
  .map((name) => join('src', name));

test('every test that a docstring names under "Checked by" exists', () => {
  const checks = sources.flatMap((file) => namedChecks(file).map((check) => ({ file, ...check })));
  expect(checks.length).toBeGreaterThan(100);
  expect(checks.filter(({ path }) => !existsSync(path)).map(({ file, named }) => `${file}: ${named}`)).toEqual([]);
});
