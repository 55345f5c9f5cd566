/**
 * Trusted Types: the only script addresses this program ever loads by string are its own service worker and its own
 * workers. The default policy lets these through and refuses everything else.
 */
interface PolicyFactory {
  createPolicy(name: 'default', rules: { createScriptURL(url: string): string }): unknown;
}

const factory = (globalThis as { trustedTypes?: PolicyFactory }).trustedTypes;
factory?.createPolicy('default', {
  createScriptURL(address) {
    const url = new URL(address, location.href);
    // The development server serves workers from their sources.
    const built = import.meta.env.DEV || /(^|\/)(_app\/immutable\/|service-worker\.js$)/.test(url.pathname);
    const own = url.origin === location.origin && built;
    if (!own) throw new TypeError(`refused to load a script from ${url.href}`);
    return address;
  }
});
