import { useEffect, useMemo, useState } from 'react'
import type { Expected } from './expected.ts'
import type { Bands } from './expected-bands.ts'
import type { SheetContent } from './sheet-content.ts'

const whenIdle = (run: () => void): (() => void) => {
  if ('requestIdleCallback' in window) {
    const handle = window.requestIdleCallback(run, { timeout: 1500 })
    return () => window.cancelIdleCallback(handle)
  }
  const timer = setTimeout(run, 200)
  return () => clearTimeout(timer)
}

/** Every meter of the sheet, ohms: its own, and those of single readings. */
function metersOf({ entries, whatIf }: SheetContent, sheetMeter: number): number[] {
  const own = Object.values(whatIf ?? entries).flatMap((here) =>
    Object.values(here).flatMap((entry) =>
      entry.kind === 'reading' && entry.meterOhms ? [entry.meterOhms] : [],
    ),
  )
  return [...new Set([sheetMeter, ...own])].sort((a, b) => a - b)
}

/**
 * What a cause lets one expect on this sheet. Computed when the browser has nothing else to do, in a part of the page
 * that is fetched for it; until then, and where the model can't say, there is no band.
 */
export function useExpected(
  content: SheetContent,
  sheetMeter: number,
  cause: string | undefined,
): Expected | undefined {
  const { source, system, wiring } = content.context
  const meters = metersOf(content, sheetMeter).join(' ')
  const key = `${source} ${system} ${wiring} ${meters} ${cause ?? ''}`
  const [computed, setComputed] = useState<{ key: string; bands: Bands | undefined }>()
  useEffect(() => {
    if (cause === undefined) return
    let wanted = true
    const stop = whenIdle(
      () =>
        void import('./expected-bands.ts').then(
          ({ bandsOf }) => {
            if (!wanted) return
            const ohms = meters.split(' ').map(Number)
            setComputed({ key, bands: bandsOf({ source, system, wiring }, cause, ohms) })
          },
          // Without the network on a device that keeps no pages: readings are typed all the same.
          () => undefined,
        ),
    )
    return () => {
      wanted = false
      stop()
    }
  }, [key, source, system, wiring, meters, cause])
  const bands = computed?.key === key ? computed.bands : undefined
  return useMemo(
    () => (cause === undefined || bands === undefined ? undefined : { cause, bandOf: bands }),
    [cause, bands],
  )
}
