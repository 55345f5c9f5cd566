import { shell as en } from './en/shell.ts';
import { inLanguage } from './locale.svelte.ts';

export const shellTexts = inLanguage({ en, de: async () => (await import('./de/shell.ts')).shell });
