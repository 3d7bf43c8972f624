import * as z from 'zod/mini'

/** A bound as it is written in a sentence: "10,000". */
const bound = (x: number) => String(x).replace(/\B(?=(\d{3})+$)/g, ',')

/**
 * A number in a unit, between bounds, with one sentence for whatever else is typed.
 * @param unit in words, as it follows "Type": "feet", "volts to ground"
 */
export function quantity(unit: string, min: number, max: number) {
  const error = `Type ${unit}: a number from ${bound(min)} to ${bound(max)}.`
  return z.number({ error }).check(z.gte(min, { error }), z.lte(max, { error }))
}

/** The same, whole numbers only. */
export function count(of: string, min: number, max: number) {
  const error = `Type ${of}: a whole number from ${bound(min)} to ${bound(max)}.`
  return z.int({ error }).check(z.gte(min, { error }), z.lte(max, { error }))
}

/** For a choice that decides what else is asked. */
export const chooseOne = { error: 'Choose one of these.' } as const

/** One of a few words. */
export const oneOf = <const Values extends readonly [string, ...string[]]>(values: Values) =>
  z.enum(values, chooseOne)

/**
 * One row or more of a kind.
 * @param one "a run"
 */
export function rows<Row extends z.core.$ZodType>(row: Row, one: string, most: number) {
  const error = `Add ${one}: from 1 to ${most} of them.`
  return z.array(row, { error }).check(z.minLength(1, { error }), z.maxLength(most, { error }))
}

type Issues = { value: unknown; issues: unknown[] }
/** Adds a sentence to one field, for what only two fields together show. */
export function mend(payload: Issues, path: readonly (string | number)[], message: string): void {
  payload.issues.push({ code: 'custom', input: payload.value, path: [...path], message })
}
