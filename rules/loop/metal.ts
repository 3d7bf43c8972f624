/** Which metal a person can touch is live, and how much of it goes through them. */
import { minus, plus } from '../circuit/complex.ts'
import { earth, magnitude } from '../circuit/network.ts'
import type { Node } from '../circuit/network.ts'
import type { Factored } from '../circuit/solve.ts'
import { hasPanel, hasTwoLegs, nominalVolts } from '../circuit/wiring/context.ts'
import { bodyOhms, faintVolts, letGoAmps } from './loop-state.ts'
import type { Metal, Place } from './loop-state.ts'
import type { Drawn } from './loop-wiring.ts'

/** Metal counts as joined to a hot when it stands within this part of nominal of it. */
const joinedWithin = 0.1

/** What a person between two points gets: amps, and the volts that are left across them. */
function throughPerson(solved: Factored, a: Node, b: Node): { amps: number; volts: number; open: number } {
  const { open, impedance } = solved.port(a, b)
  const amps = magnitude(open) / magnitude(plus(impedance, { re: bodyOhms, im: 0 }))
  return { amps, volts: amps * bodyOhms, open: magnitude(open) }
}

function metalAt(place: Place, node: Node, { context }: Drawn, solved: Factored): Metal {
  const toEarth = throughPerson(solved, node, earth)
  if (toEarth.amps >= letGoAmps) return { place, is: 'live', volts: toEarth.volts, bodyAmps: toEarth.amps }
  const nominal = nominalVolts(context)
  const hots = ['source.hot', ...(hasTwoLegs(context) ? ['source.hot2'] : [])]
  const near = hots.some(
    (hot) => magnitude(minus(solved.volts(node), solved.volts(hot))) < joinedWithin * nominal,
  )
  const toNeutral = throughPerson(solved, node, 'source.neutral')
  if (near && toNeutral.amps >= letGoAmps)
    return { place, is: 'joined', volts: toNeutral.volts, bodyAmps: toNeutral.amps }
  const is = toEarth.open >= faintVolts ? 'faint' : 'quiet'
  return { place, is, volts: toEarth.open, bodyAmps: toEarth.amps }
}

/** The source's case, the panel's, and the metal of what is plugged in. */
export function metalOf(drawn: Drawn, solved: Factored): Metal[] {
  return [
    metalAt('source', 'source.case', drawn, solved),
    ...(hasPanel(drawn.context) ? [metalAt('panel', 'panel.ground', drawn, solved)] : []),
    metalAt('receptacle', 'receptacle.ground', drawn, solved),
  ]
}
