import { print as en } from './en/print.ts';
import { inLanguage } from './locale.svelte.ts';

export const printTexts = inLanguage({ en, de: async () => (await import('./de/print.ts')).print });
