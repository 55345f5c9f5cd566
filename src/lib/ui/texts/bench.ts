import { bench as de } from './de/bench.ts';
import { bench as en } from './en/bench.ts';
import { inLanguage } from './locale.svelte.ts';

export const benchTexts = inLanguage({ en, de });
