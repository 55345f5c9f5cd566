import { shift as en } from './en/shift.ts';
import { inLanguage } from './locale.svelte.ts';

export const shiftTexts = inLanguage({ en, de: async () => (await import('./de/shift.ts')).shift });
