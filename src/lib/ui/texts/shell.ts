import { shell as de } from './de/shell.ts';
import { shell as en } from './en/shell.ts';
import { inLanguage } from './locale.svelte.ts';

export const shellTexts = inLanguage({ en, de });
