import { useEffect, useState } from 'react'
import { storage } from './ask-to-last.ts'

export type Lasting = {
  /** Whether the browser agreed to clear nothing here by itself. */
  agreed: boolean
  /** Bytes, as the browser estimates them; undefined where it gives no figure. */
  used: number | undefined
  free: number | undefined
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
