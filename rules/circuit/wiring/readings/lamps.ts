import { bulbBetween } from '../../instruments/test-bulb.ts'
import { testerShows } from '../../instruments/plug-in-tester.ts'
import type { Tester } from '../../instruments/plug-in-tester.ts'
import { reads } from '../../instruments/meter.ts'
import type { Meter } from '../../instruments/meter.ts'
import { nominalVolts } from '../context.ts'
import type { Found, Measured } from './measured.ts'

const slots = { hot: 'receptacle.hot', neutral: 'receptacle.neutral', ground: 'receptacle.ground' }

/** The plug-in tester's three lamps. */
export function testerLamps({ context, tested }: Measured, tester: Tester, found: Found): void {
  const lamps = testerShows(tested, slots, tester, nominalVolts(context))
  found['tester.hn-lamp'] = lamps.hn
  found['tester.hg-lamp'] = lamps.hg
  found['tester.ng-lamp'] = lamps.ng
}

/** The test bulb at the receptacle and at the source's own terminals, with the volts across it. */
export function testBulbs(
  { context, running }: Measured,
  ratedWatts: number,
  meter: Meter,
  found: Found,
): void {
  const bulb = { ratedWatts, ratedVolts: nominalVolts(context) }
  const ng = bulbBetween(running, slots.neutral, slots.ground, bulb)
  const hg = bulbBetween(running, slots.hot, slots.ground, bulb)
  const sourceNg = bulbBetween(running, 'source.neutral', 'source.case', bulb)
  const sourceHg = bulbBetween(running, 'source.hot', 'source.case', bulb)
  const hung = running.loaded([{ from: 'source.hot', to: 'source.case', ohms: sourceHg.ohms }])
  found['bulb.ng'] = ng.look
  found['bulb.ng.volts'] = ng.volts
  found['bulb.hg'] = hg.look
  found['source.bulb.ng.volts'] = sourceNg.volts
  found['source.bulb.hg.volts'] = sourceHg.volts
  found['source.bulb.hn.volts'] = reads(hung, 'source.hot', 'source.neutral', meter)
}
