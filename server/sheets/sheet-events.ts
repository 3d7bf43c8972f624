import type { Response } from 'express'
import type { SheetFeed } from './sheet-feed.ts'

const heartbeatMs = 25_000

type Followed = {
  sheet: string
  /** Who is signed in: when their session ends, so does the stream. */
  person: string | undefined
  /** Looks anew each time: a link may have been taken back, a session have ended. */
  mayRead: () => Promise<boolean>
}

/**
 * Server-sent events of one sheet: `changed` once the page is connected and whenever something is new, upon which it
 * asks for the sheet; `ended` when it may not be read any more. `close` ends every open stream, and each that is opened
 * after that.
 */
export function sheetEvents(feed: SheetFeed) {
  const open = new Set<Response>()
  let closed = false
  const follow = (res: Response, { sheet, person, mayRead }: Followed): void => {
    res.writeHead(200, {
      'Content-Type': 'text/event-stream; charset=utf-8',
      'Cache-Control': 'no-store, no-transform',
      'X-Accel-Buffering': 'no',
    })
    if (closed) return void res.end()
    res.write('retry: 3000\n\n')
    const say = (event: string) => res.write(`event: ${event}\ndata: {}\n\n`)
    /** A database that is just away ends nothing. */
    const look = async (then: () => void) => {
      const may = await mayRead().catch(() => true)
      if (res.writableEnded || res.destroyed) return
      if (may) return then()
      say('ended')
      res.end()
    }
    const tell = () => void look(() => say('changed'))
    const stillHere = () => void look(() => res.write(': still here\n\n'))
    const unsubscribe = [feed.subscribe(sheet, tell)]
    if (person !== undefined) unsubscribe.push(feed.subscribe(person, stillHere))
    const heartbeat = setInterval(stillHere, heartbeatMs)
    open.add(res)
    tell()
    res.on('close', () => {
      for (const end of unsubscribe) end()
      clearInterval(heartbeat)
      open.delete(res)
    })
  }
  const close = () => {
    closed = true
    for (const res of open) res.end()
  }
  return { follow, close }
}

export type SheetEvents = ReturnType<typeof sheetEvents>
