import { fail, ok, type Result } from '../../result.ts';

/** A text table as found: what separates its cells, and the cells by line. */
export interface DelimitedTable {
  delimiter: ',' | ';' | '\t' | '|';
  rows: string[][];
  /** 1-based number of the first line of each row in the file. */
  lines: number[];
}

export type DelimitedFault =
  | { tag: 'empty-table' }
  | { tag: 'one-column' }
  | { tag: 'unclosed-quote'; line: number }
  | { tag: 'too-many-rows'; most: number }
  | { tag: 'too-many-columns'; most: number };

const MOST_ROWS = 200_000;
const MOST_COLUMNS = 200;
const delimiters = [';', '\t', ',', '|'] as const;

/** Cells of a text under one delimiter; null when a quote is never closed. */
function split(text: string, delimiter: string): { rows: string[][]; lines: number[]; open: number | null } {
  const rows: string[][] = [];
  const lines: number[] = [];
  let row: string[] = [];
  let cell = '';
  let quoted = false;
  let line = 1;
  let began = 1;
  let quoteLine = 1;
  const endRow = (): void => {
    row.push(cell);
    if (row.some((c) => c.trim() !== '')) {
      rows.push(row.map((c) => c.trim()));
      lines.push(began);
    }
    row = [];
    cell = '';
  };
  for (let i = 0; i < text.length; i += 1) {
    const c = text[i];
    if (c === '\n') line += 1;
    if (quoted) {
      if (c === '"' && text[i + 1] === '"') {
        cell += '"';
        i += 1;
      } else if (c === '"') quoted = false;
      else cell += c;
    } else if (c === '"' && cell.trim() === '') {
      quoted = true;
      quoteLine = line;
      cell = '';
    } else if (c === delimiter) {
      row.push(cell);
      cell = '';
    } else if (c === '\n' || c === '\r') {
      if (c === '\r' && text[i + 1] === '\n') {
        i += 1;
        line += 1;
      }
      endRow();
      began = line;
      if (rows.length > MOST_ROWS) break;
    } else cell += c;
  }
  if (cell !== '' || row.length > 0) endRow();
  return { rows, lines, open: quoted ? quoteLine : null };
}

/**
 * Returns the cells of a text table; the delimiter is the one that gives most lines the same number of cells. Quotes, line
 * ends inside quotes and a byte-order mark are understood, blank lines are left out.
 * Source: RFC 4180, widened to semicolon, tabulator and bar.
 * Checked by: test/core/exchange/readings-table/readings-table.test.ts
 */
export function readDelimited(raw: string): Result<DelimitedTable, DelimitedFault> {
  const text = raw.replace(/^\uFEFF/, '').replaceAll('\0', '');
  if (text.trim() === '') return fail({ tag: 'empty-table' });
  const sample = text.slice(0, 50_000);
  let best: (typeof delimiters)[number] | null = null;
  let most = 0;
  for (const delimiter of delimiters) {
    const { rows } = split(sample, delimiter);
    const widths = new Map<number, number>();
    for (const row of rows.slice(0, 200)) widths.set(row.length, (widths.get(row.length) ?? 0) + 1);
    const [width, count] = [...widths].sort((a, b) => b[1] - a[1] || b[0] - a[0])[0] ?? [1, 0];
    const score = width < 2 ? 0 : count / Math.min(rows.length, 200) + Math.min(width, 20) / 1000;
    if (score > most) {
      most = score;
      best = delimiter;
    }
  }
  if (best === null) return fail({ tag: 'one-column' });
  const { rows, lines, open } = split(text, best);
  if (open !== null) return fail({ tag: 'unclosed-quote', line: open });
  if (rows.length > MOST_ROWS) return fail({ tag: 'too-many-rows', most: MOST_ROWS });
  const width = Math.max(...rows.map((row) => row.length));
  if (width > MOST_COLUMNS) return fail({ tag: 'too-many-columns', most: MOST_COLUMNS });
  for (const row of rows) while (row.length < width) row.push('');
  return ok({ delimiter: best, rows, lines });
}
