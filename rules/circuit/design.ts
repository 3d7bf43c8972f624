/** Points to look at in many ranges at once: corners in which every pair of ranges meets every way, and inner ones. */
import { isRange } from './wiring/parameters.ts'
import type { Choice, Parameters, Range, Ranges } from './wiring/parameters.ts'

type One = Range | Choice<unknown>

/**
 * Corners by columns of a Hadamard matrix: column c of point i is the parity of the bits that i and c share. Any two
 * different columns take all four combinations equally often (a fractional factorial of strength two).
 */
const upper = (point: number, column: number): boolean => {
  let shared = point & column
  let odd = false
  for (; shared > 0; shared >>= 1) if ((shared & 1) === 1) odd = !odd
  return odd
}

/** The digits of n in this base, mirrored behind the point: fills 0 to 1 evenly (Halton 1960). */
function halton(n: number, base: number): number {
  let [sum, part] = [0, 1]
  for (let left = n; left > 0; left = Math.floor(left / base)) {
    part /= base
    sum += part * (left % base)
  }
  return sum
}

function atPart(one: Range, part: number): number {
  return one.spread === 'log' ? one.low * (one.high / one.low) ** part : one.low + (one.high - one.low) * part
}

/**
 * A range's value in a corner. What is mostly absent is absent in half of the corners, so that the other half shows
 * what it does; what is now and then absent is there.
 */
function corner(one: One, point: number, column: number, columns: number): unknown {
  const high = upper(point, column)
  const next = upper(point, 1 + (column % columns))
  // More than two options: the next column decides as well.
  if (!isRange(one)) return one.options[(Number(high) + 2 * Number(next)) % one.options.length]?.value
  if (one.absent === undefined || one.absent < 0.5) return high ? one.high : one.low
  if (one.absent === 1 || !high) return 0
  return next ? one.high : one.low
}

const primes = [2, 3, 5, 7, 11, 13, 17, 19, 23, 29, 31, 37, 41, 43, 47, 53]

function inner(one: One, n: number, dimension: number): unknown {
  const part = (halton(n, primes[dimension % primes.length] ?? 2) + dimension * 0.618) % 1
  if (!isRange(one)) return one.options[Math.floor(part * one.options.length)]?.value
  if (one.absent !== undefined && part < one.absent) return 0
  return atPart(one, one.absent === undefined ? part : (part - one.absent) / (1 - one.absent))
}

const made = (ranges: Ranges, value: (one: One, index: number) => unknown): Parameters =>
  Object.fromEntries(
    Object.entries(ranges).map(([name, one], index) => [name, value(one as One, index)]),
  ) as Parameters

/**
 * Parameters at which to look into these ranges.
 * @param corners a power of two: that many corners
 * @param inners how many points inside
 */
export function pointsIn(ranges: Ranges, corners: number, inners: number): Parameters[] {
  const columns = corners - 1
  return [
    ...Array.from({ length: corners }, (_, point) =>
      made(ranges, (one, index) => corner(one, point, 1 + (index % columns), columns)),
    ),
    ...Array.from({ length: inners }, (_, n) => made(ranges, (one, index) => inner(one, n + 1, index))),
  ]
}
