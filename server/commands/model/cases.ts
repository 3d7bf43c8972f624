/** Model cases: a wiring drawn by chance, measured by a tech drawn by chance, reported by people drawn by chance. */
import type { Network } from '../../../rules/circuit/network.ts'
import { wireTwo } from '../../../rules/circuit/two-faults.ts'
import type { ElectricalCause, WiringContext } from '../../../rules/circuit/wiring/context.ts'
import { electricalCauses } from '../../../rules/circuit/wiring/context.ts'
import type { Parameters } from '../../../rules/circuit/wiring/parameters.ts'
import { measured } from '../../../rules/circuit/wiring/readings/measured.ts'
import type { Found } from '../../../rules/circuit/wiring/readings/measured.ts'
import { signs } from '../../../rules/circuit/wiring/readings/signs.ts'
import {
  between,
  chanceFrom,
  happens,
  pick,
  sampleContext,
  sampleParameters,
} from '../../../rules/circuit/wiring/sample.ts'
import type { Chance } from '../../../rules/circuit/wiring/sample.ts'
import { takeReadings } from '../../../rules/circuit/wiring/take-readings.ts'
import { wire } from '../../../rules/circuit/wiring/wire.ts'
import { reportedBy } from './people.ts'
import { takenBy, techComes } from './tech.ts'

export type ModelCase = {
  id: string
  truth: ElectricalCause
  context: WiringContext & { meterOhms: number }
  findings: Found
}
/** Two faults at once: `truth` is one of them, `also` the other. */
export type PairCase = ModelCase & { also: ElectricalCause }

type Drawn = { context: WiringContext; network: Network; p: Parameters; cause: ElectricalCause }

function visited(chance: Chance, { context, network, p, cause }: Drawn, everything: boolean) {
  const wired = measured(context, network, p)
  const tech = techComes(chance)
  const engine = context.source === 'generator'
  const reach = context.source !== 'utility' || happens(chance, 0.2)
  const wrong = between(chance, 0.01, 0.05)
  return {
    context: { ...context, meterOhms: tech.kit.meter.ohms },
    findings: {
      ...takenBy(chance, tech, takeReadings(wired, tech.kit), { everything, engine, reach }),
      ...reportedBy(chance, signs(wired), {
        cause,
        source: context.source,
        plugged: p.pluggedInOhms > 0,
        wrong,
      }),
    },
  }
}

/**
 * One case of a cause. The same seed, cause and number give the same case.
 * @param everything also the readings that a call seldom takes
 */
export function modelCase(seed: string, cause: ElectricalCause, n: number, everything = false): ModelCase {
  const id = `${seed}/${cause}/${n}`
  const chance = chanceFrom(id)
  const context = sampleContext(chance, cause)
  const p = sampleParameters(chance, context, cause)
  return {
    id,
    truth: cause,
    ...visited(chance, { context, network: wire(context, cause, p), p, cause }, everything),
  }
}

const faulty = electricalCauses.filter((c) => c !== 'sound').map((value) => ({ value, weight: 1 }))

/** One case of two faults that can be there together. */
export function pairCase(seed: string, n: number, everything = false): PairCase {
  const id = `${seed}/pair/${n}`
  const chance = chanceFrom(id)
  for (;;) {
    const [one, other] = [pick(chance, faulty), pick(chance, faulty)]
    const context = sampleContext(chance, one)
    const both = wireTwo(chance, context, one, other)
    if (both === undefined) continue
    const cause = happens(chance, 0.5) ? one : other
    return { id, truth: one, also: other, ...visited(chance, { context, ...both, cause }, everything) }
  }
}
