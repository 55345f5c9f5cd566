import { plots as de } from './de/plots.ts';
import { plots as en } from './en/plots.ts';
import { inLanguage } from './locale.svelte.ts';

export const plotTexts = inLanguage({ en, de });
