import { planChoices as de } from './de/plan-choices.ts';
import { planChoices as en } from './en/plan-choices.ts';
import { inLanguage } from './locale.svelte.ts';

export const planChoicesTexts = inLanguage({ en, de });
