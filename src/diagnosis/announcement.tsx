import { useEffect, useState } from 'react'
import type { Diagnosis } from '../../rules/ranking/diagnosis-types.ts'
import { useDesk } from './desk.ts'
import { findingLabel, inSentence, percent, rowLabel } from './words.ts'

const afterLastKeyMs = 1000

/** Says once, after the last key, what stands first now: for whoever can't see the list move. */
export function Announcement({ diagnosis }: { diagnosis: Diagnosis }) {
  const { edition } = useDesk()
  const [said, setSaid] = useState('')
  const [first] = diagnosis.rows
  const words =
    diagnosis.misfit !== undefined
      ? diagnosis.stops.length > 0
        ? 'No single cause fits.'
        : `No single cause fits. Take again: ${findingLabel(edition, diagnosis.misfit.again)}`
      : first === undefined
        ? ''
        : `First now: ${inSentence(rowLabel(edition, first))}, ${percent(first.share)} percent`
  useEffect(() => {
    const timer = setTimeout(() => setSaid(words), afterLastKeyMs)
    return () => clearTimeout(timer)
  }, [words])
  return (
    <p className="sr-only" role="status">
      {said}
    </p>
  )
}
