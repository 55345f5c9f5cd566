/** Resolves when the browser has nothing better to do; `most` milliseconds from now at the latest. */
export const idle = (most = 2_000): Promise<void> =>
  new Promise((resolve) => {
    if ('requestIdleCallback' in globalThis) requestIdleCallback(() => resolve(), { timeout: most });
    else setTimeout(resolve, 50);
  });
