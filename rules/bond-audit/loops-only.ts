import type { Branch } from '../circuit/network.ts'

/**
 * A network without its dead ends: wires in which no loop closes carry nothing but the load at their end.
 * @param keep nodes that stay whatever hangs there
 * @returns the branches left, and for every node the one from which it hung
 */
export function withoutDeadEnds(
  branches: readonly Branch[],
  keep: ReadonlySet<string>,
): { branches: Branch[]; hangsFrom: (node: string) => string } {
  const at = new Map<string, Set<Branch>>()
  for (const branch of branches)
    for (const end of [branch.from, branch.to]) {
      const here = at.get(end)
      if (here === undefined) at.set(end, new Set([branch]))
      else here.add(branch)
    }
  const hung = new Map<string, string>()
  const ends = [...at].filter(([node, here]) => here.size === 1 && !keep.has(node)).map(([node]) => node)
  for (let node = ends.pop(); node !== undefined; node = ends.pop()) {
    const [last] = at.get(node) ?? []
    if (last === undefined) continue
    const next = last.from === node ? last.to : last.from
    hung.set(node, next)
    at.delete(node)
    const there = at.get(next)
    there?.delete(last)
    if (there?.size === 1 && !keep.has(next)) ends.push(next)
  }
  const left = new Set([...at.values()].flatMap((here) => [...here]))
  return {
    branches: branches.filter((branch) => left.has(branch)),
    hangsFrom: (node) => {
      let from = node
      for (let next = hung.get(from); next !== undefined; next = hung.get(from)) from = next
      return from
    },
  }
}
