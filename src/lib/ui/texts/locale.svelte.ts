/** The language of the screen. English is complete by definition; another language must satisfy its type. */
export type Locale = 'en' | 'de';

let current = $state<Locale>('en');
const wanted: (() => void)[] = [];

export const locale = {
  get current(): Locale {
    return current;
  },
  set(next: Locale): void {
    current = next;
    if (typeof document !== 'undefined') document.documentElement.lang = next;
    if (next !== 'en') for (const load of wanted.splice(0)) load();
  }
};

/**
 * Texts of one area in the current language; reactive when read in a component. Another language than English may be
 * loaded when it is asked for: until it is there, English shows.
 */
export function inLanguage<T>({ en, de }: { en: T; de: T | (() => Promise<T>) }): () => T {
  if (!(de instanceof Function)) return () => (current === 'en' ? en : de);
  let loaded = $state.raw<T | null>(null);
  const load = () =>
    void de().then(
      (texts) => (loaded = texts),
      // Not to be had on a first visit without network: English stays.
      () => undefined
    );
  if (current === 'en') wanted.push(load);
  else load();
  return () => (current === 'en' ? en : (loaded ?? en));
}
