import type { Flat } from '../../rules/worksheets/address.ts'
import { sizesOf } from '../../rules/worksheets/wire.ts'
import type { Units } from '../../rules/worksheets/wire.ts'
import { circularMils } from '../../rules/worksheets/grounding-sizes/conductor-sizes.ts'
import { fieldsNow } from './forms/parts.ts'
import type { Form } from './forms/parts.ts'
import { readNumber } from './read-typed.ts'

const squareMillimetersPerCircularMil = 0.000506707
const areaOf = (units: Units, size: string): number | undefined => {
  if (units === 'metric') return Number(size)
  const mils = (circularMils as Readonly<Record<string, number>>)[size]
  return mils === undefined ? undefined : mils * squareMillimetersPerCircularMil
}

/** The size of the other table that is nearest in area. */
function nearestSize(size: string, from: Units, to: Units): string {
  const area = areaOf(from, size)
  if (area === undefined || !(area > 0)) return size
  const away = (other: string) => Math.abs(Math.log((areaOf(to, other) ?? Number.NaN) / area))
  return [...sizesOf(to)].sort((a, b) => away(a) - away(b))[0] ?? size
}

const rounded = (x: number, digits: number) => String(Number(x.toPrecision(digits)))

/** The same inputs in the other units: lengths converted, sizes the nearest there is. What can't be read stays. */
export function convertUnits(form: Form, values: Flat, from: Units, to: Units): Flat {
  if (from === to) return values
  const converted: Record<string, string> = { ...values }
  const factor = { along: 0.3048, across: 25.4 }
  for (const field of fieldsNow(form.groups(values, from), values)) {
    const text = values[field.name]
    if (text === undefined || field.is === undefined) continue
    if (field.is === 'size') converted[field.name] = nearestSize(text, from, to)
    else {
      const x = readNumber(text)
      if (x === undefined || Number.isNaN(x)) continue
      converted[field.name] = rounded(to === 'metric' ? x * factor[field.is] : x / factor[field.is], 3)
    }
  }
  return converted
}
