/// <reference types="@sveltejs/kit" />
import { base, build, files, version } from '$service-worker';
import { ownCaches, shellPath, storeAll } from './caches.ts';

declare const self: ServiceWorkerGlobalScope;

const current = `evenload-${version}`;
const shell = shellPath(base);
// The adapter's fallback page is in none of Kit's lists: it is added by hand and answers every navigation.
const assets = [shell, ...build, ...files];

self.addEventListener('install', (event) => {
  event.waitUntil(storeAll(current, assets));
});

self.addEventListener('activate', (event) => {
  event.waitUntil(
    (async () => {
      // The version before stays for tabs that have not reloaded yet and still ask for its pieces.
      const own = await ownCaches();
      const before = own.filter((name) => name !== current).slice(0, -1);
      await Promise.all(before.map((name) => caches.delete(name)));
      await self.clients.claim();
    })()
  );
});

self.addEventListener('message', (event) => {
  const message = event.data as { type?: string } | null;
  if (message?.type === 'version') event.ports[0]?.postMessage({ version });
  // Only a person's tap sends this.
  if (message?.type === 'SKIP_WAITING') void self.skipWaiting();
});

self.addEventListener('fetch', (event) => {
  const { request } = event;
  const url = new URL(request.url);
  if (request.method !== 'GET' || url.origin !== self.location.origin) return;
  event.respondWith(answer(request, url));
});

async function answer(request: Request, url: URL): Promise<Response> {
  const cache = await caches.open(current);
  const stored = await cache.match(request.mode === 'navigate' ? shell : url.pathname);
  if (stored) return stored;
  for (const name of (await ownCaches()).reverse()) {
    const older = await (await caches.open(name)).match(url.pathname);
    if (older) return older;
  }
  return fetch(request);
}
