// npm test: everything in one command. Each check is one count; test runners report their own counts.
import { spawn } from 'node:child_process';
import { mkdirSync, readFileSync, rmSync } from 'node:fs';
import { dirname, join } from 'node:path';
import { fileURLToPath } from 'node:url';
import { provideChromium, provideOtherEngines } from './browsers.mjs';
import { installWhenMissing, requireNode } from './install.mjs';

const root = join(dirname(fileURLToPath(import.meta.url)), '../..');
const output = join(root, 'test/output');
const browser = !process.argv.includes('--no-browser');

requireNode();
installWhenMissing(root);
rmSync(output, { recursive: true, force: true });
mkdirSync(output, { recursive: true });

let passed = 0;
let failed = 0;
let skipped = 0;

/**
 * Runs one command; its output is shown when it fails.
 * @param {string} name
 * @param {string[]} command
 * @param {{ env?: Record<string, string>, show?: boolean }} [options]
 * @returns {Promise<boolean>}
 */
function run(name, command, options = {}) {
  const started = Date.now();
  return new Promise((resolve) => {
    const [program = '', ...rest] = command;
    const child = spawn(program, rest, {
      cwd: root,
      env: { ...process.env, FORCE_COLOR: '0', ...options.env },
      shell: process.platform === 'win32'
    });
    let text = '';
    const take = (/** @type {Buffer} */ chunk) => {
      text += chunk;
      if (options.show) process.stdout.write(chunk);
    };
    child.stdout.on('data', take);
    child.stderr.on('data', take);
    child.on('error', (error) => (text += error.message));
    child.on('close', (code) => {
      const good = code === 0;
      if (!good && !options.show) console.log(text);
      console.log(`${good ? 'ok  ' : 'FAIL'} ${name} (${((Date.now() - started) / 1000).toFixed(1)} s)`);
      resolve(good);
    });
  });
}

/** @param {string} name @param {string[]} command @param {{ env?: Record<string, string>, show?: boolean }} [options] */
async function check(name, command, options) {
  if (await run(name, command, options)) passed += 1;
  else failed += 1;
}

/** @param {string} file */
function read(file) {
  try {
    return JSON.parse(readFileSync(join(output, file), 'utf8'));
  } catch {
    return null;
  }
}

const manifest = JSON.parse(readFileSync(join(root, 'package.json'), 'utf8'));
console.log(
  `Runtime dependencies: ${Object.entries(manifest.dependencies)
    .map((pair) => pair.join(' '))
    .join(', ')}`
);

await check('sync', ['npx', 'svelte-kit', 'sync']);
await Promise.all([
  (async () => {
    await check('format', ['npm', 'run', '-s', 'check:format']);
    await check('architecture', ['npm', 'run', '-s', 'check:architecture']);
    await check('dead code', ['npm', 'run', '-s', 'check:dead']);
  })(),
  (async () => {
    await check('lint', ['npm', 'run', '-s', 'check:lint']);
    await check('types', ['npm', 'run', '-s', 'check:types']);
  })()
]);

const unitOk = await run('unit', [
  'npx',
  'vitest',
  'run',
  '--reporter=dot',
  '--reporter=json',
  '--outputFile.json=test/output/unit.json'
]);
const unit = read('unit.json');
passed += unit?.numPassedTests ?? 0;
failed += unit?.numFailedTests ?? 0;
skipped += unit?.numPendingTests ?? 0;
if (!unitOk && !unit?.numFailedTests) failed += 1;
if (!unit?.numTotalTests) failed += 1;

await check('build and size budget', ['npx', 'vite', 'build', '--logLevel', 'warn']);

if (browser) {
  const chromium = provideChromium();
  if (chromium === null) failed += 1;
  else {
    provideOtherEngines();
    const ok = await run('browser', ['npx', 'playwright', 'test'], { env: { CHROMIUM_PATH: chromium }, show: true });
    const stats = read('browser.json')?.stats;
    passed += (stats?.expected ?? 0) + (stats?.flaky ?? 0);
    failed += stats?.unexpected ?? 0;
    skipped += stats?.skipped ?? 0;
    if (!ok && !stats?.unexpected) failed += 1;
    if (!stats?.expected) failed += 1;
    await run('faults', ['npm', 'run', '-s', 'test:faults:short'], { env: { CHROMIUM_PATH: chromium }, show: true });
    /** @type {{ clean: boolean }[]} */
    const faults = read('faults.json') ?? [{ clean: false }];
    passed += faults.filter(({ clean }) => clean).length;
    failed += faults.filter(({ clean }) => !clean).length;
  }
}

console.log('');
console.log(
  skipped > 0 ? `${passed} passed, ${failed} failed, ${skipped} skipped` : `${passed} passed, ${failed} failed`
);
process.exit(failed > 0 ? 1 : 0);
