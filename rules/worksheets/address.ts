import type { InputsOf, WorksheetName } from './worksheets.ts'

/** Inputs as an address carries them: the path of each value (`feeder.size`, `runs.0.amps`) and its text. */
export type Flat = Readonly<Record<string, string>>

/** Lays nested inputs flat. Values that are undefined are left out. */
export function flat(inputs: unknown, under = ''): Flat {
  if (inputs === undefined || inputs === null) return {}
  if (typeof inputs !== 'object') return { [under]: String(inputs) }
  const parts = Object.entries(inputs).map(([key, value]) =>
    flat(value, under === '' ? key : `${under}.${key}`),
  )
  return Object.assign({}, ...parts) as Flat
}

/** More rows than any worksheet takes: an address from elsewhere makes no endless lists. */
export const mostRows = 32
type Nested = { [key: string]: unknown }

/** Builds nested inputs from flat ones; steps that are whole numbers make lists. Names of the language are refused. */
export function nested(values: Readonly<Record<string, unknown>>): Nested {
  const root = Object.create(null) as Nested
  for (const [path, value] of Object.entries(values)) {
    const steps = path.split('.')
    if (steps.some((step) => step === '' || /^(__proto__|constructor|prototype)$/.test(step))) continue
    if (steps.some((step) => /^\d+$/.test(step) && Number(step) >= mostRows)) continue
    let at: Nested = root
    steps.slice(0, -1).forEach((step, i) => {
      const list = /^\d+$/.test(steps[i + 1] ?? '')
      if (typeof at[step] !== 'object' || at[step] === null) at[step] = list ? [] : {}
      at = at[step] as Nested
    })
    at[steps.at(-1)!] = value
  }
  return { ...root }
}

/**
 * The address of a worksheet filled in with these inputs, without a host: for a service call, a report, a link.
 */
export function worksheetAddress<Name extends WorksheetName>(name: Name, inputs: InputsOf[Name]): string {
  return `/worksheets/${name}?${queryOf(flat(inputs))}`
}

/** What stands after the question mark. */
export const queryOf = (values: Flat): string =>
  Object.entries(values)
    .map(([key, value]) => `${encodeURIComponent(key)}=${encodeURIComponent(value)}`)
    .join('&')
