import { planChoices as en } from './en/plan-choices.ts';
import { inLanguage } from './locale.svelte.ts';

export const planChoicesTexts = inLanguage({ en, de: async () => (await import('./de/plan-choices.ts')).planChoices });
