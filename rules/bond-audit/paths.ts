/** Ways through a circuit: from a part back to its source, and past ground-fault protection. */
import type { Circuit } from './circuit.ts'
import type { PowerPart } from './system.ts'
import type { Bond, FeedAt, Wiring } from './wiring.ts'

/** The runs between the live source and a part, the source's first. */
export function wayTo({ carrying, live }: Circuit, part: PowerPart): FeedAt[] {
  const way: FeedAt[] = []
  for (let at = carrying.find(({ to }) => to.id === part.id); at !== undefined;) {
    way.unshift(at)
    const { from } = at.feed
    at = live.some(({ id }) => id === from) ? undefined : carrying.find(({ to }) => to.id === from)
  }
  return way
}

/** The first panel on the way to anything: where a source's bond may be, other than in the source. */
export const firstPanels = (circuit: Circuit): PowerPart[] => [
  ...new Set(
    circuit.places.flatMap((place) => {
      const first = wayTo(circuit, place).find(({ to }) => to.kind === 'panel')
      return first === undefined ? [] : [first.to]
    }),
  ),
]

/** Whether utility can feed a part, however the switches stand: then a bond in it is on utility's neutral as well. */
export function utilityReaches({ parts, feeds }: Wiring, partId: string): boolean {
  const seen = new Set<string>()
  const ahead = [partId]
  for (let id = ahead.pop(); id !== undefined; id = ahead.pop()) {
    if (seen.has(id)) continue
    seen.add(id)
    const part = parts.get(id)
    if (part?.kind === 'source' && part.type === 'utility') return true
    // Behind a transformer the neutral is another.
    if (part?.kind !== 'transformer')
      for (const { to, feed } of feeds) if (to.id === id) ahead.push(feed.from)
  }
  return false
}

/** Ground-fault protection that the live current passes, with the runs behind it. */
function protections(circuit: Circuit): { at: PowerPart; behind: readonly FeedAt[] }[] {
  const { carrying, live, wiring } = circuit
  const found: { at: PowerPart; behind: readonly FeedAt[] }[] = []
  for (const source of live)
    if (source.kind === 'source' && source.gfci && wiring.builtIn(source.id) === undefined)
      found.push({ at: source, behind: wiring.feeds.filter(({ feed }) => feed.from === source.id) })
  for (const run of carrying) {
    const from = wiring.parts.get(run.feed.from)
    if (run.feed.gfci && from !== undefined) found.push({ at: from, behind: [run] })
    const { to } = run
    if (to.kind === 'receptacle' && to.gfci) found.push({ at: to, behind: wiring.leaving(to.id) })
    // That of an inverter is at its output, past its own transfer switch and its bond.
    const inverter =
      to.kind === 'switch' && to.inverter !== undefined ? wiring.parts.get(to.inverter) : undefined
    if (inverter?.kind === 'source' && inverter.gfci && wiring.builtIn(inverter.id)?.switch.id === to.id)
      found.push({ at: inverter, behind: wiring.leaving(to.id) })
  }
  return found.filter(({ behind }) => behind.length > 0)
}

/** Each ground-fault protection with a bond ahead of it and another behind: neutral current goes round it. */
export function straddled(circuit: Circuit): { at: PowerPart; ahead: Bond[]; behind: Bond[] }[] {
  if (circuit.bonds.length < 2) return []
  return protections(circuit).flatMap(({ at, behind: runs }) => {
    const isAhead = circuit.onNeutralBut(runs)
    const ahead = circuit.bonds.filter(({ onto }) => isAhead(circuit.wiring.point(onto)))
    const behind = circuit.bonds.filter((bond) => !ahead.includes(bond))
    return ahead.length > 0 && behind.length > 0 ? [{ at, ahead, behind }] : []
  })
}

/** Whether there is ground-fault protection anywhere on the way to a part, or in it. */
export function isProtected(circuit: Circuit, part: PowerPart): boolean {
  if (part.kind === 'receptacle' && part.gfci) return true
  const behind = new Set(protections(circuit).flatMap(({ behind: runs }) => runs.map(({ key }) => key)))
  return wayTo(circuit, part).some(({ key }) => behind.has(key))
}
