import { fitsContext } from '../edition/open.ts'
import type { Edition } from '../edition/open.ts'
import { defaultMeterOhms, overLimitOhms } from './sheet.ts'
import type { Context, Sheet, Taken, TakenReading } from './sheet.ts'

/** Field path → one plain sentence. */
export type FieldErrors = Record<string, string>
export type Read = { ok: true; sheet: Sheet } | { ok: false; errors: FieldErrors }

const isObject = (x: unknown): x is Record<string, unknown> =>
  typeof x === 'object' && x !== null && !Array.isArray(x)
const isNumber = (x: unknown): x is number => typeof x === 'number' && Number.isFinite(x)
const listed = (ids: Iterable<string>) => [...ids].join(', ')

function readContext(edition: Edition, raw: unknown, errors: FieldErrors): Context {
  const given = isObject(raw) ? raw : {}
  const one = (field: string, known: Iterable<string>): string => {
    const value = given[field]
    const ids = [...known]
    if (typeof value === 'string' && ids.includes(value)) return value
    errors[`context.${field}`] =
      value === undefined
        ? `${field} is missing: one of ${listed(ids)}`
        : `${field} must be one of ${listed(ids)}`
    return ids[0] ?? ''
  }
  const source = one('source', edition.sources.keys())
  const system = one('system', edition.systems.keys())
  const wiring = one('wiring', edition.wirings)
  const ownMode = edition.sources.get(source)?.modes[0] ?? ''
  const mode = given['mode'] === undefined ? ownMode : one('mode', edition.modes)
  const ohms = given['meterOhms']
  if (ohms !== undefined && !(isNumber(ohms) && ohms > 0))
    errors['context.meterOhms'] = 'meterOhms must be a number of ohms above 0'
  return { source, system, wiring, mode, meterOhms: isNumber(ohms) && ohms > 0 ? ohms : defaultMeterOhms }
}

type Amount = Pick<TakenReading, 'value' | 'overLimit' | 'between' | 'earlier'> & { meterOhms?: number }

/** A reading as typed: a number, or on the screens with its instrument, wandering or over limit. */
function readAmount(raw: unknown, detailed: boolean): Amount | string {
  if (typeof raw === 'number') {
    if (!Number.isFinite(raw)) return 'must be a finite number'
    if (raw < 0) return 'must be 0 or more: type the size, without a sign'
    return { value: raw, overLimit: raw >= overLimitOhms, between: undefined }
  }
  if (!detailed || !isObject(raw)) return raw === null ? 'must be a number, not null' : 'must be a number'
  const own = raw['meterOhms']
  if (own !== undefined && !(isNumber(own) && own > 0))
    return 'the instrument’s resistance must be above 0 ohms'
  const earlier = readEarlier(raw['earlier'])
  if (typeof earlier === 'string') return earlier
  const meter = { ...(isNumber(own) ? { meterOhms: own } : {}), ...(earlier ? { earlier } : {}) }
  if (raw['overLimit'] === true)
    return { value: overLimitOhms, overLimit: true, between: undefined, ...meter }
  const between = raw['between']
  if (Array.isArray(between)) {
    const [a, b] = between as unknown[]
    if (!isNumber(a) || !isNumber(b) || a < 0 || b < 0) return 'unsteady takes two numbers of 0 or more'
    const ends = [Math.min(a, b), Math.max(a, b)] as const
    return { value: (a + b) / 2, overLimit: false, between: ends, ...meter }
  }
  const plain = readAmount(raw['value'], false)
  return typeof plain === 'string' ? plain : { ...plain, ...meter }
}

/** What another instrument showed before. */
function readEarlier(raw: unknown): TakenReading['earlier'] | string {
  if (raw === undefined) return undefined
  const { value, meterOhms } = isObject(raw) ? raw : {}
  if (!isNumber(value) || value < 0) return 'the reading before must be a number of 0 or more'
  if (!isNumber(meterOhms) || meterOhms <= 0) return 'the instrument before must have ohms above 0'
  return { value, meterOhms }
}

function readFinding(
  edition: Edition,
  context: Context,
  mode: string,
  id: string,
  raw: unknown,
  detailed: boolean,
): Taken | string {
  const reading = edition.readings.get(id)
  if (reading !== undefined) {
    if (!fitsContext(reading, context))
      return `can’t be taken here: ${context.system} V system, wiring ${context.wiring}`
    const amount = readAmount(raw, detailed)
    if (typeof amount === 'string') return amount
    const overLimit = amount.overLimit && (reading.unit === 'Ω' || reading.unit === 'MΩ')
    return {
      kind: 'reading',
      id,
      mode,
      value: amount.value,
      unit: reading.unit,
      place: reading.place,
      pair: reading.pair,
      loaded: reading.loaded === true,
      meterOhms: amount.meterOhms ?? context.meterOhms,
      overLimit,
      between: amount.between,
      ...(amount.earlier === undefined ? {} : { earlier: amount.earlier }),
    }
  }
  const observation = edition.observations.get(id)
  if (observation === undefined) return 'is not a finding of this edition'
  const values = observation.values.map((v) => v.id)
  if (typeof raw === 'string' && values.includes(raw)) return { kind: 'observation', id, mode, value: raw }
  return `must be one of ${listed(values)}`
}

function readFindings(
  edition: Edition,
  context: Context,
  mode: string,
  at: string,
  raw: unknown,
  detailed: boolean,
  errors: FieldErrors,
): Taken[] {
  if (raw === undefined) return []
  if (!isObject(raw)) {
    errors[at] = 'must be an object of finding → value'
    return []
  }
  const taken: Taken[] = []
  for (const [id, value] of Object.entries(raw)) {
    const one = readFinding(edition, context, mode, id, value, detailed)
    if (typeof one === 'string') errors[`${at}.${id}`] = one
    else taken.push(one)
  }
  return taken
}

function read(edition: Edition, raw: Record<string, unknown>, detailed: boolean): Read {
  const errors: FieldErrors = {}
  const context = readContext(edition, raw['context'], errors)
  const taken = readFindings(edition, context, context.mode, 'findings', raw['findings'], detailed, errors)
  const others = raw['otherModes']
  if (others !== undefined && !isObject(others)) errors['otherModes'] = 'must be an object of mode → findings'
  else
    for (const [mode, findings] of Object.entries(others ?? {})) {
      const at = `otherModes.${mode}`
      if (edition.modes.has(mode))
        taken.push(...readFindings(edition, context, mode, at, findings, detailed, errors))
      else errors[at] = `mode must be one of ${listed(edition.modes)}`
    }
  return Object.keys(errors).length > 0 ? { ok: false, errors } : { ok: true, sheet: { context, taken } }
}

/** Reads a sheet from the screens or the store: readings may carry instrument, two numbers, over limit. */
export function readSheet(edition: Edition, raw: unknown): Read {
  return isObject(raw) ? read(edition, raw, true) : { ok: false, errors: { '': 'must be a findings sheet' } }
}

export type ReadCase =
  { ok: true; id: string; sheet: Sheet } | { ok: false; id: string | null; errors: FieldErrors }

/** Reads one line of a case file (`contract.md`, "Reading a case"): every reading is a plain number. */
export function readCase(edition: Edition, raw: unknown): ReadCase {
  if (!isObject(raw)) return { ok: false, id: null, errors: { '': 'must be a JSON object' } }
  const id = typeof raw['id'] === 'string' && raw['id'] !== '' ? raw['id'] : null
  const result = read(edition, raw, false)
  const errors = {
    ...(id === null ? { id: 'id must be a string that is not empty' } : {}),
    ...(result.ok ? {} : result.errors),
  }
  return id !== null && result.ok ? { ok: true, id, sheet: result.sheet } : { ok: false, id, errors }
}
