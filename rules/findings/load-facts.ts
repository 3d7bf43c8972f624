import type { Findings, Say } from './facts.ts'

type Drop = { volts: number; relative: number; from: string[] }

/** Fall of hot–neutral when the load comes on, volts and as a part of nominal. */
function dropAt(f: Findings, place: string): Drop | undefined {
  const [off, on] = [`${place}.hn.volts`, `${place}.hn.volts.loaded`]
  const [without, withLoad] = [f.amount(off), f.amount(on)]
  if (without === undefined || withLoad === undefined) return undefined
  const volts = without - withLoad
  return { volts, relative: volts / f.nominalVolts, from: [off, on] }
}

function dropWord(drop: Drop, withLoad: number, f: Findings): string {
  const e = f.edges
  if (drop.relative < -(e['drop-rise'] ?? 0)) return 'rise'
  if (withLoad / f.nominalVolts < 0.5 && drop.relative > 0.2) return 'collapse'
  if (drop.relative < (e['drop-usual'] ?? 0)) return 'none'
  if (drop.relative < (e['drop-much'] ?? 0)) return 'usual'
  return drop.relative < (e['drop-severe'] ?? 0) ? 'much' : 'severe'
}

/** How much of a fall of hot–neutral shows as a rise of neutral–ground: tells a poor neutral from a poor hot. */
function riseShare(rise: number, fall: number, f: Findings): string {
  const part = rise / fall
  const e = f.edges
  if (rise / f.nominalVolts < (e['rise-nothing'] ?? 0)) return 'none'
  if (part < (e['rise-small'] ?? 0)) return 'none'
  if (part < (e['rise-some'] ?? 0)) return 'little'
  if (part < (e['rise-half'] ?? 0)) return 'small'
  return part < (e['rise-most'] ?? 0) ? 'half' : 'most'
}

const feederEnds = ['source.hn.volts', 'source.ng.volts', 'panel.hn.volts', 'panel.ng.volts'] as const

/** The same share for the feeder, from the house's own load: where the bond is in the panel, the source shows it. */
function feederRise(f: Findings, say: Say): void {
  const [sourceHn, sourceNg, panelHn, panelNg] = feederEnds.map((id) => f.amount(id))
  if (sourceHn === undefined || sourceNg === undefined || panelHn === undefined || panelNg === undefined)
    return
  const fall = sourceHn - panelHn
  const bonded = Math.min(sourceNg, panelNg) / f.nominalVolts < 0.01
  if (bonded && panelHn > 0.5 * f.nominalVolts && fall / f.nominalVolts >= (f.edges['rise-readable'] ?? 0))
    say('feeder.rise-share', riseShare(Math.abs(sourceNg - panelNg), fall, f), feederEnds)
}

/** What a known load makes of the volts, and where along the run the drop sits. */
export function loadFacts(f: Findings, say: Say): void {
  const falls: Record<string, Drop> = {}
  for (const place of ['receptacle', 'panel', 'source']) {
    const drop = dropAt(f, place)
    if (drop === undefined) continue
    falls[place] = drop
    say(`${place}.drop`, dropWord(drop, f.amount(`${place}.hn.volts.loaded`) ?? 0, f), drop.from)
    const [off, on] = [`${place}.ng.volts`, `${place}.ng.volts.loaded`]
    const [without, withLoad] = [f.amount(off), f.amount(on)]
    const steady = without !== undefined && without / f.nominalVolts < (f.edges['rise-steady'] ?? 0)
    if (steady && withLoad !== undefined && drop.relative >= (f.edges['rise-readable'] ?? 0))
      say(`${place}.rise-share`, riseShare(withLoad - without, drop.volts, f), [...drop.from, off, on])
  }
  feederRise(f, say)
  // Without the reading before the load there is no drop; what the load leaves still says something.
  const left = f.amount('receptacle.hn.volts.loaded')
  if (left !== undefined && falls['receptacle'] === undefined)
    say('receptacle.loaded-alone', left / f.nominalVolts < (f.edges['level-low'] ?? 0) ? 'low' : 'within', [
      'receptacle.hn.volts.loaded',
    ])
  const [before, loaded] = [f.amount('receptacle.ng.volts'), f.amount('receptacle.ng.volts.loaded')]
  if (before !== undefined && loaded !== undefined) {
    const rise = (loaded - before) / f.nominalVolts
    const word =
      rise < 0.002 ? 'none' : rise < 0.012 ? 'small' : rise < 0.03 ? 'some' : rise < 0.5 ? 'much' : 'collapse'
    say('receptacle.ng.rise', word, ['receptacle.ng.volts', 'receptacle.ng.volts.loaded'])
  }
  // Where most of the drop sits: what a place loses beyond the place ahead of it.
  const { receptacle, panel, source } = falls
  const spans = [
    ['source', source?.volts],
    ['feeder', panel && source && panel.volts - source.volts],
    ['branch', receptacle && panel && receptacle.volts - panel.volts],
  ] as const
  const known = spans.filter((s): s is [(typeof s)[0], number] => s[1] !== undefined)
  const worst = known.reduce<(typeof known)[number] | undefined>(
    (w, s) => (w && w[1] >= s[1] ? w : s),
    undefined,
  )
  if (known.length >= 2 && worst && worst[1] / f.nominalVolts >= (f.edges['drop-much'] ?? 0) / 2)
    say(
      'drop.sits',
      worst[0],
      Object.values(falls).flatMap((d) => d.from),
    )
}
