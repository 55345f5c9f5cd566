import { home as en } from './en/home.ts';
import { inLanguage } from './locale.svelte.ts';

export const homeTexts = inLanguage({ en, de: async () => (await import('./de/home.ts')).home });
