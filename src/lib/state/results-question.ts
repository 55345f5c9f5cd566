import { parseContrast, type ContrastFault } from '#lib/core/analysis/comparisons/parse-contrast.ts';
import type { Analysis, ContrastLine } from '#lib/core/analysis/analysis-result.ts';
import type { Observations, PrimaryModel } from '#lib/core/analysis/observations.ts';
import { fail, ok, type Result } from '#lib/core/result.ts';
import type { Section } from '#lib/core/analysis/reason.ts';
import { type AnalysisFault, analyseInWorker } from '#lib/workers/analysis-client.ts';

/** A typed question answered under both ways to treat sessions. */
export interface AnsweredQuestion {
  text: string;
  /** Weights on the treatments, in their order; they add to zero. */
  weights: number[];
  models: Record<PrimaryModel, Section<ContrastLine>>;
}

export type QuestionFault = ContrastFault | AnalysisFault;

/**
 * Answers a question that a person typed about the treatments, such as `A − ½·B − ½·C`, off the screen's thread and by the
 * same computation as every other comparison.
 *
 * @param compute the analysis; only a test gives another
 * Checked by: test/state/results-question.test.ts
 */
export async function askQuestion(
  input: Observations,
  typed: string,
  compute: (input: Observations) => Promise<Result<Analysis, AnalysisFault>> = analyseInWorker
): Promise<Result<AnsweredQuestion, QuestionFault>> {
  const text = typed.trim();
  const read = parseContrast(
    text,
    input.treatments.map(({ name }) => name)
  );
  if (!read.ok) return read;
  const weights = [...read.value];
  const made = await compute({ ...input, contrasts: [{ name: text, weights }] });
  if (!made.ok) return made;
  const { comparisons } = made.value;
  const lineOf = (model: PrimaryModel): Section<ContrastLine> => {
    const section = comparisons[model];
    if (!section.ok) return section;
    const [line] = section.value.contrasts;
    return line ? ok(line) : fail({ tag: 'not-asked' });
  };
  return ok({ text, weights, models: { fixed: lineOf('fixed'), random: lineOf('random') } });
}
