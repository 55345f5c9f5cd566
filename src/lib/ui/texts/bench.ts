import { bench as en } from './en/bench.ts';
import { inLanguage } from './locale.svelte.ts';

export const benchTexts = inLanguage({ en, de: async () => (await import('./de/bench.ts')).bench });
