import { bulbBetween } from '../../instruments/test-bulb.ts'
import { testerShows } from '../../instruments/plug-in-tester.ts'
import type { Tester } from '../../instruments/plug-in-tester.ts'
import { reads } from '../../instruments/meter.ts'
import type { Meter } from '../../instruments/meter.ts'
import { nominalVolts } from '../context.ts'
import type { Found, Measured } from './measured.ts'

const slots = { hot: 'receptacle.hot', neutral: 'receptacle.neutral', ground: 'receptacle.ground' }

/** The plug-in tester's three lamps. */
export function testerLamps({ context, tested }: Measured, tester: Tester): Found {
  const lamps = testerShows(tested, slots, tester, nominalVolts(context))
  return { 'tester.hn-lamp': lamps.hn, 'tester.hg-lamp': lamps.hg, 'tester.ng-lamp': lamps.ng }
}

/** The test bulb at the receptacle and at the source's own terminals, with the volts across it. */
export function testBulbs({ context, running }: Measured, ratedWatts: number, meter: Meter): Found {
  const bulb = { ratedWatts, ratedVolts: nominalVolts(context) }
  const ng = bulbBetween(running, slots.neutral, slots.ground, bulb)
  const hg = bulbBetween(running, slots.hot, slots.ground, bulb)
  const sourceNg = bulbBetween(running, 'source.neutral', 'source.case', bulb)
  const sourceHg = bulbBetween(running, 'source.hot', 'source.case', bulb)
  const hung = running.loaded([{ from: 'source.hot', to: 'source.case', ohms: sourceHg.ohms }])
  return {
    'bulb.ng': ng.look,
    'bulb.ng.volts': ng.volts,
    'bulb.hg': hg.look,
    'source.bulb.ng.volts': sourceNg.volts,
    'source.bulb.hg.volts': sourceHg.volts,
    'source.bulb.hn.volts': reads(hung, 'source.hot', 'source.neutral', meter),
  }
}
