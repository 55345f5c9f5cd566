import { planIssued as de } from './de/plan-issued.ts';
import { planIssued as en } from './en/plan-issued.ts';
import { inLanguage } from './locale.svelte.ts';

export const planIssuedTexts = inLanguage({ en, de });
