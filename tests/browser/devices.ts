/** What tests of life without a network ask of the device itself, past the pages. */
import type { Page } from 'playwright-core'

/** Whether the worker is active, has brought every file, and serves this page. */
const isServed = (page: Page): Promise<boolean> =>
  page.evaluate(async () => {
    const registration = await navigator.serviceWorker.getRegistration()
    return registration?.active?.state === 'activated' && navigator.serviceWorker.controller !== null
  })

/** How many files of editions lie in the device's own database once the edition in force is named there. */
const filesKept = (page: Page): Promise<number> =>
  page.evaluate(
    () =>
      new Promise<number>((resolve) => {
        const opening = indexedDB.open('tracelamp')
        // The page makes it, not this look at it.
        opening.onupgradeneeded = () => opening.transaction?.abort()
        opening.onerror = () => resolve(0)
        opening.onsuccess = () => {
          const db = opening.result
          const tx = db.transaction(['settings', 'files'])
          const named = tx.objectStore('settings').count('editionInForce')
          const files = tx.objectStore('files').count()
          tx.oncomplete = () => {
            db.close()
            resolve(named.result === 1 ? files.result : 0)
          }
        }
      }),
  )

async function untilTrue(page: Page, ask: () => Promise<boolean>, what: string): Promise<void> {
  for (let tries = 0; tries < 150; tries += 1) {
    if (await ask()) return
    await page.waitForTimeout(100)
  }
  throw new Error(`waited in vain until ${what}`)
}

/** Waits until the page is served by the worker. */
export const untilServed = (page: Page) => untilTrue(page, () => isServed(page), 'the worker serves')

/** Waits until the device has kept so many files of an edition. */
export const untilFilesKept = (page: Page, count: number) =>
  untilTrue(page, async () => (await filesKept(page)) >= count, `${count} files are kept`)

/** Whether a worker is registered, and the names of what workers have kept. */
export const workersTraces = (page: Page): Promise<{ registered: boolean; caches: string[] }> =>
  page.evaluate(async () => ({
    registered: (await navigator.serviceWorker.getRegistrations()).length > 0,
    caches: await caches.keys(),
  }))
