const retryMs = 30_000

/**
 * Calls back whenever the server may have put another edition in force: when it says so, and after each time the
 * line was down, since what was said meanwhile is lost. Listens only while the page is visible: a browser grants a
 * server six connections, and forgotten tabs would hold them all.
 * @returns the way to stop it
 */
export function listenForEditions(changed: () => void): () => void {
  let line: EventSource | undefined
  let again: ReturnType<typeof setTimeout> | undefined
  let wasDown = false
  const close = () => {
    clearTimeout(again)
    line?.close()
    line = undefined
  }
  const open = () => {
    close()
    line = new EventSource('/api/edition/events')
    line.addEventListener('edition', changed)
    line.addEventListener('open', () => {
      if (wasDown) changed()
      wasDown = false
    })
    line.addEventListener('error', () => {
      wasDown = true
      // The browser tries again by itself after silence, but not after a refusal.
      if (line?.readyState === EventSource.CLOSED) again = setTimeout(open, retryMs)
    })
  }
  const look = () => {
    if (document.visibilityState === 'visible') open()
    else {
      wasDown = true
      close()
    }
  }
  look()
  document.addEventListener('visibilitychange', look)
  window.addEventListener('online', look)
  return () => {
    document.removeEventListener('visibilitychange', look)
    window.removeEventListener('online', look)
    close()
  }
}
