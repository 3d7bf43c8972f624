import type { Level, Pattern, Supply } from './fact-names.ts'
import type { Findings } from './facts.ts'

type Edges = Readonly<Record<string, number>>
const edge = (edges: Edges, id: string): number => {
  const value = edges[id]
  if (value === undefined) throw new RangeError(`the edition has no edge ${id}`)
  return value
}

/** A voltage in named bands of the nominal one; every edge is the edition's. */
export function levelOf(volts: number, nominal: number, edges: Edges): Level {
  const r = volts / nominal
  if (r < edge(edges, 'level-nil')) return 'nil'
  if (r < edge(edges, 'level-trace')) return 'trace'
  if (r < edge(edges, 'level-part')) return 'part'
  if (r < edge(edges, 'level-half')) return 'half'
  if (r < edge(edges, 'level-sagging')) return 'sagging'
  if (r < edge(edges, 'level-low')) return 'low'
  if (r <= edge(edges, 'level-high')) return 'within'
  if (r <= edge(edges, 'level-over')) return 'high'
  return r < edge(edges, 'level-double') ? 'over' : 'double'
}

/**
 * Hot–neutral against the limits of this kind of source: a utility's own service limits (ANSI C84.1 range B on
 * 120 V), else ten per cent. Just inside a limit counts apart, since meters and days differ.
 */
export function supplyOf(volts: number, f: Findings): Supply {
  const american = f.source === 'utility' && f.nominalVolts === 120
  const low = edge(f.edges, american ? 'utility-low' : 'level-low')
  const high = edge(f.edges, american ? 'utility-high' : 'level-high')
  const near = edge(f.edges, 'supply-near')
  const r = volts / f.nominalVolts
  if (r < edge(f.edges, 'supply-far-low')) return 'far-low'
  if (r < low) return 'low'
  if (r < low + near) return 'lowish'
  if (r <= high - near) return 'within'
  if (r <= high) return 'highish'
  return r <= edge(f.edges, 'supply-far-high') ? 'high' : 'far-high'
}

/**
 * Names the picture that three volts of one place make (N and H are the ends of the rail, ground the lamp).
 * @param hn hot–neutral, volts; likewise hg, ng
 */
export function patternOf(hn: number, hg: number, ng: number, nominal: number, edges: Edges): Pattern {
  const [h, g, n] = [hn / nominal, hg / nominal, ng / nominal]
  const live = edge(edges, 'pattern-live')
  const near = (x: number, to: number) => Math.abs(x - to) <= edge(edges, 'pattern-near')
  if (Math.max(h, g, n) < edge(edges, 'pattern-dead')) return 'dead'
  if (near(h, 2) && near(g, 1) && near(n, 1)) return 'across-legs'
  if (near(g, 2) && near(h, 1) && near(n, 1)) return 'other-leg'
  if (h < edge(edges, 'pattern-none') && g > live && n > live) return 'needle'
  if (h < 0.5) {
    if (g > live && n < live) return 'neutral-untied'
    if (n < edge(edges, 'pattern-none') && g < live) return 'hot-untied'
    return 'off-line'
  }
  const [a, b] = [ng / hn, hg / hn]
  const on = edge(edges, 'pattern-on')
  if (a <= on && Math.abs(b - 1) <= edge(edges, 'pattern-rest')) return 'on-neutral'
  if (b <= on && Math.abs(a - 1) <= edge(edges, 'pattern-rest')) return 'on-hot'
  if (a < edge(edges, 'pattern-nowhere') && b < edge(edges, 'pattern-nowhere')) return 'nowhere'
  const closes = edge(edges, 'pattern-closes')
  if (Math.abs(b - a - 1) <= closes) return 'beyond-neutral'
  if (Math.abs(a - b - 1) <= closes) return 'beyond-hot'
  if (a > live && b > live) return 'three-live'
  const sum = a + b
  if (sum > 1 + closes) return 'off-line'
  if (sum >= 1 - closes) return Math.abs(a - b) <= edge(edges, 'pattern-even') ? 'half' : 'uneven'
  if (sum >= edge(edges, 'pattern-just')) return 'just-short'
  return sum >= edge(edges, 'pattern-far') ? 'short' : 'far-short'
}
