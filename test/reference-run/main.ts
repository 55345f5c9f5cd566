/**
 * npm run test:reference: every field of every case file, and the tables of the distributions, against our own results.
 *
 *     REFERENCE_DIR=folder npm run test:reference     cases (and tables, if there are any) of another folder
 *     npm run test:reference -- name …                only the cases whose id holds one of the names
 */
import { existsSync, readdirSync, readFileSync } from 'node:fs';
import { join } from 'node:path';
import { fileURLToPath } from 'node:url';
import { compareCase } from './compare-case.ts';
import type { ReferenceCase } from './reference-case.ts';
import { checkTables } from './tables.ts';

const here = (path: string): string => fileURLToPath(new URL(path, import.meta.url));
const other = process.env['REFERENCE_DIR'];
const directory = other ?? here('../reference/cases');
const wanted = process.argv.slice(2);
const files = readdirSync(directory).filter((name) => name.endsWith('.json'));
let passed = 0;
let failed = 0;
const skipped = new Map<string, number>();

for (const name of files.sort()) {
  if (name.startsWith('table_')) continue;
  const file = JSON.parse(readFileSync(join(directory, name), 'utf8')) as ReferenceCase;
  if (String(file.schema).startsWith('refindex/')) continue;
  if (wanted.length > 0 && !wanted.some((part) => name.includes(part))) continue;
  try {
    const check = compareCase(file);
    const good = check.failures.length === 0 && check.compared > 0;
    if (good) passed++;
    else failed++;
    const worst = `worst ${check.worst.toPrecision(2)} of its tolerance${check.at === '' ? '' : ` (${check.at})`}`;
    console.log(`${good ? 'ok  ' : 'FAIL'} ${check.id.padEnd(22)} ${check.compared} values, ${worst}`);
    for (const failure of check.failures.slice(0, 10)) console.log(`       ${failure}`);
    if (check.failures.length > 10) console.log(`       and ${check.failures.length - 10} more`);
    for (const [reason, count] of check.skipped) skipped.set(reason, (skipped.get(reason) ?? 0) + count);
  } catch (thrown) {
    failed++;
    console.log(`FAIL ${name}: ${String(thrown)}`);
  }
}

const tables =
  other !== undefined && existsSync(join(other, 'table_t_prob.json')) ? other : here('../reference/tables');
if (wanted.length === 0) {
  for (const table of checkTables(tables)) {
    if (table.ok) passed++;
    else failed++;
    const figures = `${table.n} values, worst error ${table.worst.toExponential(1)}, tolerance ${table.tolerance}`;
    console.log(`${table.ok ? 'ok  ' : 'FAIL'} ${table.function.padEnd(36)} ${figures}`);
    if (!table.ok) console.log(`       ${table.at}`);
  }
}
for (const [reason, count] of skipped) console.log(`skipped ${count}: ${reason}`);
console.log(`${passed} passed, ${failed} failed`);
process.exitCode = failed > 0 || passed === 0 ? 1 : 0;
