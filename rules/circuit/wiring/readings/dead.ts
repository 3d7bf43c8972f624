import { overLimitOhms } from '../../../findings/sheet.ts'
import { ohmsBetween } from '../../instruments/ohmmeter.ts'
import type { Network, Node } from '../../network.ts'
import { factor } from '../../solve.ts'
import type { Factored } from '../../solve.ts'
import { hasPanel } from '../context.ts'
import { disconnected, lifted, mainOpen } from '../states.ts'
import type { Found, Measured } from './measured.ts'

/** Ohms, each with what is lifted for it. */
export function deadOhms({ context, dead }: Measured, found: Found): void {
  const off = dead()
  const all = ohmsFrom(off, 'receptacle.ground')
  found['receptacle.ng.ohms'] = all('receptacle.neutral')
  found['receptacle.hg.ohms'] = all('receptacle.hot')
  const source = ohmsFrom(lifted(off, disconnected(context)), 'source.case')
  found['source.ng.ohms'] = source('source.neutral')
  if (!hasPanel(context)) return
  const panel = ohmsFrom(lifted(off, mainOpen), 'panel.ground')
  found['panel.ng.ohms'] = panel('panel.neutral')
  found['branch.egc.ohms'] = panel('receptacle.ground')
}

/**
 * Ohms from one point to others. What no wire joins to it is over limit without solving anything, and only what
 * is joined is solved.
 */
function ohmsFrom(dead: Network, from: Node): (to: Node) => number {
  const nodes = joinedTo(dead, from)
  let solved: Factored | undefined
  return (to) => {
    if (!nodes.has(to)) return overLimitOhms
    solved ??= factor({
      hertz: 0,
      branches: dead.branches.filter((b) => b.kind !== 'capacitance' && nodes.has(b.from)),
    })
    return ohmsBetween(solved, from, to)
  }
}

/** Every node that wires, windings and loads join to this one, earth among them. */
function joinedTo({ branches }: Network, start: Node): ReadonlySet<Node> {
  const neighbors = new Map<Node, Node[]>()
  const put = (a: Node, b: Node) => {
    const known = neighbors.get(a)
    if (known === undefined) neighbors.set(a, [b])
    else known.push(b)
  }
  for (const { kind, from, to } of branches) {
    if (kind === 'capacitance') continue
    put(from, to)
    put(to, from)
  }
  const joined = new Set([start])
  // A set is walked in the order of its growth.
  for (const node of joined) for (const next of neighbors.get(node) ?? []) joined.add(next)
  return joined
}
