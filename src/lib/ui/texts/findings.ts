import { findings as de } from './de/findings.ts';
import { findings as en } from './en/findings.ts';
import { inLanguage } from './locale.svelte.ts';

export const findingTexts = inLanguage({ en, de });
