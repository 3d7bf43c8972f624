import { flush } from '../offline/flush.ts'
import { onSheetsChanged, sayChanged } from '../offline/sheets.ts'
import { noteLate } from '../offline/outbox.ts'
import { listUnsent } from '../offline/unsent.ts'
import { saySending } from '../offline/use-saving.ts'
import { post } from './post.ts'

/** A field that is being typed in is sent once it rests. */
const restMs = 1000
const againMs = 20_000

let going: Promise<void> | undefined

/** Sends what waits, now. One sending at a time; who calls meanwhile waits for it, and for another. */
export async function sendNow(): Promise<void> {
  while (going !== undefined) await going
  const work = async () => {
    try {
      await noteLate()
      if ((await listUnsent()).length === 0) return
      saySending(true)
      await flush(post)
    } catch {
      // A device that keeps nothing has nothing to send.
    } finally {
      saySending(false)
      going = undefined
      sayChanged()
    }
  }
  going = work()
  await going
}

const waiting = async (): Promise<string> => JSON.stringify(await listUnsent().catch(() => []))

/** Sends what waits whenever something was written, the network came back, or the page is looked at again. */
export function keepSending(): void {
  let timer: ReturnType<typeof setTimeout> | undefined
  /** What was left waiting the last time: that alone is no reason to send again at once. */
  let left = ''
  const soon = (ms: number) => {
    clearTimeout(timer)
    timer = setTimeout(() => void go(), ms)
  }
  const go = async () => {
    await sendNow()
    left = await waiting()
    if (left !== '[]') soon(againMs)
  }
  const look = async () => {
    const now = await waiting()
    if (now !== '[]' && now !== left && going === undefined) soon(restMs)
  }
  onSheetsChanged(() => void look())
  window.addEventListener('online', () => soon(0))
  document.addEventListener('visibilitychange', () => {
    if (document.visibilityState === 'visible') soon(0)
  })
  soon(0)
}
