import { useQueryClient } from '@tanstack/react-query'
import { useCallback, useEffect, useState } from 'react'
import { keepAgain } from '../editions/edition.api.ts'
import { getSetting, setSetting } from '../offline/settings.ts'

export type Stated = { statedAt: string }
/** Pending while the device is asked; null when nobody stated it here. */
export type Qualified = Stated | null | 'pending'

/** Whether this device's person stated to be qualified, and the two ways to change it. */
export function useQualified(): { qualified: Qualified; state: () => void; withdraw: () => void } {
  const [qualified, setQualified] = useState<Qualified>('pending')
  useEffect(() => {
    let wanted = true
    getSetting('qualified').then(
      (stated) => wanted && setQualified(stated ?? null),
      () => wanted && setQualified(null),
    )
    return () => {
      wanted = false
    }
  }, [])
  const client = useQueryClient()
  const set = useCallback(
    (stated: Stated | null) => {
      // Where the device keeps nothing the statement holds for this visit alone. Else it now keeps what is for
      // qualified people too, before the network goes.
      void setSetting('qualified', stated ?? undefined)
        .then(() => keepAgain(client))
        .catch(() => undefined)
      setQualified(stated)
    },
    [client],
  )
  return {
    qualified,
    state: () => set({ statedAt: new Date().toISOString() }),
    withdraw: () => set(null),
  }
}
