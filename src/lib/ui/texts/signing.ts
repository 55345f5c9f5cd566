import { signing as en } from './en/signing.ts';
import { inLanguage } from './locale.svelte.ts';

export const signingTexts = inLanguage<typeof en>({ en, de: async () => (await import('./de/signing.ts')).signing });
