/** The language of the screen. English is complete by definition; another language must satisfy its type. */
export type Locale = 'en' | 'de';

let current = $state<Locale>('en');

export const locale = {
  get current(): Locale {
    return current;
  },
  set(next: Locale): void {
    current = next;
    if (typeof document !== 'undefined') document.documentElement.lang = next;
  }
};

/** Texts of one area in the current language; reactive when read in a component. */
export function inLanguage<T>(languages: { en: T; de: T }): () => T {
  return () => languages[current];
}
