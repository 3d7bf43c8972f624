/** How a fault to a part's metal gets back to the live source. */
import type { Circuit } from './circuit.ts'
import type { PowerPart } from './system.ts'

/** `metal`: by wire to a bond in circuit; `soil`: by rods alone; `none`. */
export function groundPathOf(circuit: Circuit, { id }: PowerPart): 'metal' | 'soil' | 'none' {
  const { ground, bonds, wiring } = circuit
  const { point } = wiring
  const own = ground.of(point(id))
  const ends = new Set(bonds.map(({ part }) => ground.of(point(part.id))))
  if (ends.has(own)) return 'metal'
  const rods = new Set(wiring.rods.map(({ at }) => ground.of(point(at))))
  return rods.has(own) && [...ends].some((end) => rods.has(end)) ? 'soil' : 'none'
}
