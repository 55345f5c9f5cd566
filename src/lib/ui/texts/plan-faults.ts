import { planFaults as en } from './en/plan-faults.ts';
import { inLanguage } from './locale.svelte.ts';

export const planFaultTexts = inLanguage({ en, de: async () => (await import('./de/plan-faults.ts')).planFaults });
