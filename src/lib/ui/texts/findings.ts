import { findings as en } from './en/findings.ts';
import { inLanguage } from './locale.svelte.ts';

export const findingTexts = inLanguage({ en, de: async () => (await import('./de/findings.ts')).findings });
