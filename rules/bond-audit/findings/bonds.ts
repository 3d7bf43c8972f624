/** Too few bonds, too many, or the one in the wrong place. */
import type { Circuit } from '../circuit.ts'
import type { Count } from '../count.ts'
import type { Exception } from '../exceptions.ts'
import type { Finding } from '../findings.ts'
import { firstPanels } from '../paths.ts'
import { bondWords, howMany, listed } from '../phrases.ts'
import type { SectionId } from '../standards.ts'
import type { Bond } from '../wiring.ts'
import { takeOut, whereItBelongs } from './bond-changes.ts'

const isMetric = ({ live }: Circuit) => live.some(({ volts }) => volts === '230')
const isMain = ({ part }: Bond) => part.kind === 'panel' && part.role === 'main'

/**
 * How rightly a bond is where it is, 0 the best: the service's, the live source's own, in its first panel, elsewhere.
 */
function rankOf(circuit: Circuit, bond: Bond): number {
  const { live, carrying } = circuit
  if (isMain(bond)) return 0
  if (live.some(({ id }) => id === bond.part.id)) return 1
  if (bond.how === 'autotransformer' && carrying.some(({ to }) => to.id === bond.part.id)) return 1
  const onUtility = live.some((part) => part.kind === 'source' && part.type === 'utility')
  return !onUtility && firstPanels(circuit).some(({ id }) => id === bond.part.id) ? 2 : 3
}

const tooMany = (circuit: Circuit, counted: readonly Bond[]): Finding => {
  const [kept, ...extra] = counted
    .map((bond) => ({ bond, rank: rankOf(circuit, bond) }))
    .sort((a, b) => a.rank - b.rank || (a.bond.part.id < b.bond.part.id ? -1 : 1))
    .map(({ bond }) => bond)
  const service = kept !== undefined && isMain(kept)
  const nec: SectionId[] = service ? ['nec-250.24', 'nec-250.142', 'nec-250.6'] : ['nec-250.30', 'nec-250.6']
  const derived = extra.some(({ how }) => how === 'source' || how === 'relay')
  return {
    kind: 'two-bonds',
    parts: extra.map(({ part }) => part.id),
    says: `${howMany(counted.length)} bonds: ${listed(counted.map(bondWords))}.`,
    danger:
      'Neutral current comes back over ground wires and metal in proportion, all the time. A neutral that opens then sends all of it that way, and metal rises.',
    change: extra.flatMap((bond) => takeOut(circuit, bond)),
    sections: isMetric(circuit)
      ? ['sans-6.1.6', 'iec-543.4']
      : derived && service
        ? [...nec, 'nec-702.11-a', 'nec-702.11-b']
        : nec,
  }
}

const none = (circuit: Circuit): Finding => {
  const utility = circuit.live.some((part) => part.kind === 'source' && part.type === 'utility')
  const names = listed(circuit.live.map(({ name }) => name))
  return {
    kind: 'no-bond',
    parts: circuit.live.map(({ id }) => id),
    says: `Nothing ties the neutral of ${names} to ground in this mode.`,
    danger:
      'A fault to metal finds no way back: no breaker trips, and the metal stays live until a second fault.',
    change: whereItBelongs(circuit),
    sections: isMetric(circuit)
      ? ['iec-411.4', 'sans-7.16.4']
      : utility
        ? ['nec-250.24', 'nec-250.28', 'nec-250.4']
        : ['nec-250.20', 'nec-250.30-1', 'nec-250.4'],
  }
}

const misplaced = (circuit: Circuit, bond: Bond): Finding => ({
  kind: 'wrong-place',
  parts: [bond.part.id],
  says: `The only bond is ${bondWords(bond)}, past the place where it belongs.`,
  danger:
    'Between there and the source, neutral current and fault current share wires that are not meant for both; the bond is gone with whatever is switched off or taken out there.',
  change: [...whereItBelongs(circuit), ...takeOut(circuit, bond)],
  sections: isMetric(circuit)
    ? ['sans-6.1.6', 'iec-543.4']
    : circuit.live.some((part) => part.kind === 'source' && part.type === 'utility')
      ? ['nec-250.24', 'nec-250.142']
      : ['nec-250.30-1', 'nec-250.142'],
})

/** Judges the count of one mode, and the place of a single bond. */
export function countFindings(
  circuit: Circuit,
  { counted }: Count,
  exceptions: readonly Exception[],
): Finding[] {
  if (
    circuit.live.every(({ volts }) => volts === '240') &&
    !circuit.carrying.some(({ to }) => to.kind === 'autotransformer')
  )
    return []
  const [only, second] = counted
  if (only === undefined) return exceptions.some(({ kind }) => kind === 'portable') ? [] : [none(circuit)]
  if (second !== undefined) return [tooMany(circuit, counted)]
  return rankOf(circuit, only) === 3 ? [misplaced(circuit, only)] : []
}
