import { planFaults as de } from './de/plan-faults.ts';
import { planFaults as en } from './en/plan-faults.ts';
import { inLanguage } from './locale.svelte.ts';

export const planFaultTexts = inLanguage({ en, de });
