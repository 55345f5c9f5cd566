import { importing as en } from './en/import.ts';
import { inLanguage } from './locale.svelte.ts';

export const importTexts = inLanguage<typeof en>({ en, de: async () => (await import('./de/import.ts')).importing });
