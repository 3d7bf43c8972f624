import type { Edition } from '../edition/open.ts'
import type { Cause } from '../edition/schema.ts'
import type { Context } from '../findings/sheet.ts'

export type Priors = 'flat' | 'field'

/** What can't be is excluded under every prior: two hots on two wires, for one. */
function isPossible(cause: Cause, context: Context): boolean {
  const { possible } = cause
  return (
    (possible?.sources?.includes(context.source) ?? true) &&
    (possible?.systems?.includes(context.system) ?? true) &&
    (possible?.wirings?.includes(context.wiring) ?? true)
  )
}

/** Prior weights by cause index, 0 where excluded: flat over the electrical causes, or the edition's own. */
export function priorWeights(edition: Edition, context: Context, priors: Priors): number[] {
  return edition.file.causes.map((cause) => {
    if (!isPossible(cause, context)) return 0
    if (priors === 'flat') return cause.electrical ? 1 : 0
    return cause.weightBySource?.[context.source] ?? cause.weight
  })
}

/** Two to a whole power, by doubling and halving: exact, and the same in every runtime. */
export function powerOfTwo(n: number): number {
  let p = 1
  for (let i = 0; i < n; i++) p *= 2
  for (let i = 0; i > n; i--) p /= 2
  return p
}

/** Shares that add to 1: each prior weight doubled or halved once for every bit. */
export function sharesOf(weights: readonly number[], bits: readonly number[]): number[] {
  // Counted from the best, so that neither end of a long ledger overflows or vanishes altogether.
  const best = Math.max(...bits.filter((_, i) => (weights[i] ?? 0) > 0))
  const raw = weights.map((w, i) => (w === 0 ? 0 : w * powerOfTwo((bits[i] ?? 0) - best)))
  const sum = raw.reduce((a, b) => a + b, 0)
  return raw.map((r) => r / sum)
}
