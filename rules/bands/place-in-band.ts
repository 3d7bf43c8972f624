/** Where a reading lies in the band that a cause lets one expect. */
import { overLimitOhms } from '../findings/sheet.ts'

/** Lowest and highest expected value, in the reading's own unit. */
export type Edges = { low: number; high: number }

export type Placed = {
  /** Parts of the drawn scale, 0 … 1. */
  from: number
  to: number
  /** Undefined while nothing is read. */
  at: number | undefined
  /** Beyond the band by more than the instrument's own error. */
  outside: 'below' | 'above' | undefined
  /** "110 to 125 V". */
  words: string
}

/** A meter's error beside the band: 2 % and three counts of its last digit at the usual ranges. */
const errorOf = (value: number, unit: string): number =>
  0.02 * Math.abs(value) +
  (unit === 'V' ? 0.3 : unit === 'A' || unit === 'Ω' ? 0.1 : unit === 'Hz' ? 0.1 : 0.3)

const isOhms = (unit: string): boolean => unit === 'Ω' || unit === 'MΩ'
const digits = (x: number): string => {
  const size = Math.abs(x)
  if (size >= 99.5) return String(Math.round(x))
  return size >= 9.95 ? String(Math.round(x)) : String(Number(x.toFixed(size >= 0.95 ? 1 : 2)))
}
function amount(value: number, unit: string): string {
  if (isOhms(unit) && value >= overLimitOhms) return 'over limit'
  if (unit === 'Ω' && value >= 1e6) return `${digits(value / 1e6)} MΩ`
  if (unit === 'Ω' && value >= 1e3) return `${digits(value / 1e3)} kΩ`
  return `${digits(value)} ${unit}`
}

/** "110 to 125 V", "0.2 Ω to over limit", "120 V". */
export function bandWords({ low, high }: Edges, unit: string): string {
  const [a, b] = [amount(low, unit), amount(high, unit)]
  if (a === b) return a
  const [unitA, unitB] = [a.slice(a.lastIndexOf(' ')), b.slice(b.lastIndexOf(' '))]
  return unitA === unitB ? `${a.slice(0, -unitA.length)} to ${b}` : `${a} to ${b}`
}

/** Ohms span from a joint to over limit, so their scale goes by orders of magnitude. */
const onScale = (value: number, unit: string): number =>
  isOhms(unit) ? Math.log10(Math.max(0.05, Math.min(value, overLimitOhms))) : value

/**
 * Places a band, and a reading where there is one, on a scale that holds both.
 * @param full where the scale ends, in the unit: a fifth over the system's volts, say; it grows with what is placed
 */
export function placeInBand(band: Edges, unit: string, full: number, value: number | undefined): Placed {
  const low = Math.max(0, band.low - errorOf(band.low, unit))
  const high = band.high + errorOf(band.high, unit)
  const outside = value === undefined ? undefined : value < low ? 'below' : value > high ? 'above' : undefined
  const begin = unit === 'Hz' ? 0.9 * Math.min(band.low, value ?? Infinity) : isOhms(unit) ? 0.05 : 0
  const end = isOhms(unit) ? overLimitOhms : Math.max(full, 1.05 * band.high, 1.05 * (value ?? 0))
  const [a, b] = [onScale(begin, unit), onScale(end, unit)]
  const part = (x: number) => Math.min(1, Math.max(0, (onScale(x, unit) - a) / (b - a)))
  return {
    from: part(band.low),
    to: part(band.high),
    at: value === undefined ? undefined : part(value),
    outside,
    words: bandWords(band, unit),
  }
}
