import { locale } from '../texts/locale.svelte.ts';
import { numberLocale, numberWriter, type NumberWriter } from './number-writer.ts';

// Not state: a writer never changes once made.
const made: Record<string, NumberWriter> = {};

/** Number writer of the screen's language and the person's locale; reactive when read in a component. */
export function writer(): NumberWriter {
  const preferred = typeof navigator === 'undefined' ? [] : navigator.languages;
  const tag = numberLocale(locale.current, preferred);
  return (made[tag] ??= numberWriter(tag));
}
