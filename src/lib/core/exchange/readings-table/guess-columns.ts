import type { DelimitedTable } from './read-delimited.ts';
import { isMissing, readNumber } from './read-number.ts';

/** Which column holds what; −1 where there is none. */
export interface ColumnMapping {
  header: boolean;
  decimal: '.' | ',';
  treatment: number;
  session: number;
  slot: number;
  specimen: number;
  ruined: number;
  values: number[];
}

const words: Record<'treatment' | 'session' | 'slot' | 'specimen' | 'ruined', RegExp> = {
  treatment:
    /^(treatment|treat|trt|variant|variante|variety|material|product|produkt|formulation|behandlung|catalyst|group|gruppe)/i,
  session: /^(session|block|blk|batch|charge|belegung|loading|day|tag|lauf)/i,
  slot: /^(slot|position|pos|place|platz|track|spur|station)/i,
  specimen: /^(specimen|sample|probe|code|id)/i,
  ruined: /^(ruined|rejected|excluded|verworfen|ungültig|void)/i
};

/** Share of the cells that are numbers under a decimal sign; missing cells do not count. */
function numeric(rows: readonly string[][], column: number, decimal: '.' | ','): number {
  let seen = 0;
  let good = 0;
  for (const row of rows) {
    const cell = row[column] ?? '';
    if (isMissing(cell)) continue;
    seen += 1;
    if (readNumber(cell, decimal) !== null) good += 1;
  }
  return seen === 0 ? 0 : good / seen;
}

/**
 * Returns a first guess of what the columns hold, from their heads and their cells; a person confirms or changes it.
 * Checked by: test/core/exchange/readings-table/readings-table.test.ts
 */
export function guessColumns(table: DelimitedTable): ColumnMapping {
  const [first = []] = table.rows;
  const header = first.every((cell) => readNumber(cell, '.') === null && readNumber(cell, ',') === null);
  const rows = (header ? table.rows.slice(1) : table.rows).slice(0, 500);
  const columns = first.map((_, c) => c);
  const commas = rows.flat().filter((cell) => /^[+\-−]?\d+,\d+$/.test(cell)).length;
  const points = rows.flat().filter((cell) => /^[+\-−]?\d+\.\d+$/.test(cell)).length;
  const decimal = table.delimiter !== ',' && commas > points ? ',' : '.';
  const taken = new Set<number>();
  const byHead = (name: keyof typeof words): number => {
    if (!header) return -1;
    const found = columns.find((c) => !taken.has(c) && words[name].test(first[c] ?? ''));
    if (found === undefined) return -1;
    taken.add(found);
    return found;
  };
  const mapping: ColumnMapping = {
    header,
    decimal,
    treatment: byHead('treatment'),
    session: byHead('session'),
    slot: byHead('slot'),
    specimen: byHead('specimen'),
    ruined: byHead('ruined'),
    values: []
  };
  const distinct = (c: number): number => new Set(rows.map((row) => row[c])).size;
  const free = (): number[] => columns.filter((c) => !taken.has(c));
  const namelike = free().filter((c) => distinct(c) > 1 && distinct(c) < rows.length);
  for (const role of ['treatment', 'session'] as const) {
    if (mapping[role] >= 0) continue;
    const found =
      namelike.find((c) => !taken.has(c) && numeric(rows, c, decimal) < 1) ?? namelike.find((c) => !taken.has(c));
    if (found === undefined) continue;
    mapping[role] = found;
    taken.add(found);
  }
  const readings = free().filter(
    (c) => numeric(rows, c, decimal) > 0.4 && !/^(row|nr|no|zeile|#)$/i.test(header ? (first[c] ?? '') : '')
  );
  const last = readings.at(-1);
  if (last !== undefined) mapping.values = [last];
  return mapping;
}
