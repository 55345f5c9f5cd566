import { opening as en } from './en/opening.ts';
import { inLanguage } from './locale.svelte.ts';

export const openingTexts = inLanguage({ en, de: async () => (await import('./de/opening.ts')).opening });
