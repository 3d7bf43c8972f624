/** Numbers as they are written in a result: three significant digits, no exponents. */

/**
 * "0.0965", "11.4", "1,670": as many digits as say something.
 * @param digits significant ones
 */
export function written(x: number, digits = 3): string {
  if (!Number.isFinite(x)) return Number.isNaN(x) ? 'not known' : 'without limit'
  if (x === 0) return '0'
  const places = Math.max(0, Math.min(12, digits - 1 - Math.floor(Math.log10(Math.abs(x)))))
  const rounded = places > 0 ? x.toFixed(places) : String(Math.round(x))
  const [whole = '', part = ''] = rounded.split('.')
  const grouped = whole.replace(/\B(?=(\d{3})+$)/g, ',')
  const kept = part.replace(/0+$/, '')
  return kept === '' ? grouped : `${grouped}.${kept}`
}

/** A time in its best unit: "0.025 s", "2 min", "1 h". */
export function inTime(seconds: number): string {
  if (seconds >= 7200) return `${written(seconds / 3600, 2)} h`
  if (seconds === 3600) return '1 h'
  if (seconds >= 120) return `${written(seconds / 60, 2)} min`
  return `${written(seconds, 2)} s`
}

/** "0.01 to 10 s", "at least 2 min", "0.05 s or less", "never". */
export function inTimes({ fromSeconds, toSeconds }: Times): string {
  if (fromSeconds === Infinity) return 'never'
  if (toSeconds === Infinity)
    return fromSeconds === 0 ? 'any time or never' : `${inTime(fromSeconds)} or later`
  if (fromSeconds <= 0.011) return `${inTime(toSeconds)} or less`
  return inTime(fromSeconds) === inTime(toSeconds)
    ? inTime(toSeconds)
    : `${inTime(fromSeconds)} to ${inTime(toSeconds)}`
}

/** When something happens: the soonest and the latest, Infinity for "not at all". */
export type Times = { fromSeconds: number; toSeconds: number }

/** "25 to 50", or one number where both are written alike. */
export const between = (least: number, most: number): string =>
  written(least) === written(most) ? written(most) : `${written(least)} to ${written(most)}`
