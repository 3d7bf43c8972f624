import { useCallback, useEffect, useRef, useState } from 'react'
import { useSearchParams } from 'react-router-dom'
import { readSystem, writeSystem } from '../../rules/bond-audit/address.ts'
import type { System } from '../../rules/bond-audit/system.ts'
import { getSetting, setSetting } from '../offline/settings.ts'

const blank: System = { name: '', units: 'us', parts: [] }
const addressWaitsMs = 250

export type AuditSystem = {
  /** Undefined until the device was looked at. */
  system: System | undefined
  /** The address held a system that can't be read; what the device kept is shown. */
  damaged: boolean
  /** The device keeps nothing: only the address does. */
  keepsNothing: boolean
  change: (next: System) => void
}

/** The system on the page: out of the address, else the one this device kept, else a blank one. Kept in both. */
export function useAuditSystem(): AuditSystem {
  const [params, setParams] = useSearchParams()
  const words = params.get('system')
  const [system, setSystem] = useState(() => (words === null ? undefined : readSystem(words)))
  const [keepsNothing, setKeepsNothing] = useState(false)
  const [damaged] = useState(words !== null && system === undefined)
  /** What this page itself wrote into the address, to tell it from another system that was opened there. */
  const written = useRef(words)

  useEffect(() => {
    if (system !== undefined) return
    let wanted = true
    getSetting('bondAudit')
      .then((kept) => (kept === undefined ? blank : (readSystem(kept) ?? blank)))
      .catch(() => {
        if (wanted) setKeepsNothing(true)
        return blank
      })
      .then((kept) => {
        if (wanted) setSystem((now) => now ?? kept)
      })
      .catch(() => undefined)
    return () => {
      wanted = false
    }
  }, [system])

  // Back, or a link to another system while this page stands.
  useEffect(() => {
    if (words === written.current) return
    written.current = words
    const other = words === null ? undefined : readSystem(words)
    if (other !== undefined) setSystem(other)
  }, [words])

  const timer = useRef<ReturnType<typeof setTimeout>>(undefined)
  useEffect(() => () => clearTimeout(timer.current), [])

  const change = useCallback(
    (next: System) => {
      setSystem(next)
      const own = writeSystem(next)
      setSetting('bondAudit', own).then(
        () => setKeepsNothing(false),
        () => setKeepsNothing(true),
      )
      clearTimeout(timer.current)
      // Browsers bar a page that writes its address with every letter typed.
      timer.current = setTimeout(() => {
        written.current = own
        setParams({ system: own }, { replace: true, preventScrollReset: true })
      }, addressWaitsMs)
    },
    [setParams],
  )
  return { system, damaged, keepsNothing, change }
}
