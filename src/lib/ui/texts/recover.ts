import { inLanguage } from './locale.svelte.ts';
import { recover as en } from './en/recover.ts';

export const recoverTexts = inLanguage({ en, de: async () => (await import('./de/recover.ts')).recover });
