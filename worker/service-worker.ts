import { Serwist, type PrecacheEntry, type SerwistGlobalConfig } from 'serwist';
import { decide } from './strategy';

declare global {
  interface WorkerGlobalScope extends SerwistGlobalConfig {
    __SW_MANIFEST: (PrecacheEntry | string)[] | undefined;
  }
}
declare const self: ServiceWorkerGlobalScope;

const BENCH = '/bench';
const OFFLINE = '/offline';

const serwist = new Serwist({
  precacheEntries: self.__SW_MANIFEST,
  // A new version waits until the person says so: chunks of two versions never meet on one page.
  skipWaiting: false,
  clientsClaim: true,
  navigationPreload: false,
  precacheOptions: { cleanupOutdatedCaches: true, ignoreURLParametersMatching: [/^(?!_rsc$)/] },
  runtimeCaching: [],
});

self.addEventListener('install', (event) => serwist.handleInstall(event));
self.addEventListener('activate', (event) => serwist.handleActivate(event));

self.addEventListener('fetch', (event) => {
  const { request } = event;
  const url = new URL(request.url);
  switch (decide({ method: request.method, mode: request.mode, url, origin: self.location.origin })) {
    case 'network':
      return;
    case 'bench':
      return event.respondWith(fromPrecache(BENCH, request));
    case 'page':
      return event.respondWith(fetch(request).catch(() => fromPrecache(OFFLINE, request)));
    case 'precache':
      return event.respondWith(fromPrecache(url.pathname, request));
  }
});

async function fromPrecache(path: string, request: Request): Promise<Response> {
  const kept = await serwist.matchPrecache(path);
  if (!kept) return fetch(request);
  // A worker takes its address from the answer; one made here has none of its own, so that the address asked for stays,
  // with the fragment in which the framework says what to load.
  return request.destination === 'worker' ? new Response(kept.body, kept) : kept;
}

self.addEventListener('message', (event) => {
  if ((event.data as { type?: string } | null)?.type === 'take-over') void self.skipWaiting();
});

self.addEventListener('notificationclick', (event) => {
  event.notification.close();
  const address = (event.notification.data as { address?: string } | undefined)?.address ?? BENCH;
  event.waitUntil(openBench(new URL(address, self.location.origin)));
});

async function openBench(address: URL): Promise<void> {
  const open = await self.clients.matchAll({ type: 'window', includeUncontrolled: true });
  const bench = open.find((client) => new URL(client.url).pathname.startsWith(BENCH));
  if (!bench) await self.clients.openWindow(address.href);
  else await (await bench.focus()).navigate(address.href);
}
