import { readFileSync } from 'node:fs';
import { describe, expect, test } from 'vitest';
import { analyse } from '#lib/core/analysis/analyse.ts';
import type { Direction, Observations } from '#lib/core/analysis/observations.ts';
import { numberWriter } from '#lib/ui/format/number-writer.ts';
import { severalTable } from '#lib/ui/results/several-table.ts';
import type { ResultView } from '#lib/ui/results/view.ts';
import * as wordsDe from '#lib/ui/texts/de/all-results.ts';
import * as words from '#lib/ui/texts/en/all-results.ts';

/** D. C. Montgomery's catalyst example, adjusted means 71.375, 71.625, 72.000 and 75.000; values changed as asked. */
function catalysts(label: string, direction: Direction, change: (y: number) => number = (y) => y): ResultView {
  const { data } = JSON.parse(readFileSync('test/reference/cases/pub_catalyst.json', 'utf8')) as {
    data: { treatment: string[]; block: string[]; y: number[] };
  };
  const treatments = [...new Set(data.treatment)].sort();
  const sessions = [...new Set(data.block)];
  const input: Observations = {
    treatments: treatments.map((name) => ({ id: name, name: `Catalyst ${name}` })),
    sessions: sessions.map((name) => ({ id: name, name })),
    rows: data.y.map((y, i) => ({
      treatment: treatments.indexOf(data.treatment[i]!),
      session: sessions.indexOf(data.block[i]!),
      slot: null,
      y: change(y),
      ruined: false,
      limit: 'none',
      runId: String(i)
    })),
    direction,
    control: 3,
    alpha: 0.05,
    equivalenceMargin: null,
    primary: 'fixed',
    factors: { slot: false, machine: false, shift: false },
    kind: 'number',
    seed: 1
  };
  const made = analyse(input);
  if (!made.ok) throw new Error(made.error.tag);
  return {
    measured: { id: label, label, unit: 'min', decimals: 1, difference: null },
    input,
    analysis: made.value
  };
}

const write = numberWriter('en-GB');
const time = catalysts('Time', 'lower');
const yieldOf = catalysts('Yield', 'higher', (y) => y - 60);
const nearest = catalysts('Level', { target: 72 });

describe('severalTable(views, words, write)', () => {
  test('severalTable([lower, higher, target]) puts the best by the first measurand on top and ranks each by its own direction', () => {
    const { rows } = severalTable([time, yieldOf, nearest], words, write);
    expect(rows.map(({ name }) => name)).toEqual(['Catalyst 1', 'Catalyst 2', 'Catalyst 3', 'Catalyst 4']);
    expect(rows.map(({ cells }) => cells.map((cell) => cell?.rank))).toEqual([
      [1, 4, 3],
      [2, 3, 2],
      [3, 2, 1],
      [4, 1, 4]
    ]);
    expect(rows.map(({ cells }) => cells.map((cell) => cell?.mean))).toEqual([
      ['71.375', '11.375', '71.375'],
      ['71.625', '11.625', '71.625'],
      ['72.000', '12.000', '72.000'],
      ['75.000', '15.000', '75.000']
    ]);
    expect(rows.map(({ control }) => control)).toEqual([false, false, false, true]);
  });

  test('severalTable(views) gives each column the letters of its own analysis: only catalyst 4 stands apart (Tukey, 0.05)', () => {
    // p by Tukey against catalyst 4 are 0.013, 0.017 and 0.028, all others above 0.8 (reference: emmeans and ptukey of R).
    const { rows } = severalTable([time, yieldOf], words, write);
    const letters = rows.map(({ cells }) => cells.map((cell) => cell?.letters));
    expect(letters.slice(0, 3)).toEqual([
      ['a', 'b'],
      ['a', 'b'],
      ['a', 'b']
    ]);
    expect(letters[3]).toEqual(['b', 'a']);
  });

  test('severalTable([yield first]) follows the measurand that comes first', () => {
    const { rows, columns } = severalTable([yieldOf, time], words, write);
    expect(rows.map(({ treatment }) => treatment)).toEqual([3, 2, 1, 0]);
    expect(columns.map(({ label }) => label)).toEqual(['Yield', 'Time']);
  });

  test('severalTable(views) says in words which end is better, a target with its unit, in both languages', () => {
    const inEnglish = severalTable([time, yieldOf, nearest], words, write).columns;
    expect(inEnglish.map(({ better }) => better)).toEqual([
      'lower is better',
      'higher is better',
      'nearest to 72.0\u00a0min is best'
    ]);
    const inGerman = severalTable([nearest], wordsDe, numberWriter('de-DE')).columns;
    expect(inGerman[0]?.better).toContain('72,0\u00a0min');
  });

  test('severalTable(views) names a common first treatment only where every measurand has the same one alone', () => {
    expect(severalTable([time, time], words, write).first).toBe(0);
    expect(severalTable([time, yieldOf], words, write).first).toBeNull();
  });

  test('severalTable([one without an analysis]) keeps its column empty and says why; the order comes from the other', () => {
    const bare: ResultView = {
      ...time,
      analysis: {
        ...time.analysis,
        fixed: { ok: false, error: { tag: 'one-session' } },
        random: { ok: false, error: { tag: 'one-session' } }
      }
    };
    const { rows, columns, first } = severalTable([bare, yieldOf], words, write);
    expect(rows.map(({ treatment }) => treatment)).toEqual([3, 2, 1, 0]);
    expect(rows.every(({ cells }) => cells[0] === null && cells[1] !== null)).toBe(true);
    expect(columns[0]?.note).toMatch(/one session/);
    expect(first).toBeUndefined();
  });

  test('severalTable([sessions in two groups]) gives no ranks, because means of different groups cannot be compared', () => {
    const apart = { ...time.input, rows: time.input.rows.filter(({ session }) => session < 2) };
    // Kept: treatments 1 and 2 in one session, 3 and 4 in the other.
    const rows = apart.rows.map((row, i) => ({ ...row, session: i % 2, treatment: (i % 2) * 2 + ((i >> 1) % 2) }));
    const made = analyse({ ...apart, rows: [...rows, ...rows.map((row) => ({ ...row, y: (row.y ?? 0) + 1 }))] });
    if (!made.ok) throw new Error(made.error.tag);
    const table = severalTable([{ ...time, analysis: made.value }], words, write);
    expect(table.rows.map(({ cells }) => cells[0]?.rank)).toEqual([null, null, null, null]);
    expect(table.columns[0]?.note).toMatch(/2 groups/);
    expect(table.first).toBeUndefined();
  });
});
