import { describe, expect, it } from 'vitest';
import { analyse } from '#lib/core/analysis/analyse.ts';
import type { ObservationRow, Observations } from '#lib/core/analysis/observations.ts';
import { reasons as german } from '#lib/ui/texts/de/reasons.ts';
import { reasons as english } from '#lib/ui/texts/en/reasons.ts';
import { observations } from '../../core/analysis/kept-model.ts';

const three = observations([0, 1, 2, 3].flatMap((j) => [0, 1, 2].map((i) => [i, j, 10 + i + 2 * j + ((i * j) % 3)])));
const readings = (change: (row: ObservationRow, i: number) => unknown): Observations => ({
  ...three,
  rows: three.rows.map((row, i) => ({ ...row, y: change(row, i) as number | null }))
});
const only = (keep: (row: ObservationRow) => boolean): Observations => ({ ...three, rows: three.rows.filter(keep) });

/** What a screen says of an input: the fault, or why there is no answer. */
function said(input: Observations, { fault, reason }: typeof english): { tag: string; sentence: string } {
  const result = analyse(input);
  const names = input.treatments.map(({ name }) => name);
  if (!result.ok) return { tag: result.error.tag, sentence: fault(result.error) };
  const { answer, fixed } = result.value;
  if (answer.tag === 'none' || answer.tag === 'means-only') {
    return { tag: answer.reason.tag, sentence: reason(answer.reason, names) };
  }
  if (!fixed.ok) return { tag: fixed.error.tag, sentence: reason(fixed.error, names) };
  throw new Error(`an answer: ${answer.tag}`);
}

describe.each([
  ['en', english],
  ['de', german]
])('bad input, %s', (_, texts) => {
  it.each<[string, Observations, string]>([
    ['no readings', readings(() => null), 'no-readings'],
    ['no runs', only(() => false), 'no-readings'],
    ['one session', only((row) => row.session === 0), 'no-error-degrees-of-freedom'],
    ['one treatment', only((row) => row.treatment === 1), 'one-treatment'],
    ['one run a session', only((row) => row.treatment === row.session), 'no-shared-session'],
    ['all readings equal', readings(() => 7), 'no-scatter'],
    ['NaN', readings(({ y }, i) => (i === 4 ? NaN : y)), 'not-a-number'],
    ['Infinity', readings(({ y }, i) => (i === 4 ? Infinity : y)), 'not-a-number'],
    ['a text reading', readings(({ y }, i) => (i === 4 ? 'about 12' : y)), 'not-a-number']
  ])('analyse(%s) ends in a sentence, with no NaN or undefined in it', (_name, input, tag) => {
    const { tag: found, sentence } = said(input, texts as typeof english);
    expect(found).toBe(tag);
    expect(sentence).toMatch(/^[A-ZÄÖÜ0-9„“].*[.]$/);
    // What was found in the row is quoted; nothing else may be no number.
    expect(sentence.replace(/[„“"][^„“”"]*[“”"]/g, '')).not.toMatch(/NaN|undefined|Infinity|null/);
    if (tag === 'not-a-number') expect(sentence).toContain('5');
  });
});
