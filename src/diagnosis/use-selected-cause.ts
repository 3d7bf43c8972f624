import { useMemo, useState } from 'react'
import type { Diagnosis } from '../../rules/ranking/diagnosis-types.ts'
import type { SelectedCause } from './expected.ts'

/**
 * The leader, as soon as a finding speaks for one and while one cause fits; or whichever the tech chose, until they
 * go back to the leader.
 */
export function useSelectedCause(diagnosis: Diagnosis | undefined): SelectedCause {
  const [chosen, setChosen] = useState<string>()
  const first = diagnosis?.misfit === undefined ? diagnosis?.rows[0]?.causes[0] : undefined
  const leader = first !== undefined && first.evidence.length > 0 ? first.cause : undefined
  const cause = chosen ?? leader
  return useMemo(() => ({ cause, chosen: chosen !== undefined, select: setChosen }), [cause, chosen])
}
