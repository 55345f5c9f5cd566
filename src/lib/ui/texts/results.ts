import * as en from './en/all-results.ts';
import { inLanguage } from './locale.svelte.ts';
import type { ResultWords } from './result-words.ts';

/** Everything the results say, in the current language. */
export const resultWords = inLanguage<ResultWords>({ en, de: () => import('./de/all-results.ts') });
