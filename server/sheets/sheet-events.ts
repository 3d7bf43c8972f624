import type { Response } from 'express'
import type { SheetFeed } from './sheet-feed.ts'

const heartbeatMs = 25_000

/**
 * Server-sent events of one sheet: `changed` once the page is connected and whenever something is new, upon which it
 * asks for the sheet; `ended` when it may not be read any more. `close` ends every open stream.
 */
export function sheetEvents(feed: SheetFeed) {
  const open = new Set<Response>()
  /** @param mayRead looks anew at each change: a link may have been taken back */
  const follow = (res: Response, sheetId: string, mayRead: () => Promise<boolean>): void => {
    res.writeHead(200, {
      'Content-Type': 'text/event-stream; charset=utf-8',
      'Cache-Control': 'no-store, no-transform',
      'X-Accel-Buffering': 'no',
    })
    res.write('retry: 3000\n\n')
    const tell = async () => {
      const may = await mayRead().catch(() => true)
      if (res.writableEnded) return
      res.write(`event: ${may ? 'changed' : 'ended'}\ndata: {}\n\n`)
      if (!may) res.end()
    }
    void tell()
    const unsubscribe = feed.subscribe(sheetId, () => void tell())
    const heartbeat = setInterval(() => res.write(': still here\n\n'), heartbeatMs)
    open.add(res)
    res.on('close', () => {
      unsubscribe()
      clearInterval(heartbeat)
      open.delete(res)
    })
  }
  return { follow, close: () => open.forEach((res) => res.end()) }
}

export type SheetEvents = ReturnType<typeof sheetEvents>
