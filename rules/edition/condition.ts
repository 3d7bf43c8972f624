/**
 * Conditions of rules: json-rules-engine's own shape, cut down to what stays silent on a fact nobody gave.
 * No negation, no `condition`, `path`, `params` or `priority`; values are literals.
 */
import * as z from 'zod/mini'

const operators = [
  'equal',
  'in',
  'lessThan',
  'lessThanInclusive',
  'greaterThan',
  'greaterThanInclusive',
] as const
export type Operator = (typeof operators)[number]

const Literal = z.union([z.string(), z.number(), z.boolean()])
export type Literal = z.infer<typeof Literal>

export type Comparison = { fact: string; operator: Operator; value: Literal | Literal[] }
export type Condition = Comparison | { all: Condition[] } | { any: Condition[] }

const Comparison = z.strictObject({
  fact: z.string().check(z.minLength(1)),
  operator: z.enum(operators),
  value: z.union([Literal, z.array(Literal).check(z.minLength(1))]),
})

const maxDepth = 4
const maxComparisons = 32

const Tree: z.ZodMiniType<Condition> = z.lazy(() =>
  z.union([
    Comparison,
    z.strictObject({ all: z.array(Tree).check(z.minLength(1)) }),
    z.strictObject({ any: z.array(Tree).check(z.minLength(1)) }),
  ]),
)

const children = (c: Condition): Condition[] => ('all' in c ? c.all : 'any' in c ? c.any : [])
const depth = (c: Condition): number => 1 + Math.max(0, ...children(c).map(depth))

/** Every comparison in a condition, in reading order. */
export const comparisons = (c: Condition): Comparison[] =>
  'fact' in c ? [c] : children(c).flatMap(comparisons)

export const Condition = Tree.check(
  z.refine((c) => depth(c) <= maxDepth, `conditions nest at most ${maxDepth} deep`),
  z.refine((c) => comparisons(c).length <= maxComparisons, `at most ${maxComparisons} comparisons a rule`),
  z.refine(
    (c) => comparisons(c).every((p) => (p.operator === 'in') === Array.isArray(p.value)),
    '`in` takes a list, every other operator a single value',
  ),
  z.refine(
    (c) =>
      comparisons(c).every(
        (p) => p.operator === 'equal' || p.operator === 'in' || typeof p.value === 'number',
      ),
    'orders compare with numbers',
  ),
)
