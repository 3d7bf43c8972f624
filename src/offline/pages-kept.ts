import { useSyncExternalStore } from 'react'

/** Browsers have workers on HTTPS and on the machine itself alone; under hot reload there is none either. */
let possible = 'serviceWorker' in navigator
const listeners = new Set<() => void>()

/** Says that this device can't keep the pages after all. */
export function pagesAreNotKept(): void {
  possible = false
  for (const listener of listeners) listener()
}

function listen(changed: () => void): () => void {
  listeners.add(changed)
  return () => listeners.delete(changed)
}

/** Whether this device can keep the pages, so that they open with no network. What was typed is kept either way. */
export const usePagesKept = (): boolean => useSyncExternalStore(listen, () => possible)
