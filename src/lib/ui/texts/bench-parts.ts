import { benchParts as en } from './en/bench-parts.ts';
import { inLanguage } from './locale.svelte.ts';

/** Texts of what comes after the bench's first script: panels and sheets. */
export const benchPartTexts = inLanguage({ en, de: async () => (await import('./de/bench-parts.ts')).benchParts });
