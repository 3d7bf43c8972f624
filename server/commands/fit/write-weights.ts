/** Puts weights into a tests file's own text: `weight` of the named outcomes, and not another byte. */

/** Where the object that opens at `from` ends, counted past its brace. */
function endOfObject(text: string, from: number): number {
  let [depth, quoted] = [0, false]
  for (let i = from; i < text.length; i++) {
    const c = text[i]
    if (c === '"' && text[i - 1] !== '\\') quoted = !quoted
    if (quoted) continue
    if (c === '{') depth += 1
    if (c === '}' && --depth === 0) return i + 1
  }
  throw new Error('an object without an end')
}

/**
 * The text of a tests file with new weights for some of its outcomes.
 * @param weights test id → outcome id → weight
 */
export function withWeights(text: string, weights: ReadonlyMap<string, ReadonlyMap<string, number>>): string {
  let written = text
  for (const [test, outcomes] of weights) {
    const at = written.indexOf(`"id": "${test}"`)
    if (at < 0) continue
    let from = written.indexOf('"outcomes": [', at)
    for (const [outcome, weight] of outcomes) {
      const id = written.indexOf(`"id": "${outcome}"`, from)
      const findings = written.indexOf('"findings": {', id)
      if (id < 0 || findings < 0) throw new Error(`test ${test} has no outcome ${outcome} in its place`)
      const end = endOfObject(written, written.indexOf('{', findings))
      const rest = written.slice(end).replace(/^,\s*"weight": [\d.]+/, '')
      const gap = /\s*$/.exec(written.slice(0, findings))?.[0] ?? ' '
      written = `${written.slice(0, end)},${gap}"weight": ${weight}${rest}`
      from = end
    }
  }
  return written
}
