import { fileURLToPath } from 'node:url';
import { expect, test } from 'vitest';
import { checkTables } from '../../../reference-run/tables.ts';

// The tables' origin is in their own `notes`: R 4.2.2 and high-precision integrations.
const checks = checkTables(fileURLToPath(new URL('../../../reference/tables', import.meta.url)));

test.each(checks)('$function agrees with the $n rows of its reference table, tails included', (check) => {
  expect(check.n, 'rows compared').toBeGreaterThan(0);
  expect(check.worst, check.at).toBeLessThanOrEqual(check.tolerance);
});
