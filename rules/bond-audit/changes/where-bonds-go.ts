import type { Audited } from '../audit.ts'
import { firstPanels, utilityReaches } from '../paths.ts'
import { change } from './change.ts'
import type { Change } from './change.ts'

/** Where a bond that is missing could be, other than in a source: the service disconnect, or a first disconnect. */
export const bondsMissing = (failing: readonly Audited[]): Change[] =>
  failing.flatMap(({ circuit, findings }) => {
    if (!findings.some(({ kind }) => kind === 'no-bond' || kind === 'wrong-place')) return []
    const { live, places } = circuit
    const utility = live.some((part) => part.kind === 'source' && part.type === 'utility')
    // Many isolated outputs allow no bond: another way is looked for first.
    const work = live.some((part) => part.kind === 'source' && part.output === 'isolated') ? 7 : 4
    const panels = utility
      ? places
      : firstPanels(circuit).filter(({ id }) => !utilityReaches(circuit.wiring, id))
    return panels.flatMap((part) => {
      if (part.kind !== 'panel' || part.bond || (utility && part.role !== 'main')) return []
      const bonded = { ...part, bond: true }
      return part.role === 'main'
        ? [change(part, 2, 'put the bond screw or strap in, at the service disconnect.', bonded, true)]
        : [change(part, work, 'one bond here, as the first disconnect.', bonded, true)]
    })
  })
