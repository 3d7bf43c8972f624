import { squareMillimeters, gauges } from '../../../rules/worksheets/wire.ts'
import type { Units } from '../../../rules/worksheets/wire.ts'
import { mostRows } from '../../../rules/worksheets/address.ts'
import type { Flat } from '../../../rules/worksheets/address.ts'

/** What a form is made of. `name` is the path of the value: `feeder.size`, `runs.0.amps`. */
export type NumberPart = {
  kind: 'number'
  name: string
  label: string
  /** Stands behind the number: "A", "ft". */
  unit: string
  help?: string
  /** What is often typed there, as buttons. */
  often?: readonly { label: string; value: string }[]
  /** What it measures, where the units of the sheet change it: along a run, or across a rod. */
  is?: 'along' | 'across'
  /** Not asked for now, but part of the inputs all the same. */
  hidden?: boolean
}
export type ChoicePart = {
  kind: 'choice'
  name: string
  label: string
  /** `ways`: side by side. `list`: big ones below each other. `select`: one of many. */
  look: 'ways' | 'list' | 'select'
  ways: readonly { value: string; label: string; note?: string }[]
  help?: string
  /** Other values that a choice brings with it. */
  brings?: Readonly<Record<string, Flat>>
  is?: 'size'
  hidden?: boolean
}
/** Two that belong together, side by side: least and most. */
type PairPart = {
  kind: 'pair'
  parts: readonly [NumberPart | ChoicePart, NumberPart | ChoicePart]
}
/** A row a thing: runs of wire, loads. */
export type RowsPart = {
  kind: 'rows'
  name: string
  /** "Run", "Load": each row is called so, with its number. */
  noun: string
  most: number
  /** What a new row begins with. */
  blank: Flat
  row: (at: string) => readonly FieldPart[]
}
export type FieldPart = NumberPart | ChoicePart | PairPart
type Part = FieldPart | RowsPart
export type Group = { title: string; help?: string; parts: readonly Part[] }

export type Form = {
  title: string
  /** What it answers, in a sentence or two. */
  lead: string
  /** Whether lengths and sizes can be in either unit. */
  hasUnits: boolean
  /** An example to begin with. */
  example: (units: Units) => Flat
  groups: (values: Flat, units: Units) => readonly Group[]
}

/** Names of the numbers among these parts. */
const fieldsOf = (parts: readonly FieldPart[]): (NumberPart | ChoicePart)[] =>
  parts.flatMap((part) => (part.kind === 'pair' ? [...part.parts] : [part]))

/** How many rows of a kind there are. */
export function rowCount(values: Flat, name: string): number {
  const rows = Object.keys(values)
    .filter((key) => key.startsWith(`${name}.`))
    .map((key) => Number(key.split('.')[1]))
    .filter((row) => Number.isInteger(row) && row < mostRows)
  return rows.length === 0 ? 0 : Math.max(...rows) + 1
}

/** Every field that stands on the page now. */
export const fieldsNow = (groups: readonly Group[], values: Flat): (NumberPart | ChoicePart)[] =>
  groups.flatMap(({ parts }) =>
    parts.flatMap((part) =>
      part.kind === 'rows'
        ? Array.from({ length: rowCount(values, part.name) }, (_, i) =>
            fieldsOf(part.row(`${part.name}.${i}`)),
          ).flat()
        : fieldsOf([part]),
    ),
  )

/** One of the wire sizes that the tables have. */
export const sizePart = (name: string, label: string, units: Units): ChoicePart => ({
  kind: 'choice',
  name,
  label,
  look: 'select',
  is: 'size',
  ways: (units === 'american' ? gauges : squareMillimeters).map((value) => ({
    value,
    label: `${value} ${units === 'american' ? 'AWG' : 'mm²'}`,
  })),
})

export const metalPart = (name: string, label = 'Metal'): ChoicePart => ({
  kind: 'choice',
  name,
  label,
  look: 'ways',
  ways: [
    { value: 'copper', label: 'Copper' },
    { value: 'aluminum', label: 'Aluminum' },
  ],
})

export const buildPart = (name: string): ChoicePart => ({
  kind: 'choice',
  name,
  label: 'Kind of wire',
  look: 'ways',
  ways: [
    { value: 'cable', label: 'Building cable' },
    { value: 'cord', label: 'Flexible cord' },
  ],
})

export const lengthPart = (name: string, label: string, units: Units, help?: string): NumberPart => ({
  kind: 'number',
  name,
  label,
  unit: units === 'american' ? 'ft' : 'm',
  is: 'along',
  ...(help !== undefined && { help }),
})

export const celsiusPart: NumberPart = {
  kind: 'number',
  name: 'celsius',
  label: 'Temperature of the wires',
  unit: '°C',
  help: 'Of the conductor itself. 75 °C (167 °F) for one that carries its full current; 20 °C (68 °F) for one that carries little.',
  often: [
    { label: '20', value: '20' },
    { label: '75', value: '75' },
  ],
}

/** A number field in short. */
export const number = (name: string, label: string, unit: string, help?: string): NumberPart => ({
  kind: 'number',
  name,
  label,
  unit,
  ...(help !== undefined && { help }),
})
/** Two fields side by side. */
export const pair = (one: NumberPart | ChoicePart, other: NumberPart | ChoicePart): FieldPart => ({
  kind: 'pair',
  parts: [one, other],
})
