import { places } from './fact-names.ts'
import type { Findings, Say } from './facts.ts'
import { levelOf, patternOf, supplyOf } from './volts-pattern.ts'

/** How much a meter pulls at what it reads: its input resistance in three classes. */
export function weightOf(ohms: number, edges: Findings['edges']): 'light' | 'middle' | 'heavy' {
  if (ohms >= (edges['meter-light'] ?? Infinity)) return 'light'
  return ohms > (edges['meter-heavy'] ?? 0) ? 'middle' : 'heavy'
}

const againstBefore = [
  ['panel', 'source'],
  ['receptacle', 'panel'],
  ['receptacle', 'source'],
] as const

/** Volts of each place: their picture, their levels, and how a place compares with the one ahead of it. */
export function placeFacts(f: Findings, say: Say): void {
  for (const place of places) {
    const ids = (['hn', 'hg', 'ng'] as const).map((pair) => [pair, `${place}.${pair}.volts`] as const)
    const taken = ids.flatMap(([pair, id]) => {
      const volts = f.amount(id)
      return volts === undefined ? [] : [{ pair, id, volts }]
    })
    for (const { pair, id, volts } of taken) {
      const level = levelOf(volts, f.nominalVolts, f.edges)
      say(`${place}.${pair}.level`, level, [id])
      if (taken.length < 3) say(`${place}.${pair}.alone`, level, [id])
      if (pair === 'hn' && volts / f.nominalVolts > 0.5) say(`${place}.supply`, supplyOf(volts, f), [id])
    }
    if (taken.length > 0)
      say(`${place}.meter`, weightOf(Math.min(...taken.map((t) => f.meterOhms(t.id))), f.edges), [])
    const [hn, hg, ng] = ids.map(([, id]) => f.amount(id))
    if (hn !== undefined && hg !== undefined && ng !== undefined)
      say(
        `${place}.pattern`,
        patternOf(hn, hg, ng, f.nominalVolts, f.edges),
        taken.map((t) => t.id),
      )
  }
  for (const [place, before] of againstBefore) {
    const here = f.amount(`${place}.hn.volts`)
    const ahead = f.amount(`${before}.hn.volts`)
    if (here === undefined || ahead === undefined) continue
    const [h, a] = [here / f.nominalVolts, ahead / f.nominalVolts]
    const same = f.edges['compare-same'] ?? 0
    const word =
      a < 0.1 && h > 0.5
        ? 'fed-elsewhere'
        : a > 0.5 && h < 0.5
          ? 'gone'
          : Math.abs(h - a) <= same
            ? 'same'
            : h < a
              ? 'less'
              : 'more'
    say(`${place}.against-${before}`, word, [`${place}.hn.volts`, `${before}.hn.volts`])
  }
}
