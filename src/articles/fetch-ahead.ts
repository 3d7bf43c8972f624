import { useEffect } from 'react'

const whenIdle = (run: () => void) =>
  'requestIdleCallback' in window ? window.requestIdleCallback(run) : setTimeout(run, 1500)

/** Brings the parts of pages that a reader may open next, so that links work when the network goes. */
export function useFetchAhead(bring: () => Promise<unknown>): void {
  useEffect(() => {
    whenIdle(() => void bring().catch(() => undefined))
  }, [bring])
}
