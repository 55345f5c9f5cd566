import { help as en } from './en/help.ts';
import { inLanguage } from './locale.svelte.ts';

export const helpTexts = inLanguage<typeof en>({ en, de: async () => (await import('./de/help.ts')).help });
