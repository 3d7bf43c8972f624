/** Puts bits into a rules file's own text: `says` and `others` of the named rules, and not another byte. */
import type { Bits } from './bits.ts'

/** What a rule says, written short: the commonest number becomes `others`. */
export function shortened(says: Bits, causeIds: readonly string[]): { says: Bits; others: number } {
  const of = (cause: string) => says[cause] ?? 0
  const tally = new Map<number, number>()
  for (const cause of causeIds) tally.set(of(cause), (tally.get(of(cause)) ?? 0) + 1)
  // The commonest, 0 before others as common, then the smaller: the same whatever the order of counting.
  const others = [...tally].sort(
    ([a, m], [b, n]) => n - m || Number(b === 0) - Number(a === 0) || Math.abs(a) - Math.abs(b) || a - b,
  )[0]?.[0]
  const rest = causeIds.filter((cause) => of(cause) !== others)
  return { says: Object.fromEntries(rest.map((cause) => [cause, of(cause)])), others: others ?? 0 }
}

const oneLine = (says: Bits) =>
  `{${Object.entries(says)
    .map(([cause, bits]) => `"${cause}": ${bits}`)
    .join(', ')}}`

/**
 * The text of a rules file with new bits for some of its rules.
 * @param bits rule id → bits by cause
 * @throws Error where a rule of the file has no line of `says`
 */
export function withBits(text: string, bits: ReadonlyMap<string, Bits>, causeIds: readonly string[]): string {
  let [rule, written] = ['', false]
  return text
    .split('\n')
    .flatMap((line) => {
      const id = /^\s*"id": "([^"]+)",$/.exec(line)?.[1]
      if (id !== undefined) [rule, written] = [id, false]
      const found = bits.get(rule)
      if (found === undefined) return [line]
      const indent = /^\s*/.exec(line)?.[0] ?? ''
      if (line.startsWith(`${indent}"says": {`)) {
        const { says, others } = shortened(found, causeIds)
        written = true
        return [
          `${indent}"says": ${oneLine(says)},`,
          ...(others === 0 ? [] : [`${indent}"others": ${others},`]),
        ]
      }
      if (line.startsWith(`${indent}"because": `) && !written)
        throw new Error(`rule ${rule} has no line of says`)
      return line.startsWith(`${indent}"others": `) ? [] : [line]
    })
    .join('\n')
}
