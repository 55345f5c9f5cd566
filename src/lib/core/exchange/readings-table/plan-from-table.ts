import type { IssuedPlan, PlannedSession } from '../../campaign/plan.ts';
import { fail, ok, type Result } from '../../result.ts';
import type { ColumnMapping } from './guess-columns.ts';
import type { DelimitedTable } from './read-delimited.ts';
import { decimalsOf, isMissing, readNumber } from './read-number.ts';

/** What the person says about the table beside its columns. */
export interface TableQuestion {
  title: string;
  /** Name of the file, for the record. */
  file: string;
  /** By column number of the table. */
  units: Record<number, string>;
  directions: Record<number, 'lower' | 'higher'>;
  control: string | null;
  /** Sessions fixed or random in the primary analysis. */
  sessions: 'fixed' | 'random';
}

export interface TableReading {
  session: string;
  slot: number;
  specimen: string;
  reading: string;
  raw: string;
  value: number;
  limit: 'none' | 'at-least' | 'at-most';
}

/** A table as a campaign: the plan it implies and what happened. */
export interface TableCampaign {
  issued: IssuedPlan;
  readings: TableReading[];
  ruined: { session: string; slot: number; reason: string }[];
  /** What the file calls a session, where that is not its number in loading order. */
  names: { session: string; text: string }[];
  /** Cells without a value. */
  missing: number;
}

export type TableFault =
  | { tag: 'no-column'; role: 'treatment' | 'session' | 'value' }
  | { tag: 'no-rows' }
  | { tag: 'empty-name'; line: number; role: 'treatment' | 'session' }
  | { tag: 'not-a-number'; line: number; column: string; found: string }
  | { tag: 'bad-slot'; line: number; found: string }
  | { tag: 'slot-twice'; line: number; session: string; slot: number }
  | { tag: 'specimen-twice'; line: number; specimen: string }
  | { tag: 'too-many'; what: 'treatments' | 'sessions' | 'slots'; have: number; most: number };

const ruinWords = /^(1|true|yes|y|x|ja|j|wahr|ruined|rejected|excluded|verworfen)$/i;

const cut = (text: string, most: number): string => text.slice(0, most);

/** An id of letters, digits and underscores made of a head, unique among those given. */
function idOf(head: string, used: Set<string>): string {
  const stem =
    head
      .normalize('NFKD')
      .replace(/[^A-Za-z0-9]+/g, '_')
      .replace(/^[^A-Za-z]+|_+$/g, '')
      .toLowerCase()
      .slice(0, 30) || 'y';
  let id = stem;
  for (let n = 2; used.has(id); n += 1) id = `${stem}_${n}`;
  used.add(id);
  return id;
}

/**
 * Returns the campaign that a table of readings implies: treatments and sessions in order of appearance, one run a row. Nothing
 * is guessed about the numbers: a cell that is none is a fault with its line.
 * Errors: all faults found, at most 50.
 * Checked by: test/core/exchange/readings-table/readings-table.test.ts
 */
export function planFromTable(
  table: DelimitedTable,
  mapping: ColumnMapping,
  question: TableQuestion
): Result<TableCampaign, { tag: 'faults'; faults: TableFault[] }> {
  const faults: TableFault[] = [];
  const note = (fault: TableFault): void => {
    if (faults.length < 50) faults.push(fault);
  };
  if (mapping.treatment < 0) note({ tag: 'no-column', role: 'treatment' });
  if (mapping.session < 0) note({ tag: 'no-column', role: 'session' });
  if (mapping.values.length === 0) note({ tag: 'no-column', role: 'value' });
  const heads = mapping.header ? (table.rows[0] ?? []) : [];
  const headOf = (c: number): string => heads[c] || `column ${c + 1}`;
  const rows = mapping.header ? table.rows.slice(1) : table.rows;
  const lineOf = (i: number): number => table.lines[mapping.header ? i + 1 : i] ?? i + 1;
  if (rows.length === 0) note({ tag: 'no-rows' });
  if (faults.length > 0) return fail({ tag: 'faults', faults });

  const treatments = new Map<string, string>();
  const sessions = new Map<
    string,
    { id: string; name: string; runs: Map<number, { treatment: string; specimen: string }> }
  >();
  const used = new Set<string>();
  const readingIds = mapping.values.map((c) => idOf(headOf(c), used));
  const decimals = mapping.values.map(() => 0);
  const limited = mapping.values.map(() => false);
  const specimens = new Set<string>();
  const readings: TableReading[] = [];
  const ruined: TableCampaign['ruined'] = [];
  let missing = 0;

  rows.forEach((row, i) => {
    const line = lineOf(i);
    const treatmentName = cut(row[mapping.treatment] ?? '', 120);
    const sessionName = cut(row[mapping.session] ?? '', 120);
    if (treatmentName === '') note({ tag: 'empty-name', line, role: 'treatment' });
    if (sessionName === '') note({ tag: 'empty-name', line, role: 'session' });
    if (treatmentName === '' || sessionName === '') return;
    if (!treatments.has(treatmentName)) treatments.set(treatmentName, `t${treatments.size + 1}`);
    let session = sessions.get(sessionName);
    if (session === undefined) {
      session = { id: `s${sessions.size + 1}`, name: sessionName, runs: new Map() };
      sessions.set(sessionName, session);
    }
    let slot = session.runs.size;
    if (mapping.slot >= 0) {
      const found = row[mapping.slot] ?? '';
      const number = Number(found);
      if (!Number.isInteger(number) || number < 1 || number > 100) {
        note({ tag: 'bad-slot', line, found: cut(found, 40) });
        return;
      }
      slot = number - 1;
    }
    if (session.runs.has(slot)) {
      note({ tag: 'slot-twice', line, session: sessionName, slot: slot + 1 });
      return;
    }
    const specimen =
      mapping.specimen >= 0 && row[mapping.specimen]
        ? cut(row[mapping.specimen] ?? '', 24)
        : `${session.id}-${slot + 1}`;
    if (specimens.has(specimen)) {
      note({ tag: 'specimen-twice', line, specimen });
      return;
    }
    specimens.add(specimen);
    session.runs.set(slot, { treatment: treatments.get(treatmentName) ?? '', specimen });
    mapping.values.forEach((column, v) => {
      const raw = row[column] ?? '';
      if (isMissing(raw)) {
        missing += 1;
        return;
      }
      const number = readNumber(raw, mapping.decimal);
      if (number === null) {
        note({ tag: 'not-a-number', line, column: headOf(column), found: cut(raw, 60) });
        return;
      }
      decimals[v] = Math.min(12, Math.max(decimals[v] ?? 0, decimalsOf(raw, mapping.decimal)));
      if (number.limit !== 'none') limited[v] = true;
      readings.push({
        session: session.id,
        slot,
        specimen,
        reading: readingIds[v] ?? 'y',
        raw: cut(raw, 200),
        ...number
      });
    });
    if (mapping.ruined >= 0 && ruinWords.test(row[mapping.ruined] ?? ''))
      ruined.push({ session: session.id, slot, reason: `marked in the file, line ${line}` });
  });

  const slots = Math.max(1, ...[...sessions.values()].flatMap((s) => [...s.runs.keys()].map((slot) => slot + 1)));
  if (slots > 100) note({ tag: 'too-many', what: 'slots', have: slots, most: 100 });
  if (treatments.size > 1000) note({ tag: 'too-many', what: 'treatments', have: treatments.size, most: 1000 });
  if (sessions.size > 100_000) note({ tag: 'too-many', what: 'sessions', have: sessions.size, most: 100_000 });
  if (faults.length > 0) return fail({ tag: 'faults', faults });

  const ids = [...treatments.values()];
  const planned = [...sessions.values()].map((session, j): PlannedSession => ({
    id: session.id,
    number: j + 1,
    shift: 1,
    machine: 'machine',
    slots: Array.from({ length: slots }, (_, slot) => session.runs.get(slot) ?? null),
    repeats: null
  }));
  const blocks = planned.map((session) =>
    session.slots.flatMap((run) => (run === null ? [] : [ids.indexOf(run.treatment)]))
  );
  const open = { min: null, max: null };
  const issued: IssuedPlan = {
    plan: {
      title: cut(question.title, 200),
      question: '',
      treatments: [...treatments].map(([name, id]) => ({
        id,
        name,
        specimens: null,
        control: name === question.control,
        note: ''
      })),
      machines: [
        {
          id: 'machine',
          name: 'as in the file',
          layout: { kind: 'row' },
          slots: Array.from({ length: slots }, (_, slot) => ({ name: String(slot + 1), inService: true }))
        }
      ],
      readings: mapping.values.map((column, v) => ({
        id: readingIds[v] ?? 'y',
        label: cut(headOf(column), 120),
        unit: cut(question.units[column] ?? '', 40),
        decimals: decimals[v] ?? 0,
        possible: open,
        expected: open,
        when: { kind: 'after' },
        repeats: 1,
        resolution: null,
        mayStopAtLimit: limited[v] ?? false
      })),
      constants: [],
      measurands: mapping.values.map((column, v) => ({
        id: readingIds[v] ?? 'y',
        label: cut(headOf(column), 120),
        unit: cut(question.units[column] ?? '', 40),
        decimals: decimals[v] ?? 0,
        formula: null,
        direction: { kind: question.directions[column] ?? 'lower' },
        kind: 'number',
        possible: open,
        expected: open,
        scatter: null,
        difference: null,
        equivalenceMargin: null
      })),
      conditions: [],
      sessionsPerShift: null,
      minutesPerSession: null,
      runSeconds: null,
      operator: '',
      precautions: [],
      ruinReasons: [],
      open: true,
      primary: {
        measurand: readingIds[0] ?? 'y',
        sessions: question.sessions,
        comparison: 'all-pairs',
        adjustment: 'tukey',
        alpha: 0.05,
        slotInModel: false
      }
    },
    design: {
      blocks,
      construction: 'as found in a file of readings',
      source: cut(question.file, 500),
      balanced: isBalanced(blocks, ids.length),
      randomisation: {
        seed: '',
        generator: 'unknown',
        generatorVersion: 0,
        algorithm: 'unknown',
        algorithmVersion: 0,
        restrictions: ['The file says nothing of how chance was used.']
      }
    },
    sessions: planned,
    spares: []
  };
  const names = [...sessions.values()].flatMap((session, j) =>
    session.name === String(j + 1) ? [] : [{ session: session.id, text: `${headOf(mapping.session)}: ${session.name}` }]
  );
  return ok({ issued, readings, ruined, names, missing });
}

/** By counting: equal replication, equal size, no treatment twice in a session, every pair together equally often. */
function isBalanced(blocks: readonly number[][], t: number): boolean {
  const size = blocks[0]?.length ?? 0;
  if (t < 2 || blocks.some((block) => block.length !== size || new Set(block).size !== size)) return false;
  const replication = new Array<number>(t).fill(0);
  const meets = new Map<number, number>();
  for (const block of blocks)
    for (const a of block) {
      replication[a] = (replication[a] ?? 0) + 1;
      for (const b of block) if (a < b) meets.set(a * t + b, (meets.get(a * t + b) ?? 0) + 1);
    }
  return new Set(replication).size === 1 && meets.size === (t * (t - 1)) / 2 && new Set(meets.values()).size === 1;
}
