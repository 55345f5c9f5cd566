export interface ReadNumber {
  value: number;
  limit: 'none' | 'at-least' | 'at-most';
}

const missing = new Set(['', 'na', 'n/a', 'nan', 'null', '-', '–', '.', '*', '#n/a', '?']);

/** Is the cell empty in one of the usual ways? */
export const isMissing = (cell: string): boolean => missing.has(cell.trim().toLowerCase());

/**
 * Returns the number a cell of a table means under the decimal sign of the table, or null. Groups of three are understood
 * when the other sign, an apostrophe or a space parts them; ≥, >, ≤ and < before it say that it stopped at a limit.
 * Checked by: test/core/exchange/readings-table/readings-table.test.ts
 */
export function readNumber(cell: string, decimal: '.' | ','): ReadNumber | null {
  const found = /^\s*(>=|<=|≥|≤|>|<)?\s*([+\-−]?)([\d.,'’\s\u00a0\u202f]+)(?:[eE]([+\-−]?\d{1,3}))?\s*$/.exec(cell);
  if (found === null) return null;
  const [, sign, minus, body = '', exponent] = found;
  const other = decimal === '.' ? ',' : '.';
  const [whole = '', fraction, ...more] = body.trim().split(decimal);
  if (more.length > 0) return null;
  const digits = /^\d+$/;
  const grouped = new RegExp(`^\\d{1,3}(?:[\\${other}'’\\s\\u00a0\\u202f]\\d{3})+$`);
  if (!digits.test(whole) && !grouped.test(whole) && !(whole === '' && fraction !== undefined)) return null;
  if (fraction !== undefined && !digits.test(fraction) && fraction !== '') return null;
  const text = `${minus === '' ? '' : minus === '+' ? '' : '-'}${whole.replace(/\D/g, '') || '0'}.${fraction || '0'}e${(exponent ?? '0').replace('−', '-')}`;
  const value = Number(text);
  if (!Number.isFinite(value)) return null;
  const limit = sign === undefined ? 'none' : />|≥/.test(sign) ? 'at-least' : 'at-most';
  return { value, limit };
}

/** Decimals written after the decimal sign. */
export const decimalsOf = (cell: string, decimal: '.' | ','): number =>
  (cell.split(decimal)[1] ?? '').replace(/[eE].*$/, '').replace(/\D/g, '').length;
