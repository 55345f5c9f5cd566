import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { observationsOf } from '#lib/core/campaign/observations-of.ts';
import { replay } from '#lib/core/campaign/replay.ts';
import { actsFromTable } from '#lib/core/exchange/readings-table/acts-from-table.ts';
import { guessColumns } from '#lib/core/exchange/readings-table/guess-columns.ts';
import { planFromTable, type TableQuestion } from '#lib/core/exchange/readings-table/plan-from-table.ts';
import { readDelimited } from '#lib/core/exchange/readings-table/read-delimited.ts';
import { readNumber } from '#lib/core/exchange/readings-table/read-number.ts';
import { sealedActs } from '../../campaign/sealed-acts.ts';

/** Published: D.C. Montgomery, Design and Analysis of Experiments, catalysts and batches (response: reaction time, minutes). */
export const catalyst = `catalyst;batch;time
1;1;73
3;1;73
4;1;75
1;2;74
2;2;75
3;2;75
2;3;67
3;3;68
4;3;72
1;4;71
2;4;72
4;4;75
`;

const question: TableQuestion = {
  title: 'Catalysts',
  file: 'catalyst.csv',
  units: {},
  directions: {},
  control: null,
  sessions: 'fixed'
};

const tableOf = (text: string) => {
  const read = readDelimited(text);
  if (!read.ok) throw new Error(read.error.tag);
  return read.value;
};

const campaignOf = (text: string) => {
  const table = tableOf(text);
  return planFromTable(table, guessColumns(table), question);
};

describe('readDelimited(text)', () => {
  test('finds comma, semicolon, tabulator and bar', () => {
    for (const delimiter of [',', ';', '\t', '|'] as const)
      expect(tableOf(`a${delimiter}b\n1${delimiter}2`).delimiter).toBe(delimiter);
  });

  test('takes the semicolon where the comma is a decimal sign', () => {
    const { delimiter, rows } = tableOf('a;b\nx;1,5\ny;2,5');
    expect(delimiter).toBe(';');
    expect(rows[1]).toEqual(['x', '1,5']);
  });

  test('understands quotes, doubled quotes, line ends inside quotes and a byte-order mark', () => {
    const { rows, lines } = tableOf('\uFEFFname,y\r\n"A, ""the\nfirst""",1\r\n\r\nB,2\r\n');
    expect(rows).toEqual([
      ['name', 'y'],
      ['A, "the\nfirst"', '1'],
      ['B', '2']
    ]);
    expect(lines).toEqual([1, 2, 5]);
  });

  test('says what is wrong with an empty, a one-column and an unclosed table', () => {
    expect(readDelimited('  \n')).toEqual({ ok: false, error: { tag: 'empty-table' } });
    expect(readDelimited('a\nb\nc')).toEqual({ ok: false, error: { tag: 'one-column' } });
    expect(readDelimited('a,b\n1,"2\n3,4')).toEqual({ ok: false, error: { tag: 'unclosed-quote', line: 2 } });
  });

  test('never throws on any text', () => {
    fc.assert(
      fc.property(fc.string({ unit: 'binary', maxLength: 300 }), (text) => typeof readDelimited(text).ok === 'boolean')
    );
  });
});

describe('readNumber(cell, decimal)', () => {
  test('reads the decimal sign it is told and groups of the other', () => {
    expect(readNumber('1.234,5', ',')?.value).toBe(1234.5);
    expect(readNumber('1,234.5', '.')?.value).toBe(1234.5);
    expect(readNumber('−3,2e-2', ',')?.value).toBe(-0.032);
    expect(readNumber("12'000", '.')?.value).toBe(12000);
  });

  test('reads limits', () => {
    expect(readNumber('> 10000', '.')).toEqual({ value: 10000, limit: 'at-least' });
    expect(readNumber('≤0.5', '.')).toEqual({ value: 0.5, limit: 'at-most' });
  });

  test('turns nothing else into a number', () => {
    for (const text of ['', 'abc', '1,5', '1.2.3', '12 34', '0x10', '1e999', '5 g', '--1'])
      expect(readNumber(text, '.')).toBeNull();
  });

  test('reads back every number that JavaScript writes', () => {
    fc.assert(
      fc.property(fc.double({ noNaN: true, noDefaultInfinity: true }), (x) => {
        expect(readNumber(String(x), '.')?.value).toBe(x === 0 ? 0 : x);
      })
    );
  });
});

describe('guessColumns(table)', () => {
  test('finds the columns of the published catalyst table by their heads', () => {
    expect(guessColumns(tableOf(catalyst))).toMatchObject({
      header: true,
      treatment: 0,
      session: 1,
      values: [2],
      decimal: '.'
    });
  });

  test('finds the decimal comma', () => {
    expect(guessColumns(tableOf('paint;session;loss\nA;1;1,5\nB;1;2,5\nA;2;1,7')).decimal).toBe(',');
  });
});

describe('planFromTable(table, mapping, question)', () => {
  test('gives the published catalyst table its treatments, sessions and balance', () => {
    const made = campaignOf(catalyst);
    if (!made.ok) throw new Error(JSON.stringify(made.error));
    const { issued, readings } = made.value;
    expect(issued.plan.treatments.map((t) => t.name)).toEqual(['1', '3', '4', '2']);
    expect(issued.sessions).toHaveLength(4);
    expect(issued.design.balanced).toBe(true);
    expect(readings.map((r) => r.value)).toEqual([73, 73, 75, 74, 75, 75, 67, 68, 72, 71, 72, 75]);
  });

  test('names line and cell of what is no number, and all such lines', () => {
    const made = campaignOf('treatment,session,y\nA,1,1.5\nB,1,abc\nA,2,2.5 g\nB,2,3');
    expect(made).toEqual({
      ok: false,
      error: {
        tag: 'faults',
        faults: [
          { tag: 'not-a-number', line: 3, column: 'y', found: 'abc' },
          { tag: 'not-a-number', line: 4, column: 'y', found: '2.5 g' }
        ]
      }
    });
  });

  test('refuses two runs in one slot of a session', () => {
    const made = campaignOf('treatment,session,slot,y\nA,1,1,1\nB,1,1,2');
    expect(made.ok ? [] : made.error.faults).toEqual([{ tag: 'slot-twice', line: 3, session: '1', slot: 1 }]);
  });

  test('keeps missing cells missing and ruined rows ruined', () => {
    const made = campaignOf('treatment,session,y,ruined\nA,1,1,\nB,1,NA,\nA,2,9,yes\nB,2,2,no');
    if (!made.ok) throw new Error(JSON.stringify(made.error));
    expect(made.value.missing).toBe(1);
    expect(made.value.readings).toHaveLength(3);
    expect(made.value.ruined).toEqual([{ session: 's2', slot: 0, reason: 'marked in the file, line 4' }]);
  });
});

describe('actsFromTable(campaign)', () => {
  test('makes events that the schema accepts and whose replay gives the readings of the file', () => {
    const made = campaignOf(catalyst);
    if (!made.ok) throw new Error('no campaign');
    const events = sealedActs(actsFromTable(made.value));
    const state = replay(events);
    expect(state.contradictions).toEqual([]);
    expect(state.sessions.map((s) => s.status)).toEqual(Array(4).fill('closed'));
    const rows = observationsOf(state, 'time', () => null);
    expect(rows.map((r) => r.y)).toEqual([73, 73, 75, 74, 75, 75, 67, 68, 72, 71, 72, 75]);
    expect(rows.every((r) => !r.ruined && !r.undecided)).toBe(true);
  });
});
