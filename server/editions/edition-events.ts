import type { RequestHandler, Response } from 'express'
import type { EditionFeed } from './edition-feed.ts'
import type { EditionAnnounced } from './editions.contract.ts'

const heartbeatMs = 25_000

/**
 * GET /api/edition/events, server-sent events: the edition in force when the page connects, then each new one.
 * `close` ends every open stream, so that the server can stop.
 */
export function editionEvents(feed: EditionFeed): { route: RequestHandler; close: () => void } {
  const open = new Set<Response>()
  const write = (res: Response, edition: EditionAnnounced) =>
    res.write(`event: edition\nid: ${edition.number}\ndata: ${JSON.stringify(edition)}\n\n`)

  const route: RequestHandler = (req, res) => {
    res.writeHead(200, {
      'Content-Type': 'text/event-stream; charset=utf-8',
      'Cache-Control': 'no-store, no-transform',
      'X-Accel-Buffering': 'no',
    })
    res.write('retry: 3000\n\n')
    if (feed.current !== undefined) write(res, feed.current)
    const unsubscribe = feed.subscribe((edition) => write(res, edition))
    // Keeps proxies from closing a silent stream, and finds connections whose other end is gone.
    const heartbeat = setInterval(() => res.write(': still here\n\n'), heartbeatMs)
    open.add(res)
    req.on('close', () => {
      unsubscribe()
      clearInterval(heartbeat)
      open.delete(res)
    })
  }
  return { route, close: () => open.forEach((res) => res.end()) }
}
