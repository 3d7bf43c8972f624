/** What people report of a wiring, from what they could notice; sometimes nothing, now and then the wrong thing. */
import type { ElectricalCause, SourceKind } from '../../../rules/circuit/wiring/context.ts'
import type { Found } from '../../../rules/circuit/wiring/readings/measured.ts'
import type { Extent, Signs } from '../../../rules/circuit/wiring/readings/signs.ts'
import { between, happens, pick } from '../../../rules/circuit/wiring/sample.ts'
import type { Chance } from '../../../rules/circuit/wiring/sample.ts'
import type { Option } from '../../../rules/circuit/wiring/parameters.ts'
import { onsets, onsetsOf } from './onset.ts'

type Weights<T extends string> = Partial<Record<T, number>>
const options = <T extends string>(weights: Weights<T>): Option<T>[] =>
  (Object.entries(weights) as [T, number][]).map(([value, weight]) => ({ value, weight }))

const lightsValues = [
  'steady',
  'dim-under-load',
  'some-bright-some-dim',
  'flicker',
  'too-bright',
  'out',
] as const
type Lights = (typeof lightsValues)[number]

/** How lights look to people, from the volts they get. */
function lights(s: Signs, engine: boolean, looseJoint: boolean): Weights<Lights> {
  const lamps = [s.lampHere, s.lampElsewhere, s.lampOtherLeg]
  const brightest = Math.max(...lamps)
  if (brightest < 0.3) return { out: 94, flicker: 4, steady: 2 }
  if (s.lampHere < 0.3 && s.lampElsewhere > 0.7) return { out: 62, steady: 30, flicker: 8 }
  if (s.lampHere > 0.7 && s.lampPluggedIn < 0.3) return { steady: 62, out: 33, flicker: 5 }
  if (brightest > 1.12 && Math.min(...lamps) < 0.9)
    return { 'some-bright-some-dim': 66, 'too-bright': 12, flicker: 10, 'dim-under-load': 7, steady: 5 }
  if (Math.max(brightest, s.lampPluggedIn) > 1.085) return { 'too-bright': 50, steady: 44, flicker: 6 }
  if (s.dip > 0.045)
    return looseJoint
      ? { 'dim-under-load': 42, flicker: 34, steady: 24 }
      : { 'dim-under-load': 58, steady: 37, flicker: 5 }
  if (looseJoint) return { flicker: 36, 'dim-under-load': 30, steady: 34 }
  if (Math.min(...lamps) < 0.9) return { 'dim-under-load': 42, steady: 38, flicker: 18, out: 2 }
  return { steady: 90, flicker: engine ? 7 : 3, 'dim-under-load': engine ? 8 : 4 }
}

/** How far people say it reaches; who finds nothing wrong says anything. */
const extents: Record<Extent | 'nothing', Weights<Extent>> = {
  everything: { everything: 82, 'one-circuit': 9, 'one-receptacle': 9 },
  'one-circuit': { 'one-circuit': 70, 'one-receptacle': 26, everything: 4 },
  'one-receptacle': { 'one-receptacle': 82, 'one-circuit': 15, everything: 3 },
  nothing: { everything: 46, 'one-receptacle': 30, 'one-circuit': 24 },
}

/** Line a of IEC 60479-1: below 0.5 mA nobody feels anything, dry shoes or not. */
const tingles = (amps: number): number =>
  amps > 0.005 ? 0.55 : amps > 0.0005 ? 0.35 : amps > 0.0002 ? 0.12 : 0.02

type About = {
  cause: ElectricalCause
  source: SourceKind
  /** Whether something else is plugged in on the circuit. */
  plugged: boolean
  /** How often an answer is any other than the true one. */
  wrong: number
}

/** What people say, by finding id. */
export function reportedBy(chance: Chance, s: Signs, { cause, source, plugged, wrong }: About): Found {
  const found: Found = {}
  const say = (id: string, values: readonly string[], value: string, silent: number) => {
    if (happens(chance, silent)) return
    const others = values.filter((v) => v !== value).map((v) => ({ value: v, weight: 1 }))
    found[id] = happens(chance, wrong) ? pick(chance, others) : value
  }
  const engine = source === 'generator'
  const stepped = (source === 'standalone-inverter' || source === 'power-station') && happens(chance, 0.08)
  const loose = cause === 'loose-hot' || cause === 'loose-neutral'
  const silent = between(chance, 0.25, 0.45)
  say('lights', lightsValues, pick(chance, options(lights(s, engine, loose))), silent)
  say(
    'extent',
    ['one-receptacle', 'one-circuit', 'everything'],
    pick(chance, options(extents[s.extent ?? 'nothing'])),
    silent,
  )
  say('onset', onsets, pick(chance, onsetsOf(cause)), silent)
  say('tingle', ['yes', 'no'], happens(chance, tingles(s.touchAmps)) ? 'yes' : 'no', silent)
  const arcing = loose || ((cause === 'open-hot' || cause === 'open-neutral') && happens(chance, 0.4))
  say(
    'heat',
    ['none', 'warm', 'burnt'],
    pick(chance, options(arcing ? { none: 58, warm: 30, burnt: 12 } : { none: 955, warm: 40, burnt: 5 })),
    0.5,
  )
  say('buzz', ['yes', 'no'], happens(chance, loose ? 0.3 : 0.04) ? 'yes' : 'no', 0.5)
  say(
    'breaker.in-use',
    ['trips-at-once', 'trips-after-minutes', 'holds'],
    happens(chance, 0.03) ? 'trips-after-minutes' : 'holds',
    0.5,
  )
  say('meter.kind', ['true-rms', 'averaging'], happens(chance, 0.65) ? 'true-rms' : 'averaging', 0.5)
  say('source.waveform', ['sine', 'stepped'], stepped ? 'stepped' : 'sine', 0.5)
  say('others-plugged-in', ['yes', 'no'], plugged ? 'yes' : 'no', 0.7)
  return found
}
