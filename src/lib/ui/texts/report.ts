import { report as en } from './en/report.ts';
import { inLanguage } from './locale.svelte.ts';

export const reportTexts = inLanguage<typeof en>({ en, de: async () => (await import('./de/report.ts')).report });
