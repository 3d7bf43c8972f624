import type { Findings, Say } from './facts.ts'
import { weightOf } from './place-facts.ts'

const lamps = ['tester.hn-lamp', 'tester.hg-lamp', 'tester.ng-lamp'] as const

/** Volts across a test bulb as what the bulb shows; its look only where nobody measured. */
function bulbState(volts: number | undefined, look: string | undefined, f: Findings): string | undefined {
  if (volts === undefined) return look
  const part = volts / f.nominalVolts
  return part <= (f.edges['bulb-dim'] ?? 0)
    ? 'dark'
    : part <= (f.edges['bulb-bright'] ?? 0)
      ? 'dim'
      : 'bright'
}

function sourceBulb(f: Findings, say: Say): void {
  const ids = ['source.bulb.ng.volts', 'source.bulb.hg.volts', 'source.bulb.hn.volts'] as const
  const [ng, hg, hn] = ids.map((id) => f.amount(id))
  if (ng === undefined || hg === undefined) return
  const [n, h] = [ng / f.nominalVolts, hg / f.nominalVolts]
  const limit = f.edges['gate-bulb'] ?? 0
  const up = hn === undefined || hn / f.nominalVolts >= 0.9
  const word = !up
    ? 'sagged'
    : n <= limit && h <= limit
      ? 'nothing'
      : n <= limit && h > 0.75
        ? 'neutral'
        : h <= limit && n > 0.75
          ? 'hot'
          : n > 0.2 && n <= 0.75 && h > 0.2 && h <= 0.75
            ? 'half'
            : undefined
  if (word !== undefined) say('source-bulb.holds', word, hn === undefined ? ids.slice(0, 2) : ids)
}

/** Plug-in tester, test bulbs, GFCI buttons, and ground against an independent earth. */
export function testFacts(f: Findings, say: Say): void {
  const seen = lamps.map((id) => f.observed(id))
  if (seen.every((lamp) => lamp !== undefined)) say('tester.lamps', seen.join('/'), lamps)

  const across = f.amount('bulb.ng.volts')
  const ng = bulbState(across, f.observed('bulb.ng'), f)
  if (ng !== undefined) say('bulb.ng.shows', ng, across === undefined ? ['bulb.ng'] : ['bulb.ng.volts'])
  const hg = f.observed('bulb.hg')
  if (hg !== undefined) say('bulb.hg.shows', hg, ['bulb.hg'])
  sourceBulb(f, say)

  const [own, plug] = [f.observed('gfci.own-test'), f.observed('gfci.plug-test')]
  if (own !== undefined && plug !== undefined) {
    const word =
      own === 'trips'
        ? plug === 'trips'
          ? 'both-trip'
          : 'own-only'
        : plug === 'trips'
          ? 'plug-only'
          : 'neither'
    say('gfci.buttons', word, ['gfci.own-test', 'gfci.plug-test'])
  }
  const ms = f.amount('gfci.trip.milliseconds')
  const slowest = f.edges[f.nominalVolts === 230 ? 'rcd-milliseconds' : 'gfci-milliseconds'] ?? 0
  if (ms !== undefined) say('gfci.time', ms <= slowest ? 'in-time' : 'slow', ['gfci.trip.milliseconds'])

  // A tingle is a shock: one yes outweighs the other's no.
  const felt = ['shock', 'tingle'].filter((id) => f.observed(id) !== undefined)
  const yes = felt.filter((id) => f.observed(id) === 'yes')
  if (felt.length > 0) say('shock.felt', yes.length > 0 ? 'yes' : 'no', yes.length > 0 ? yes : felt)

  const id = 'receptacle.ge.volts'
  const earth = f.amount(id)
  if (earth !== undefined) {
    const touch = f.edges['touch-volts'] ?? 0
    const word = earth < 5 ? 'nil' : earth < touch ? 'some' : earth / f.nominalVolts < 0.8 ? 'touch' : 'line'
    say('ground-to-earth.level', word, [id])
    say('ground-to-earth.meter', weightOf(f.meterOhms(id), f.edges), [])
  }
}
