import { SheetOpened } from '../../server/sheets/sheets.contract.ts'
import { ApiProblem, get } from '../api.ts'

const againMs = 5000

/** Whether the server says that there is nothing to read here any more. */
const isGone = (problem: unknown): boolean =>
  problem instanceof ApiProblem && [401, 403, 404].includes(problem.status)

/**
 * Calls back whenever there is news of a sheet, and once the line stands, since something may have come while it did
 * not; listens only while the page is visible. The browser takes a lost line up again by itself, but not after a
 * refusal (a server that is only just starting): then this does.
 * @param path what follows `/api`, for example `/shared/<token>`
 * @param ended called once, when the sheet may not be read any more
 * @returns the way to stop it
 */
export function followSheet(path: string, news: () => void, ended: () => void): () => void {
  let line: EventSource | undefined
  let timer: ReturnType<typeof setTimeout> | undefined
  let over = false
  const close = () => {
    clearTimeout(timer)
    line?.close()
    line = undefined
  }
  const end = () => {
    over = true
    close()
    ended()
  }
  const open = () => {
    close()
    if (over) return
    const mine = (line = new EventSource(`/api${path}/events`))
    mine.addEventListener('changed', news)
    mine.addEventListener('ended', ask)
    mine.addEventListener('error', () => mine.readyState === EventSource.CLOSED && mine === line && ask())
  }
  /** The line says only that it is over, not why: the sheet itself does. */
  const ask = () => {
    close()
    get(path, SheetOpened).then(
      () => !over && later(),
      (problem: unknown) => !over && (isGone(problem) ? end() : later()),
    )
  }
  const later = () => {
    clearTimeout(timer)
    timer = setTimeout(look, againMs)
  }
  const look = () => (document.visibilityState === 'visible' ? open() : close())
  look()
  document.addEventListener('visibilitychange', look)
  window.addEventListener('online', look)
  return () => {
    over = true
    document.removeEventListener('visibilitychange', look)
    window.removeEventListener('online', look)
    close()
  }
}
