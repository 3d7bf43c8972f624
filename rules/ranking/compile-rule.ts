import type { Comparison, Condition } from '../edition/condition.ts'
import type { Facts } from '../findings/facts.ts'

export type Holds = (facts: Facts) => boolean

function compileComparison({ fact, operator, value }: Comparison): Holds {
  if (operator === 'in') {
    const values = new Set(Array.isArray(value) ? value : [value])
    return (facts) => {
      const given = facts.get(fact)
      return given !== undefined && values.has(given.value)
    }
  }
  if (operator === 'equal') return (facts) => facts.get(fact)?.value === value
  const limit = Number(value)
  const order: Record<typeof operator, (x: number) => boolean> = {
    lessThan: (x) => x < limit,
    lessThanInclusive: (x) => x <= limit,
    greaterThan: (x) => x > limit,
    greaterThanInclusive: (x) => x >= limit,
  }
  const test = order[operator]
  return (facts) => {
    const given = facts.get(fact)?.value
    return typeof given === 'number' && test(given)
  }
}

/**
 * A rule's condition as a plain function. Next tests try hundreds of hypothetical outcomes, for which the
 * engine is too slow; a property test holds both to the same answer on random facts.
 */
export function compileCondition(condition: Condition): Holds {
  if ('fact' in condition) return compileComparison(condition)
  if ('all' in condition) {
    const parts = condition.all.map(compileCondition)
    return (facts) => parts.every((holds) => holds(facts))
  }
  const parts = condition.any.map(compileCondition)
  return (facts) => parts.some((holds) => holds(facts))
}
