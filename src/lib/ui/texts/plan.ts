import { plan as en } from './en/plan.ts';
import { inLanguage } from './locale.svelte.ts';

export const planTexts = inLanguage({ en, de: async () => (await import('./de/plan.ts')).plan });
