import { magnitude } from '../network.ts'
import type { Node } from '../network.ts'
import type { Factored } from '../solve.ts'

export type Lamp = 'lit' | 'dim' | 'dark'
export type Slots = { hot: Node; neutral: Node; ground: Node }
/** The lamps of a three-lamp tester, by the pair of slots each lies between. */
export type Lamps = { hn: Lamp; hg: Lamp; ng: Lamp }

/** One number for each lamp, in the order hot–neutral, hot–ground, neutral–ground. */
export type EachLamp = readonly [hn: number, hg: number, ng: number]
export type Tester =
  | { kind: 'resistive'; ohms: EachLamp }
  /** A gas lamp does nothing until it strikes; then its series resistance sets the current. */
  | { kind: 'neon'; ohms: EachLamp; strikeVolts: EachLamp }

/** Common practice: 100 to 200 kΩ a lamp; a neon strikes at 60 to 74 V RMS. */
export const usualTesters: readonly Tester[] = [
  { kind: 'resistive', ohms: [150_000, 150_000, 150_000] },
  { kind: 'neon', ohms: [150_000, 150_000, 150_000], strikeVolts: [67, 67, 67] },
]

/** When people call a lamp lit or dim, by the part of nominal volts across it while it burns. Common practice. */
export const lampLooks = [
  { look: 'lit', fromPart: 0.7, because: 'Down to 70 % nobody sees a difference without another beside it.' },
  { look: 'dim', fromPart: 0.25, because: 'Below a quarter a lamp is lost in the light of a room.' },
  { look: 'dark', fromPart: 0, because: 'Nothing to see.' },
] as const

/** Once it burns a neon stays lit down to some 80 % of what struck it (common practice). */
const staysLit = 0.8
/**
 * A neon that a weak source strikes pulls its own volts down, goes out and strikes again. That shows as a dim glow
 * from about a twentieth of a lamp's usual 1 mA.
 */
const glowAmps = 50e-6

const pairs = ['hn', 'hg', 'ng'] as const
type Pair = (typeof pairs)[number]

const ends = ({ hot, neutral, ground }: Slots): Record<Pair, { from: Node; to: Node }> => ({
  hn: { from: hot, to: neutral },
  hg: { from: hot, to: ground },
  ng: { from: neutral, to: ground },
})
const ofEach = ([hn, hg, ng]: EachLamp): Record<Pair, number> => ({ hn, hg, ng })

const lookOf = (part: number): Lamp => lampLooks.find(({ fromPart }) => part >= fromPart)?.look ?? 'dark'

/**
 * What a tester plugged into a receptacle shows. Its three lamps are in the circuit together: on an open ground the
 * ground pin hangs between two of them.
 * @param nominalVolts of the system; the lamps' looks are parts of it
 */
export function testerShows(network: Factored, slots: Slots, tester: Tester, nominalVolts: number): Lamps {
  return tester.kind === 'resistive'
    ? resistiveShows(network, slots, tester.ohms, nominalVolts)
    : neonShows(network, slots, tester, nominalVolts)
}

function resistiveShows(network: Factored, slots: Slots, ohms: EachLamp, nominalVolts: number): Lamps {
  const [between, own] = [ends(slots), ofEach(ohms)]
  const plugged = network.loaded(pairs.map((pair) => ({ ...between[pair], ohms: own[pair] })))
  const look = (pair: Pair) =>
    lookOf(magnitude(plugged.between(between[pair].from, between[pair].to)) / nominalVolts)
  return { hn: look('hn'), hg: look('hg'), ng: look('ng') }
}

/** Strikes the lamp with the most volts for what it needs, and looks again, until nothing changes. */
function neonShows(
  network: Factored,
  slots: Slots,
  tester: Extract<Tester, { kind: 'neon' }>,
  nominalVolts: number,
): Lamps {
  const between = ends(slots)
  const [ohms, strikes] = [ofEach(tester.ohms), ofEach(tester.strikeVolts)]
  const burning = new Set<Pair>()
  /** Amps while it lasted, of lamps that strike and go out again. */
  const flickering = new Map<Pair, number>()
  // A neon that is out is not there: its picofarad is less than the slot's own.
  const voltsNow = () => {
    const lit = pairs.filter((pair) => burning.has(pair))
    const plugged = network.loaded(lit.map((pair) => ({ ...between[pair], ohms: ohms[pair] })))
    return (pair: Pair) => magnitude(plugged.between(between[pair].from, between[pair].to))
  }
  let volts = voltsNow()
  // Every turn strikes a lamp or puts one out for good, so six are the most there can be.
  for (;;) {
    const part = (pair: Pair) => volts(pair) / strikes[pair]
    const out = pairs.find((pair) => burning.has(pair) && part(pair) < staysLit)
    if (out !== undefined) {
      burning.delete(out)
      flickering.set(out, volts(out) / ohms[out])
    } else {
      const unlit = pairs.filter((pair) => !burning.has(pair) && !flickering.has(pair))
      const next = unlit.sort((a, b) => part(b) - part(a))[0]
      if (next === undefined || part(next) < 1) break
      burning.add(next)
    }
    volts = voltsNow()
  }
  const look = (pair: Pair): Lamp => {
    if (!burning.has(pair)) return (flickering.get(pair) ?? 0) >= glowAmps ? 'dim' : 'dark'
    // A neon that burns is seen, however few volts are left.
    const burns = lookOf(volts(pair) / nominalVolts)
    return burns === 'dark' ? 'dim' : burns
  }
  return { hn: look('hn'), hg: look('hg'), ng: look('ng') }
}
