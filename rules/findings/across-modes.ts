import type { Fact, Say } from './facts.ts'
import { places } from './fact-names.ts'

const floats = ['half', 'uneven', 'just-short', 'short', 'far-short', 'nowhere', 'off-line', 'beyond-neutral']

/** Whether ground holds on neutral in a mode, as far as volts, lamps or the source's bulb tell. */
function bondedIn(
  facts: ReadonlyMap<string, Fact>,
): { bonded: boolean; from: readonly string[] } | undefined {
  for (const place of [...places].reverse()) {
    const pattern = facts.get(`${place}.pattern`)
    if (pattern?.value === 'on-neutral') return { bonded: true, from: pattern.from }
    if (pattern !== undefined && floats.includes(String(pattern.value)))
      return { bonded: false, from: pattern.from }
  }
  for (const place of places) {
    const ng = facts.get(`${place}.ng.alone`)
    if (ng?.value === 'nil') return { bonded: true, from: ng.from }
    if (ng !== undefined && ['part', 'half', 'trace'].includes(String(ng.value)))
      return { bonded: false, from: ng.from }
  }
  const lamps = facts.get('tester.lamps')
  if (lamps?.value === 'lit/lit/dark') return { bonded: true, from: lamps.from }
  if (
    lamps !== undefined &&
    ['lit/dim/dim', 'lit/dark/dark', 'lit/dim/dark', 'lit/dark/dim'].includes(String(lamps.value))
  )
    return { bonded: false, from: lamps.from }
  const plug = facts.get('gfci.plug-test')
  return plug && { bonded: plug.value === 'trips', from: plug.from }
}

/** Facts that compare operating modes: a bond, or a second one, that comes and goes. */
export function acrossModes(perMode: ReadonlyMap<string, ReadonlyMap<string, Fact>>, say: Say): void {
  const bonds = [...perMode.values()].map(bondedIn).filter((b) => b !== undefined)
  if (bonds.length > 1) {
    const differ = new Set(bonds.map((b) => b.bonded)).size > 1
    say('modes.bond', differ ? 'comes-and-goes' : 'same', bonds[0]?.from ?? [])
  }
  const flows = [...perMode.values()].flatMap((facts) => facts.get('feeder.egc.flow') ?? [])
  if (flows.length > 1) {
    const carries = flows.map((f) => f.value === 'some' || f.value === 'much')
    say('modes.second-bond', new Set(carries).size > 1 ? 'comes-and-goes' : 'same', flows[0]?.from ?? [])
  }
}
