import { planIssued as en } from './en/plan-issued.ts';
import { inLanguage } from './locale.svelte.ts';

export const planIssuedTexts = inLanguage({ en, de: async () => (await import('./de/plan-issued.ts')).planIssued });
