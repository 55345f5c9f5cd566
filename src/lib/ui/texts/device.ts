import { device as de } from './de/device.ts';
import { device as en } from './en/device.ts';
import { inLanguage } from './locale.svelte.ts';

export const deviceTexts = inLanguage({ en, de });
