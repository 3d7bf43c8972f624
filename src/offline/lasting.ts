import { useEffect, useState } from 'react'

export type Lasting = {
  /** Whether the browser agreed to clear nothing here by itself. */
  agreed: boolean
  /** Bytes, as the browser estimates them; undefined where it gives no figure. */
  used: number | undefined
  free: number | undefined
}

// Like the worker's, this part of the browser is missing on plain HTTP.
const storage = (): StorageManager | undefined => ('storage' in navigator ? navigator.storage : undefined)

/** Asks the browser not to clear this device's sheets when it runs full. Some ask the person in turn. */
export async function askToLast(): Promise<void> {
  const here = storage()
  if (here !== undefined && !(await here.persisted())) await here.persist()
}

async function look(): Promise<Lasting> {
  const here = storage()
  const [agreed, estimate] = await Promise.all([here?.persisted(), here?.estimate()])
  const { usage, quota } = estimate ?? {}
  return {
    agreed: agreed === true,
    used: usage,
    free: usage === undefined || quota === undefined ? undefined : quota - usage,
  }
}

/** How long what lies on this device lasts; undefined until the browser said. */
export function useLasting(): Lasting | undefined {
  const [lasting, setLasting] = useState<Lasting>()
  useEffect(() => {
    let wanted = true
    look().then(
      (seen) => wanted && setLasting(seen),
      () => undefined,
    )
    return () => {
      wanted = false
    }
  }, [])
  return lasting
}
