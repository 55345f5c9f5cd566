import { plots as en } from './en/plots.ts';
import { inLanguage } from './locale.svelte.ts';

export const plotTexts = inLanguage<typeof en>({ en, de: async () => (await import('./de/plots.ts')).plots });
