import { useEffect, useMemo, useRef, useState } from 'react'
import type { Edition } from '../../rules/edition/open.ts'
import type { FieldErrors } from '../../rules/findings/parse.ts'
import { readWhatCanBe } from '../../rules/findings/read-what-can-be.ts'
import { bondGate } from '../../rules/ranking/bond-gate.ts'
import { stopsOf } from '../../rules/ranking/stop.ts'
import type { Bond, Diagnosis, Stop } from '../../rules/ranking/diagnosis-types.ts'
import { diagnose } from '../../rules/ranking/diagnose.ts'
import { rawSheetOf } from './raw-sheet.ts'
import type { SheetContent } from './sheet-content.ts'

export type Live = {
  /** Of the findings in view, or of those before while these are ranked; undefined before the first. */
  diagnosis: Diagnosis | undefined
  /** The one before the last finding was begun, to say what that moved. */
  before: Diagnosis | undefined
  /** What stops, at once: it waits for no ranking, and stands even if that fails. */
  stops: readonly Stop[]
  /** Installing a bond, at once too: what a new finding holds back must not stand released while it is ranked. */
  bond: Bond | undefined
  errors: FieldErrors
  /** Ranking itself failed. */
  failed: boolean
}

const gatherMs = 60 // one ranking for keys that come in a burst

/**
 * The diagnosis of a sheet, computed anew on every change. An answer that comes after newer findings is dropped.
 */
export function useDiagnosis(edition: Edition, content: SheetContent): Live {
  const raw = rawSheetOf(edition, content)
  // NaN, where the meter's ohms are not typed in full, would be null in JSON: either way the key differs.
  const key = JSON.stringify(raw)
  const readable = useMemo(() => readWhatCanBe(edition, raw), [edition, key])
  const { stops, bond } = useMemo(() => {
    const { sheet } = readable
    return sheet === undefined
      ? { stops: [], bond: undefined }
      : { stops: stopsOf(edition, sheet), bond: bondGate(edition, sheet) }
  }, [edition, readable])
  const [live, setLive] = useState<Omit<Live, 'errors' | 'stops' | 'bond'>>({
    diagnosis: undefined,
    before: undefined,
    failed: false,
  })
  const first = useRef(true)
  const since = useRef<{ step: number; diagnosis: Diagnosis | undefined }>({ step: -1, diagnosis: undefined })
  const step = content.past.length
  useEffect(() => {
    let newest = true
    const { sheet } = readable
    if (sheet === undefined) return setLive({ diagnosis: undefined, before: undefined, failed: true })
    const rank = () =>
      void diagnose(edition, sheet).then(
        (diagnosis) => {
          if (!newest) return
          setLive((last) => {
            // Keys of one number are one step: what moved is told against the ranking before its first.
            if (since.current.step !== step) since.current = { step, diagnosis: last.diagnosis }
            return { diagnosis, before: since.current.diagnosis, failed: false }
          })
        },
        () => {
          // An older answer must not stand beside newer findings.
          if (newest) setLive({ diagnosis: undefined, before: undefined, failed: true })
        },
      )
    const timer = setTimeout(rank, first.current ? 0 : gatherMs)
    first.current = false
    return () => {
      newest = false
      clearTimeout(timer)
    }
  }, [edition, readable])
  return { ...live, stops, bond, errors: readable.errors }
}
