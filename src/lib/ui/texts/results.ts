import { answer as answerEn } from './en/answer.ts';
import { how as howEn } from './en/how.ts';
import { layers as layersEn } from './en/layers.ts';
import { reasons as reasonsEn } from './en/reasons.ts';
import { results as resultsEn } from './en/results.ts';
import { warnings as warningsEn } from './en/warnings.ts';
import { inLanguage } from './locale.svelte.ts';

const en = {
  answer: answerEn,
  how: howEn,
  layers: layersEn,
  reasons: reasonsEn,
  results: resultsEn,
  warnings: warningsEn
};

export type ResultWords = typeof en;

/** Everything the results say, by the kind of thing said. */
export const resultWords = inLanguage<ResultWords>({ en, de: () => import('./de/all-results.ts') });
