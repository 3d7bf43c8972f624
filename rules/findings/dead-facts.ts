import type { Findings, Say } from './facts.ts'

const bands = [
  ['receptacle.ng.ohms', 'receptacle.ng.band'],
  ['receptacle.hg.ohms', 'receptacle.hg.band'],
  ['panel.ng.ohms', 'panel.ng.band'],
  ['source.ng.ohms', 'source.ng.band'],
  ['branch.egc.ohms', 'branch.egc.band'],
] as const

/** Ohms taken dead, in bands: a wire, a poor joint, two rods, something plugged in, open. */
export function deadFacts(f: Findings, say: Say): void {
  for (const [id, fact] of bands) {
    const ohms = f.amount(id)
    if (ohms === undefined) continue
    const e = f.edges
    const word =
      ohms < (e['ohms-tied'] ?? 0)
        ? 'tied'
        : ohms < (e['ohms-poor'] ?? 0)
          ? 'poor'
          : ohms < (e['ohms-rods'] ?? 0)
            ? 'rods'
            : ohms < (e['ohms-load'] ?? 0)
              ? 'load'
              : 'open'
    say(fact, word, [id])
  }
  const insulation = f.amount('branch.insulation.megohms')
  if (insulation !== undefined)
    say('insulation.band', insulation < 1 ? 'poor' : insulation < 5 ? 'fair' : 'good', [
      'branch.insulation.megohms',
    ])
  const loop = f.amount('receptacle.loop.ohms')
  if (loop !== undefined)
    say('loop.band', loop < 1.5 ? 'low' : loop < 5 ? 'raised' : loop < 500 ? 'rods' : 'open', [
      'receptacle.loop.ohms',
    ])
}
