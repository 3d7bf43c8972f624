/** What people notice without an instrument, as amounts: words and mistakes are made of them elsewhere. */
import { magnitude } from '../../network.ts'
import type { Factored } from '../../solve.ts'
import { hasTwoLegs, hasPanel, nominalVolts } from '../context.ts'
import { feedOf } from '../healthy.ts'
import type { Measured } from './measured.ts'

export type Extent = 'one-receptacle' | 'one-circuit' | 'everything'
export type Signs = {
  /** How far what is wrong here shows; undefined where nothing shows. */
  extent: Extent | undefined
  /** Volts a lamp gets in this receptacle, in the one before it, and where the circuit begins: parts of nominal. */
  lampPluggedIn: number
  lampHere: number
  lampElsewhere: number
  /** The same on the other leg; where there is none, as elsewhere. */
  lampOtherLeg: number
  /** What a lamp on the circuit loses when the known load starts, part of nominal. */
  dip: number
  /** Through a person who touches an appliance with a filter, standing on the earth; amps. */
  touchAmps: number
}

/** Hand to foot, damp: between the 5 % and 50 % rows of IEC 60479-1 at mains voltage. */
const bodyOhms = 2000
/** Filter of an appliance, each side to its case (IEC 60384-14, class Y2, typical). */
const applianceFarads = 2.2e-9
/** Nobody minds less. */
const mindsDrop = 0.05
const mindsLevel = 0.1

const across = (network: Factored, a: string, b: string) => magnitude(network.between(a, b))
/** A tester's lamp, for the volts it leaves on what only capacitance holds. */
const lampOhms = 150_000

/** Whether a receptacle here would look wrong: its level, its ground under a tester, or its drop under load. */
function looksWrong(m: Measured, place: string): boolean {
  const nominal = nominalVolts(m.context)
  const [hot, neutral, ground] = [`${place}.hot`, `${place}.neutral`, `${place}.ground`]
  const held = m.tested.loaded([
    { from: hot, to: neutral, ohms: lampOhms },
    { from: hot, to: ground, ohms: lampOhms },
    { from: neutral, to: ground, ohms: lampOhms },
  ])
  const level = across(held, hot, neutral) / nominal
  const fall = (across(m.running, hot, neutral) - across(m.loaded, hot, neutral)) / nominal
  return (
    Math.abs(level - 1) > mindsLevel ||
    across(held, hot, ground) < 0.7 * nominal ||
    across(held, neutral, ground) > 0.25 * nominal ||
    fall > mindsDrop
  )
}

function extentOf(m: Measured): Extent | undefined {
  if (!looksWrong(m, 'receptacle')) return undefined
  if (looksWrong(m, feedOf(m.context))) return 'everything'
  return looksWrong(m, 'joint') ? 'one-circuit' : 'one-receptacle'
}

/** What a person would see, and feel, of this wiring. */
export function signs(m: Measured): Signs {
  const { context, running, loaded, tested } = m
  const nominal = nominalVolts(context)
  const feed = feedOf(context)
  const touched = tested.loaded([
    { from: 'receptacle.hot', to: 'receptacle.ground', ohms: Infinity, farads: applianceFarads },
    { from: 'receptacle.neutral', to: 'receptacle.ground', ohms: Infinity, farads: applianceFarads },
    { from: 'receptacle.ground', to: 'earth', ohms: bodyOhms },
  ])
  const elsewhere = across(running, `${feed}.hot`, `${feed}.neutral`) / nominal
  return {
    extent: extentOf(m),
    lampPluggedIn: across(running, 'receptacle.hot', 'receptacle.neutral') / nominal,
    lampHere: across(running, 'joint.hot', 'joint.neutral') / nominal,
    lampElsewhere: elsewhere,
    lampOtherLeg:
      hasTwoLegs(context) && hasPanel(context)
        ? across(running, 'panel.hot2', 'panel.neutral') / nominal
        : elsewhere,
    dip:
      (across(running, 'joint.hot', 'joint.neutral') - across(loaded, 'joint.hot', 'joint.neutral')) /
      nominal,
    touchAmps: magnitude(touched.volts('receptacle.ground')) / bodyOhms,
  }
}
