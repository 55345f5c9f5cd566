import { home as de } from './de/home.ts';
import { home as en } from './en/home.ts';
import { inLanguage } from './locale.svelte.ts';

export const homeTexts = inLanguage({ en, de });
