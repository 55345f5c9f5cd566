import { existsSync, readFileSync } from 'node:fs';
import { expect, test } from 'vitest';

test.each(['README.md', 'DEVELOPERS.md'])('%s names only files and commands that exist', (name) => {
  const text = readFileSync(name, 'utf8');
  const links = [...text.matchAll(/\]\((?!https?:)([^)#]+)/g)].map(([, path]) => path ?? '');
  expect(links.filter((path) => !existsSync(path))).toEqual([]);
  const { scripts } = JSON.parse(readFileSync('package.json', 'utf8')) as { scripts: Record<string, string> };
  const commands = [...text.matchAll(/npm run (?:--silent |-s )?([\w:-]+)/g)].map(([, command]) => command ?? '');
  expect(commands.filter((command) => !(command in scripts))).toEqual([]);
  expect(links.length + commands.length).toBeGreaterThan(2);
});
