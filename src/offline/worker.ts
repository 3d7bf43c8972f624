/** The page's side of the service worker: brings it, and says when a newer one waits. Loaded late, as its own part. */
import { useSyncExternalStore } from 'react'
import { pagesAreNotKept } from './pages-kept.ts'
import { whenNoSheetIsOpen } from './sheet-lock.ts'
import { takeOver, workerLeft } from './worker-words.ts'

const lookEveryMs = 60 * 60_000
const tryEveryMs = 60_000

let waiting: ServiceWorker | undefined
/** This tab loads itself anew once the newer worker has taken over. */
let following = false
const listeners = new Set<() => void>()

function listen(changed: () => void): () => void {
  listeners.add(changed)
  return () => listeners.delete(changed)
}

/** Whether newer pages lie on this device, not in use yet. */
export const useNewerPages = (): boolean => useSyncExternalStore(listen, () => waiting !== undefined)

/** Moves to the newer pages: on the person's word, or when nobody would notice. What was typed lies on the disk. */
export function loadNewerPages(): void {
  following = true
  if (waiting === undefined) window.location.reload()
  else waiting.postMessage(takeOver)
}

/** Nobody looks at this tab, and nowhere is a sheet open. */
function takeOverUnnoticed(): void {
  if (waiting !== undefined && document.visibilityState === 'hidden')
    void whenNoSheetIsOpen(loadNewerPages).catch(() => undefined)
}

function follow(registration: ServiceWorkerRegistration): void {
  const look = () => {
    // The first worker waits for nobody.
    waiting = registration.active === null ? undefined : (registration.waiting ?? undefined)
    for (const listener of listeners) listener()
    takeOverUnnoticed()
  }
  registration.addEventListener('updatefound', () =>
    registration.installing?.addEventListener('statechange', look),
  )
  look()
  const ask = () => void registration.update().catch(() => undefined)
  setInterval(ask, lookEveryMs)
  // The last sheet may be closed in another tab, of which this one hears nothing.
  setInterval(takeOverUnnoticed, tryEveryMs)
  document.addEventListener('visibilitychange', () => {
    if (document.visibilityState === 'visible') ask()
    else takeOverUnnoticed()
  })
}

/** Brings the worker, which then brings every page. Once a tab is enough. */
export async function startWorker(): Promise<void> {
  if (!('serviceWorker' in navigator)) return
  const { serviceWorker } = navigator
  serviceWorker.addEventListener('message', (event) => {
    if (event.data === workerLeft) pagesAreNotKept()
  })
  serviceWorker.addEventListener('controllerchange', () => {
    if (following) window.location.reload()
  })
  try {
    follow(await serviceWorker.register('/sw.js', { updateViaCache: 'none' }))
  } catch {
    // No network just now, then the worker of an earlier visit serves; or the browser forbids it here.
    if (serviceWorker.controller === null) pagesAreNotKept()
  }
}
