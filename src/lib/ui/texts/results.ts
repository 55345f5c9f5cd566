import { answer as answerDe } from './de/answer.ts';
import { how as howDe } from './de/how.ts';
import { layers as layersDe } from './de/layers.ts';
import { reasons as reasonsDe } from './de/reasons.ts';
import { results as resultsDe } from './de/results.ts';
import { warnings as warningsDe } from './de/warnings.ts';
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
export const resultWords = inLanguage<ResultWords>({
  en,
  de: {
    answer: answerDe,
    how: howDe,
    layers: layersDe,
    reasons: reasonsDe,
    results: resultsDe,
    warnings: warningsDe
  }
});
