import { inLanguage } from './locale.svelte.ts';
import { record as en } from './en/record.ts';

export const recordTexts = inLanguage({ en, de: async () => (await import('./de/record.ts')).record });
