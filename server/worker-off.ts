import type { RequestHandler } from 'express'

/**
 * What devices get in place of the worker: it takes over at once, gives back the pages that the one before it kept,
 * and leaves. The device's own database, with the sheets in it, is left alone. No page is loaded anew: that is for
 * whoever sits before it. Its last message is heard by `src/offline/worker.ts`.
 */
const script = `
self.addEventListener('install', () => self.skipWaiting())
self.addEventListener('activate', (event) => event.waitUntil(leave()))
async function leave() {
  for (const name of await caches.keys()) await caches.delete(name)
  await self.registration.unregister()
  const pages = await self.clients.matchAll({ type: 'window', includeUncontrolled: true })
  for (const page of pages) page.postMessage('the worker left')
}
`

/** The switch against a bad worker: every browser asks for this address again before it opens a page. */
export const workerOff: RequestHandler = (req, res, next) => {
  if (req.path !== '/sw.js') return next()
  res.set('Cache-Control', 'no-cache').type('text/javascript').send(script)
}
