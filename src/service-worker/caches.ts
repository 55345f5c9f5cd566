const prefix = 'evenload-';

/** Address of the page that answers every navigation. */
export const shellPath = (base: string): string => `${base}/`;

/** Caches of our name only, oldest first: other programs may share the origin. */
export async function ownCaches(): Promise<string[]> {
  return (await caches.keys()).filter((name) => name.startsWith(prefix));
}

/**
 * Stores every asset or none: a cache with a hole is deleted and the install fails, so that the version before keeps
 * serving.
 */
export async function storeAll(name: string, assets: readonly string[]): Promise<void> {
  try {
    const cache = await caches.open(name);
    await cache.addAll(assets.map((path) => new Request(path, { cache: 'reload' })));
  } catch (cause) {
    await caches.delete(name);
    throw cause;
  }
}
