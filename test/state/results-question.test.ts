import { readFileSync } from 'node:fs';
import { describe, expect, test } from 'vitest';
import { analyse } from '#lib/core/analysis/analyse.ts';
import type { Observations } from '#lib/core/analysis/observations.ts';
import { askQuestion } from '#lib/state/results-question.ts';
import { readingsFromCsv } from '../../src/cli/readings-csv.ts';
import { numberWriter } from '#lib/ui/format/number-writer.ts';
import { exampleQuestion, weightedSum } from '#lib/ui/results/question-row.ts';
import { question as german } from '#lib/ui/texts/de/question.ts';
import { question as english } from '#lib/ui/texts/en/question.ts';

interface Case {
  data: { treatment: string[]; block: string[]; y: number[] };
  intra: { pairs: Record<'estimate' | 'se' | 't' | 'p', number[]>; critical: { t975: number } };
  reml: { kenwardRoger: { pairs: Record<'estimate' | 'se' | 'df' | 't' | 'p', number[]> } };
}
/** D. C. Montgomery's catalyst example with reference figures of R (lm, lme4, pbkrtest). */
const catalyst = JSON.parse(readFileSync('test/reference/cases/pub_catalyst.json', 'utf8')) as Case;

function observations(rows: readonly [treatment: string, session: string, y: number][]): Observations {
  const csv = ['treatment,session,y', ...rows.map((row) => row.join(','))].join('\n');
  const read = readingsFromCsv(csv, {
    alpha: 0.05,
    control: null,
    direction: 'lower',
    primary: 'fixed',
    margin: null,
    seed: 1,
    slots: false,
    kind: 'number'
  });
  if (!read.ok) throw new Error(read.error.tag);
  return read.value;
}
const { treatment, block, y } = catalyst.data;
const input = observations(y.map((value, i) => [`Catalyst ${treatment[i]}`, block[i]!, value]));
const ask = (text: string, of = input) => askQuestion(of, text, (asked) => Promise.resolve(analyse(asked)));
const names = input.treatments.map(({ name }) => name);

async function lines(text: string, of = input) {
  const made = await ask(text, of);
  if (!made.ok) throw new Error(made.error.tag);
  const figures = (model: 'fixed' | 'random') => {
    const section = made.value.models[model];
    if (!section.ok) throw new Error(section.error.tag);
    return section.value.result;
  };
  return { fixed: figures('fixed'), random: figures('random'), weights: made.value.weights };
}

describe('askQuestion(input, text)', () => {
  test('askQuestion("Catalyst 1 − Catalyst 4") gives the figures of that pair under both models', async () => {
    const { fixed, random } = await lines('Catalyst 1 − Catalyst 4');
    if (!fixed.ok || !random.ok) throw new Error('no estimate');
    const pairs = catalyst.intra.pairs;
    expect(fixed.value.estimate).toBeCloseTo(pairs.estimate[2]!, 9);
    expect(fixed.value.se).toBeCloseTo(pairs.se[2]!, 9);
    expect(fixed.value.df).toBe(5);
    expect(fixed.value.t).toBeCloseTo(pairs.t[2]!, 8);
    expect(fixed.value.p).toBeCloseTo(pairs.p[2]!, 8);
    const half = catalyst.intra.critical.t975 * pairs.se[2]!;
    expect(fixed.value.lower).toBeCloseTo(pairs.estimate[2]! - half, 8);
    expect(fixed.value.upper).toBeCloseTo(pairs.estimate[2]! + half, 8);
    const kr = catalyst.reml.kenwardRoger.pairs;
    expect(random.value.estimate).toBeCloseTo(kr.estimate[2]!, 6);
    expect(random.value.se).toBeCloseTo(kr.se[2]!, 6);
    expect(random.value.df).toBeCloseTo(kr.df[2]!, 5);
    expect(random.value.p).toBeCloseTo(kr.p[2]!, 6);
  });

  test('askQuestion("Catalyst 4 − ½·Catalyst 1 − ½·Catalyst 2") weighs: published means 75, 71.375, 71.625; variance ΣΣ by the pairs', async () => {
    const { fixed, weights } = await lines('Catalyst 4 − ½·Catalyst 1 − ½·Catalyst 2');
    if (!fixed.ok) throw new Error('no estimate');
    expect(names.map((name, i) => [name, weights[i]])).toEqual(
      expect.arrayContaining([
        ['Catalyst 1', -0.5],
        ['Catalyst 2', -0.5],
        ['Catalyst 3', 0],
        ['Catalyst 4', 1]
      ])
    );
    expect(fixed.value.estimate).toBeCloseTo(75 - (71.375 + 71.625) / 2, 9);
    // Balanced: Var Σwᵢτ̂ᵢ = Σwᵢ² kσ²/(λt), Montgomery section 4.4, with k = 3, λ = 2, t = 4 and error mean square 0.65.
    expect(fixed.value.se).toBeCloseTo(Math.sqrt((1.5 * 3 * 0.65) / (2 * 4)), 9);
  });

  test('askQuestion(the example of the screen) is understood, whatever the names', async () => {
    const odd = ['Recipe 1', '2', 'A − B', 'x (new)'];
    const strange = observations(y.map((value, i) => [odd[Number(treatment[i]) - 1]!, block[i]!, value]));
    const typed = exampleQuestion(strange.treatments.map(({ name }) => name));
    const { weights } = await lines(typed, strange);
    expect([...weights]).toEqual([1, -0.5, -0.5, 0]);
    expect(exampleQuestion(['A', 'B'])).toBe('A − B');
  });

  test('askQuestion(treatments of two groups without a session in common) says that they cannot be compared', async () => {
    const parts = observations(
      ['1', '2'].flatMap((s, j): [string, string, number][] =>
        ['A', 'B'].flatMap((a, i): [string, string, number][] => [
          [a, s, 3 + i + j * 0.3 * (i + 1)],
          [a === 'A' ? 'C' : 'D', `${s}x`, 5 + i + j * 0.7 * (i + 1)]
        ])
      )
    );
    const { fixed } = await lines('A − C', parts);
    expect(fixed).toEqual({ ok: false, error: { tag: 'disconnected', parts: 2 } });
    const { fixed: inside } = await lines('A − B', parts);
    expect(inside.ok).toBe(true);
  });

  test.each([
    ['', 'empty', /first/, /Zuerst/],
    ['Catalyst 1 − Catalist 2', 'unknown-name', /“Catalist”.*Catalyst 1/, /„Catalist“.*Catalyst 1/],
    ['Catalyst 1 − ½·Catalyst 2', 'weights-do-not-cancel', /add to 0\.5 /, /zusammen 0,5 statt/],
    ['Catalyst 1 −', 'ended-early', /stops/, /mittendrin/],
    ['(Catalyst 1 − Catalyst 2', 'unclosed', /character 1 /, /Stelle 1 /],
    ['Catalyst 1 − Catalyst 2 + 3', 'number-without-treatment', /number 3 /, /Zahl 3 /],
    ['Catalyst 1 · Catalyst 2', 'product-of-treatments', /multiplied/, /multipliziert/],
    ['Catalyst 1 / 0', 'division-by-zero', /by zero/, /durch null/],
    ['Catalyst 1 − Catalyst 1', 'nothing-left', /cancel/, /heben sich auf/]
  ])('askQuestion("%s") is refused as %s, with a sentence in both languages', async (text, tag, en, de) => {
    const made = await ask(text);
    if (made.ok) throw new Error('understood');
    expect(made.error.tag).toBe(tag);
    const fault = made.error as Parameters<typeof english.fault>[0];
    expect(english.fault(fault, names, (x) => numberWriter('en-GB').fixed(x, x % 1 ? 1 : 0))).toMatch(en);
    expect(german.fault(fault, names, (x) => numberWriter('de-DE').fixed(x, x % 1 ? 1 : 0))).toMatch(de);
  });
});

test('weightedSum(weights, names, write) says the question back, zero weights left out', () => {
  const write = numberWriter('en-GB');
  expect(weightedSum([1, 0, -0.5, -0.5], ['A', 'B', 'C', 'D'], write)).toBe('A − 0.5·C − 0.5·D');
  expect(weightedSum([-1, 1], ['A', 'B'], write)).toBe('−A + B');
  expect(weightedSum([1, -1 / 3, -2 / 3], ['A', 'B', 'C'], write)).toBe('A − 0.3333·B − 0.6667·C');
});
