import { randomBytes } from 'node:crypto';
import { expect, test } from 'vitest';
import { firstLoadBudget } from '../../src/cli/first-load-budget.mjs';

const chunk = (fileName: string, moduleIds: string[], imports: string[], code: string, isEntry = true) => ({
  type: 'chunk',
  fileName,
  moduleIds,
  imports,
  code,
  isEntry
});

/** Runs the step on a bundle of Kit's shape whose shared piece holds `code` and comes from `module`. */
function build(code: string, module: string): string | null {
  const bundle = Object.fromEntries(
    [
      chunk('_app/immutable/entry/start.a.js', ['/kit/start.js'], [], ''),
      chunk('_app/immutable/entry/app.a.js', ['/kit/app.js'], [], ''),
      chunk('nodes/0.js', ['/x/src/routes/+layout.svelte'], [], ''),
      chunk('nodes/2.js', ['/x/src/routes/bench/+page.svelte'], ['chunks/shared.js'], ''),
      chunk('nodes/3.js', ['/x/src/routes/results/+page.svelte'], ['chunks/other.js'], ''),
      chunk('chunks/shared.js', [module], [], code, false),
      chunk('chunks/other.js', ['/x/node_modules/heavy/index.js'], [], randomBytes(9000).toString('hex'), false)
    ].map((output) => [output.fileName, output])
  );
  const plugin = firstLoadBudget({ route: 'bench', kilobytes: 4, without: ['heavy'] });
  const context = {
    info: () => undefined,
    error: (message: string) => {
      throw new Error(message);
    }
  };
  try {
    (plugin.generateBundle as unknown as (this: unknown, o: unknown, b: unknown) => void).call(context, {}, bundle);
    return null;
  } catch (error) {
    return (error as Error).message;
  }
}

test('firstLoadBudget passes a route whose first load is small, whatever other routes load', () => {
  expect(build('const a = 1;', '/x/src/a.ts')).toBeNull();
});

test('firstLoadBudget fails the build above the budget and says by how much', () => {
  expect(build(randomBytes(6000).toString('hex'), '/x/src/a.ts')).toMatch(
    /^first load of \/bench is \d+\.\d KB gzip, above the budget of 4 KB$/
  );
});

test('firstLoadBudget fails the build when a package that must come later is in the first load', () => {
  expect(build('const a = 1;', '/x/node_modules/heavy/index.js')).toMatch(/contains heavy/);
});
