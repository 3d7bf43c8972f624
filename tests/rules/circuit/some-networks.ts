import { heldTo, meterOf } from '../../../rules/circuit/instruments/meter.ts'
import { earth } from '../../../rules/circuit/network.ts'
import type { Branch, Network } from '../../../rules/circuit/network.ts'
import type { Load } from '../../../rules/circuit/solve.ts'
import { electricalCauses } from '../../../rules/circuit/wiring/context.ts'
import { chanceFrom, sampleContext, sampleParameters } from '../../../rules/circuit/wiring/sample.ts'
import { dead } from '../../../rules/circuit/wiring/states.ts'
import { wire } from '../../../rules/circuit/wiring/wire.ts'

/** From a stiff low-resistance instrument to what electronic meters have. */
export const meterOhms = [10e6, 1e6, 400e3, 10e3, 3e3]

const sides = [
  ['receptacle.hot', 'receptacle.neutral'],
  ['receptacle.hot', 'receptacle.ground'],
  ['receptacle.neutral', 'receptacle.ground'],
] as const

export type SomeCase = { name: string; network: Network; dead: Network; loads: readonly Load[] }

/** Wirings of every cause, running and dead, with a meter on one side and, in every other one, a load beside it. */
export function someWirings(perCause: number): SomeCase[] {
  return electricalCauses.flatMap((cause, c) =>
    Array.from({ length: perCause }, (_, k) => {
      const name = `${cause} ${k}`
      const chance = chanceFrom(name)
      const context = sampleContext(chance, cause)
      const p = sampleParameters(chance, context, cause)
      const network = wire(context, cause, p)
      const side = sides[(c + k) % sides.length] ?? sides[0]
      const meter = heldTo(side[0], side[1], meterOf(meterOhms[k % meterOhms.length] ?? 10e6))
      const load = { from: 'receptacle.hot', to: 'receptacle.neutral', ohms: 12 }
      return { name, network, dead: dead(context, network, p), loads: k % 2 === 0 ? [meter] : [meter, load] }
    }),
  )
}

/** Networks no wiring has: any branch between any two nodes, values over many decades, parts tied to nothing. */
export function anyNetworks(count: number): { name: string; network: Network }[] {
  return Array.from({ length: count }, (_, k) => {
    const name = `any ${k}`
    const chance = chanceFrom(name)
    const size = 3 + Math.floor(chance() * 20)
    const node = () => {
      const n = Math.floor(chance() * (size + 1))
      return n === 0 ? earth : `p${n}`
    }
    const decades = (low: number, high: number) => low * (high / low) ** chance()
    const branch = (i: number): Branch => {
      const ends = { name: `b${i}`, from: node(), to: node() }
      const kind = chance()
      if (i < 2 || kind < 0.05)
        return {
          ...ends,
          kind: 'source',
          volts: 240 * chance(),
          degrees: 360 * chance(),
          ohms: decades(0.01, 10),
        }
      if (kind < 0.6) return { ...ends, kind: 'resistance', ohms: decades(0.002, 1e7) }
      if (kind < 0.9) return { ...ends, kind: 'capacitance', farads: decades(1e-12, 1e-3) }
      return { ...ends, kind: 'winding', ohms: decades(0.01, 10), henries: decades(1e-5, 1) }
    }
    const branches = Array.from({ length: 2 + Math.floor(size * (1 + chance())) }, (_, i) => branch(i))
    const hertz = [50, 60, 61.7, 400][k % 4] ?? 60
    return { name, network: { hertz, branches: branches.filter((b) => b.from !== b.to) } }
  })
}
