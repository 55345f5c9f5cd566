import { readFileSync } from 'node:fs';
import { expect, test } from 'vitest';

interface Manifest {
  dependencies: Record<string, string>;
  devDependencies: Record<string, string>;
}
const read = (file: string): unknown => JSON.parse(readFileSync(file, 'utf8'));
const manifest = read('package.json') as Manifest;
const lock = read('package-lock.json') as {
  packages: Record<string, Manifest & { version: string; integrity?: string }>;
};

test('package.json pins every dependency to one exact version, the one in the lock file', () => {
  const all = { ...manifest.dependencies, ...manifest.devDependencies };
  for (const [name, version] of Object.entries(all)) {
    expect(version, name).toMatch(/^\d+\.\d+\.\d+$/);
    expect(lock.packages[`node_modules/${name}`]?.version, name).toBe(version);
  }
});

test('package-lock.json holds a check sum for every package', () => {
  const without = Object.entries(lock.packages).filter(
    ([path, entry]) => path !== '' && !entry.integrity && !('link' in entry)
  );
  expect(without.map(([path]) => path)).toEqual([]);
});

test('package.json keeps the list of runtime dependencies short', () => {
  expect(Object.keys(manifest.dependencies).length).toBeLessThanOrEqual(20);
});
