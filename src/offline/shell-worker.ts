/**
 * The service worker. It keeps the built pages, all of them, so that every one opens with the server out of reach;
 * what people typed and what the shop knows lie in IndexedDB and are none of its business. `/api` goes past it.
 *
 * A new one waits while the old one's pages are open, until a page says to take over (`worker.ts`).
 */
import { clientsClaim } from 'workbox-core'
import { createHandlerBoundToURL, precacheAndRoute } from 'workbox-precaching'
import { NavigationRoute, registerRoute } from 'workbox-routing'
import { takeOver } from './worker-words.ts'

/** The built files, put here by `server/setup/worker.mjs`. A revision of null: the name holds the hash. */
declare const builtFiles: { url: string; revision: string | null }[]
const worker = self as unknown as { skipWaiting: () => Promise<void> }

precacheAndRoute(builtFiles)
registerRoute(new NavigationRoute(createHandlerBoundToURL('/index.html'), { denylist: [/^\/api\//] }))
// The page that brought it is served by it from then on, not only from the next visit.
clientsClaim()

self.addEventListener('message', (event) => {
  if (event.data === takeOver) void worker.skipWaiting()
})
