import { clampReads } from '../../instruments/clamp.ts'
import { magnitude } from '../../network.ts'
import type { Factored } from '../../solve.ts'
import { hasPanel, hasTwoLegs, nominalVolts } from '../context.ts'
import { feedOf } from '../healthy.ts'
import type { Found, Measured } from './measured.ts'

/** Class A trips at 6 mA and must not at 4 (UL 943); an RCD of 30 mA between 15 and 30 (IEC 61008). */
const limitAmps = (nominal: number): number => (nominal > 200 ? 0.022 : 0.005)
/** What the button of a plug-in tester puts on the ground wire. */
const buttonAmps = (nominal: number): number => (nominal > 200 ? 0.03 : 0.0075)

/** A GFCI where there is one: its own button, a plug-in tester's, and whether it stays on. */
export function gfci({ context, p, running, loaded }: Measured, found: Found): void {
  if (p.gfciAt === 'nowhere') return
  const nominal = nominalVolts(context)
  const onFeeder = p.gfciAt === 'source' && hasPanel(context)
  const through = onFeeder
    ? ['feeder.hot', 'feeder.neutral', ...(hasTwoLegs(context) ? ['feeder.hot2'] : [])]
    : ['branch.hot', 'branch.neutral']
  const trips = (network: Factored) => clampReads(network, through, 0) > limitAmps(nominal)
  const at = onFeeder ? 'source' : feedOf(context)
  const live = magnitude(running.between(`${at}.hot`, `${at}.neutral`)) > 0.6 * nominal
  const pressed = running.loaded([
    { from: 'receptacle.hot', to: 'receptacle.ground', ohms: nominal / buttonAmps(nominal) },
  ])
  found['gfci.own-test'] = live ? 'trips' : 'holds'
  found['gfci.plug-test'] = trips(pressed) ? 'trips' : 'holds'
  found['gfci.in-use'] = trips(running) ? 'trips-at-once' : trips(loaded) ? 'trips-with-load' : 'holds'
}
