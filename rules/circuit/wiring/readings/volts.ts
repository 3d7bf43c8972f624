import { reads } from '../../instruments/meter.ts'
import type { Meter } from '../../instruments/meter.ts'
import { hasPanel, hasTwoLegs, hertzOf, nominalVolts } from '../context.ts'
import type { Found, Measured } from './measured.ts'

/** Every voltage of the catalogue, the meter held to the two points it is read between. */
export function volts(m: Measured, meter: Meter, found: Found): void {
  const { context, p, running, loaded } = m
  const places = [
    ['receptacle', 'receptacle.ground'],
    ...(hasPanel(context) ? [['panel', 'panel.ground'] as const] : []),
    ['source', 'source.case'],
  ] as const
  for (const [place, ground] of places) {
    const [hot, neutral] = [`${place}.hot`, `${place}.neutral`]
    found[`${place}.hn.volts`] = reads(running, hot, neutral, meter)
    found[`${place}.hg.volts`] = reads(running, hot, ground, meter)
    found[`${place}.ng.volts`] = reads(running, neutral, ground, meter)
    found[`${place}.hn.volts.loaded`] = reads(loaded, hot, neutral, meter)
    if (place !== 'source') found[`${place}.ng.volts.loaded`] = reads(loaded, neutral, ground, meter)
  }
  found['receptacle.ge.volts'] = reads(running, 'receptacle.ground', 'lead', meter)
  if (hasPanel(context) && hasTwoLegs(context)) {
    const [one, two] = p.circuitLeg === 1 ? ['panel.hot', 'panel.hot2'] : ['panel.hot2', 'panel.hot']
    found['panel.l1n.volts'] = reads(running, one, 'panel.neutral', meter)
    found['panel.l2n.volts'] = reads(running, two, 'panel.neutral', meter)
    found['panel.l1l2.volts'] = reads(running, one, two, meter)
    found['panel.l1g.volts'] = reads(running, one, 'panel.ground', meter)
    found['panel.l2g.volts'] = reads(running, two, 'panel.ground', meter)
  }
  // Nothing of these causes makes DC between neutral and case.
  found['source.ng.volts.dc'] = 0
  if (Number(found['source.hn.volts']) > 0.3 * nominalVolts(context))
    found['source.hz'] = hertzOf(context) * p.hertzRatio
}
