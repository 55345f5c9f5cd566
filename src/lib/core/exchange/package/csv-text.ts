import type { Cell, Table } from './table.ts';

/**
 * Returns a text with a quote mark put before it if a spreadsheet would take it for a formula, that is if it begins with
 * = + - @, a tabulator or a carriage return.
 * Source: OWASP, "CSV Injection".
 */
export const neutralise = (text: string): string => (/^[=+\-@\t\r]/.test(text) ? `'${text}` : text);

function cellText(cell: Cell): string {
  if (cell === null) return '';
  if (typeof cell === 'number') {
    if (!Number.isFinite(cell)) throw new Error(`csvText: a table may hold finite numbers only, not ${cell}`);
    // The shortest decimal that reads back to the same double.
    return Object.is(cell, -0) ? '0' : String(cell);
  }
  if (typeof cell === 'boolean') return cell ? 'true' : 'false';
  const text = neutralise(cell);
  return /[",\r\n]/.test(text) || text !== text.trim() ? `"${text.replaceAll('"', '""')}"` : text;
}

/**
 * Returns the table as comma-separated text with a header line and CRLF ends; numbers with a point and all their digits.
 * Source: RFC 4180.
 * Checked by: test/core/exchange/package/make-package.test.ts
 */
export function csvText(table: Pick<Table, 'fields' | 'rows'>): string {
  const lines = [table.fields.map((field) => cellText(field.name)).join(',')];
  for (const row of table.rows) {
    if (row.length !== table.fields.length)
      throw new Error(`csvText: ${table.fields.length} fields but ${row.length} cells`);
    lines.push(row.map(cellText).join(','));
  }
  return `${lines.join('\r\n')}\r\n`;
}
