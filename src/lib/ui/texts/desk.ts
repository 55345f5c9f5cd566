import { desk as de } from './de/desk.ts';
import { desk as en } from './en/desk.ts';
import { inLanguage } from './locale.svelte.ts';

export const deskTexts = inLanguage({ en, de });
