import type { ObservationRow, Observations } from '../lib/core/analysis/observations.ts';
import { readDelimited } from '../lib/core/exchange/readings-table/read-delimited.ts';
import { isMissing, readNumber } from '../lib/core/exchange/readings-table/read-number.ts';
import { fail, ok, type Result } from '../lib/core/result.ts';

/** What the command line sets beside the readings. */
export interface AnalysisChoices {
  alpha: number;
  control: string | null;
  direction: Observations['direction'];
  primary: Observations['primary'];
  margin: number | null;
  seed: number;
  slots: boolean;
  kind: Observations['kind'];
}

export type CsvFault =
  | { tag: 'unreadable-table'; why: string }
  | { tag: 'no-column'; column: string; found: string[] }
  | { tag: 'not-a-number'; line: number; column: string; found: string }
  | { tag: 'unknown-control'; name: string; known: string[] };

const REQUIRED = ['treatment', 'session', 'y'] as const;
const yes = /^(1|true|yes|y|x)$/i;

/**
 * Reads a table of readings with a header line: treatment, session, y, and optionally slot (from 1), ruined, machine, shift,
 * covariate. Treatments and sessions stand in the order in which they appear; an empty y is a run without a reading; a y such as
 * ≥ 10000 stopped at that limit.
 */
export function readingsFromCsv(text: string, choices: AnalysisChoices): Result<Observations, CsvFault> {
  const read = readDelimited(text);
  if (!read.ok) return fail({ tag: 'unreadable-table', why: read.error.tag });
  const { rows: lines, lines: numbers, delimiter } = read.value;
  const header = (lines[0] ?? []).map((cell) => cell.trim().toLowerCase());
  for (const column of REQUIRED) {
    if (!header.includes(column)) return fail({ tag: 'no-column', column, found: header });
  }
  const decimal = delimiter === ';' && !text.includes('.') ? ',' : '.';
  const treatments: string[] = [];
  const sessions: { id: string; name: string; shift?: string; machine?: string }[] = [];
  const place = (list: string[], value: string): number => {
    const at = list.indexOf(value);
    return at >= 0 ? at : list.push(value) - 1;
  };
  const ids: string[] = [];
  const rows: ObservationRow[] = [];
  let covariate = false;
  for (const [i, line] of lines.entries()) {
    if (i === 0) continue;
    const cell = (column: string): string =>
      header.includes(column) ? (line[header.indexOf(column)] ?? '').trim() : '';
    const bad = (column: string): { ok: false; error: CsvFault } =>
      fail({ tag: 'not-a-number', line: numbers[i] ?? i + 1, column, found: cell(column) });
    const y = isMissing(cell('y')) ? null : readNumber(cell('y'), decimal);
    if (y === null && !isMissing(cell('y'))) return bad('y');
    const slot = isMissing(cell('slot')) ? null : Number(cell('slot'));
    if (slot !== null && !(Number.isInteger(slot) && slot >= 1)) return bad('slot');
    const measured = isMissing(cell('covariate')) ? null : readNumber(cell('covariate'), decimal);
    if (measured === null && !isMissing(cell('covariate'))) return bad('covariate');
    covariate ||= measured !== null;
    const session = place(ids, cell('session'));
    const [machine, shift] = [cell('machine'), cell('shift')];
    sessions[session] ??= { id: cell('session'), name: cell('session'), ...(shift === '' ? {} : { shift }) };
    rows.push({
      treatment: place(treatments, cell('treatment')),
      session,
      slot: slot === null ? null : slot - 1,
      y: y?.value ?? null,
      ruined: yes.test(cell('ruined')),
      limit: y?.limit ?? 'none',
      runId: `line ${numbers[i] ?? i + 1}`,
      ...(machine === '' ? {} : { machine }),
      ...(measured === null ? {} : { covariate: measured.value })
    });
  }
  const control = choices.control === null ? null : treatments.indexOf(choices.control);
  if (control !== null && control < 0) {
    return fail({ tag: 'unknown-control', name: choices.control ?? '', known: treatments });
  }
  return ok({
    treatments: treatments.map((name) => ({ id: name, name })),
    sessions,
    rows,
    direction: choices.direction,
    control,
    alpha: choices.alpha,
    equivalenceMargin: choices.margin,
    primary: choices.primary,
    factors: {
      slot: choices.slots,
      machine: header.includes('machine'),
      shift: false,
      covariate
    },
    kind: choices.kind,
    seed: choices.seed
  });
}
