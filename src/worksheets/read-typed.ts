import { nested } from '../../rules/worksheets/address.ts'
import type { Flat } from '../../rules/worksheets/address.ts'
import type { Units } from '../../rules/worksheets/wire.ts'
import { fieldsNow } from './forms/parts.ts'
import type { Form } from './forms/parts.ts'

const grouped = /^[-+]?\d{1,3}(,\d{3})+(\.\d*)?$/
const plain = /^[-+]?(\d+\.?\d*|\.\d+)$/

/** A number as typed: "1,000" is a thousand, "2,5" is not read. NaN for what is no number, undefined for nothing. */
export function readNumber(text: string): number | undefined {
  const typed = text.trim().replace('−', '-')
  if (typed === '') return undefined
  return plain.test(typed)
    ? Number(typed)
    : grouped.test(typed)
      ? Number(typed.replace(/,/g, ''))
      : Number.NaN
}

/** What a worksheet computes with: the fields that stand on the page, numbers read. */
export function readTyped(form: Form, values: Flat, units: Units): unknown {
  const typed: Record<string, unknown> = form.hasUnits ? { units } : {}
  for (const field of fieldsNow(form.groups(values, units), values)) {
    const text = values[field.name]
    typed[field.name] = text !== undefined && field.kind === 'number' ? readNumber(text) : text
  }
  return nested(typed)
}

/** Fields and what they are called in a list of what is still to mend: "Breaker: Rating", "Run 2: Size". */
export function labelsOf(form: Form, values: Flat, units: Units): ReadonlyMap<string, string> {
  const labels = new Map<string, string>()
  for (const group of form.groups(values, units)) {
    const rows = group.parts.find((part) => part.kind === 'rows')
    for (const { name, label } of fieldsNow([group], values)) {
      const row = rows && name.startsWith(`${rows.name}.`) ? Number(name.split('.')[1]) + 1 : undefined
      labels.set(name, `${row === undefined ? group.title : `${rows?.noun ?? ''} ${row}`}: ${label}`)
    }
  }
  return labels
}
