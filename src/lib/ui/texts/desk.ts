import { desk as en } from './en/desk.ts';
import { inLanguage } from './locale.svelte.ts';

export const deskTexts = inLanguage<typeof en>({ en, de: async () => (await import('./de/desk.ts')).desk });
