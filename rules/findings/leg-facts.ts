import type { Findings, Say } from './facts.ts'

const one = 'panel.l1n.volts'
const two = 'panel.l2n.volts'
const across = 'panel.l1l2.volts'

/** The two legs of a 120/240 panel against each other and against ground. */
export function legFacts(f: Findings, say: Say): void {
  const n = f.nominalVolts
  const [l1, l2, both] = [f.amount(one), f.amount(two), f.amount(across)]
  if (l1 !== undefined && l2 !== undefined) {
    const [low, high] = [Math.min(l1, l2) / n, Math.max(l1, l2) / n]
    const apart = high - low > (f.edges['legs-apart'] ?? 0)
    const from = both === undefined ? [one, two] : [one, two, across]
    const sum = (l1 + l2) / n
    const word =
      high < 0.1
        ? 'both-dead'
        : both !== undefined && both / n < 0.3 && low > 0.5
          ? 'same-phase'
          : low < 0.15 && (both === undefined || both / n < 1.5)
            ? 'one-dead'
            : both !== undefined && Math.abs(sum - both / n) > (f.edges['legs-sum'] ?? 0)
              ? 'not-twice'
              : apart
                ? high > (f.edges['legs-high'] ?? Infinity) && low < 1
                  ? 'opposite'
                  : 'apart'
                : 'equal'
    say('legs.pattern', word, from)
  }
  const [g1, g2] = [f.amount('panel.l1g.volts'), f.amount('panel.l2g.volts')]
  if (g1 !== undefined && g2 !== undefined) {
    const [low, high] = [Math.min(g1, g2) / n, Math.max(g1, g2) / n]
    const word =
      low < 0.1 && high > 0.7
        ? 'one-on-ground'
        : high - low > (f.edges['legs-apart'] ?? 0)
          ? 'apart'
          : 'equal'
    say('legs.ground', word, ['panel.l1g.volts', 'panel.l2g.volts'])
  }
}
