import { tenfold, triples } from './contradiction.ts'
import type { Check, Look, Triple } from './contradiction.ts'

const pairName = { hn: 'Hot–neutral', ng: 'Neutral–ground', hg: 'Hot–ground' } as const
type Pair = keyof typeof pairName
const pairs: readonly Pair[] = ['hn', 'ng', 'hg']

/** More volts than any source of this system can give between two points. */
export const tooMany: Check = ({ facts, nominal, legs }) => {
  const most = legs === 2 ? 2.45 : 1.45
  for (const [id, { value, from }] of facts) {
    if (!from.includes(id) || typeof value !== 'number' || !/\.volts(\.loaded)?$/.test(id)) continue
    if (id.startsWith('source.dc')) continue
    if (value > most * nominal)
      return { because: `${Math.round(value)} V is more than this system can give.`, again: id }
  }
  return undefined
}

/** Three sides near nominal: two wires can't do that, whatever the meter. */
function threeLive(t: Triple): boolean {
  const sides = pairs.map((p) => t[p])
  return sides.every((s) => s > 0.7 && s < 1.35)
}

/**
 * One side next to nothing ties its two ends together, so the other two sides must be alike; unless they are
 * ghosts too. Tells a slipped point and a number in the wrong field.
 */
function lopsided(t: Triple): Pair | undefined {
  const sorted = [...pairs].sort((a, b) => t[a] - t[b])
  const [least, middle, most] = sorted as [Pair, Pair, Pair]
  if (t[most] < 0.5) return undefined
  const tied = t[least] < 0.02 && t[middle] > 4 * Math.max(t[least], 0.01)
  return tied && t[most] - t[middle] > 0.15 * t[most] ? middle : undefined
}

/** Ground far outside the half circle over the rail: nothing of this system can put it there. */
function driven(t: Triple): boolean {
  return (
    t.hn >= 0.5 &&
    t.hg + t.ng > 1.08 * t.hn &&
    Math.abs(t.hg - t.ng) < 0.9 * t.hn &&
    t.hg ** 2 + t.ng ** 2 > 1.25 * t.hn ** 2
  )
}

/** On the line, off the line by more than error: sides that don't make one picture with ground nearly on neutral. */
function nearlyOnNeutral(t: Triple): boolean {
  return t.hn >= 0.5 && t.ng > 0.07 && t.ng < 0.25 && Math.abs(t.hg - t.hn) < 0.02 * t.hn
}

export const oneTriple: Check = (look: Look) => {
  for (const t of triples(look)) {
    const id = (pair: Pair) => `${t.place}.${pair}.volts`
    if (threeLive(t))
      return {
        because: `All three sides at the ${t.place} read near full voltage: two wires can’t do that.`,
        again: id('ng'),
      }
    const odd = lopsided(t)
    if (odd !== undefined) {
      const rest = Math.max(...pairs.filter((p) => p !== odd).map((p) => t[p]))
      const slip = tenfold(t[odd], rest)
      return {
        because: slip
          ? `${pairName[odd]} at the ${t.place} is a tenth of what the other two call for: a slipped point?`
          : `The three readings at the ${t.place} can’t all be true: two points that read alike against the third differ.`,
        again: id(odd),
      }
    }
    if (driven(t))
      return {
        because: `At the ${t.place} ground lies where nothing of this system can put it.`,
        again: id('ng'),
      }
    if (nearlyOnNeutral(t))
      return {
        because: `Neutral–ground at the ${t.place} doesn’t go with hot–neutral and hot–ground, which read alike.`,
        again: id('ng'),
      }
  }
  return undefined
}

const loadedPlaces = ['receptacle', 'panel', 'source'] as const

/** More volts with the load on than off, by over 2 % of nominal; or a loaded reading that slipped a point. */
export const underLoad: Check = ({ amount, nominal }) => {
  for (const place of loadedPlaces) {
    const [off, on] = [amount(`${place}.hn.volts`), amount(`${place}.hn.volts.loaded`)]
    if (off === undefined || on === undefined) continue
    if (on - off > 0.02 * nominal)
      return {
        because: `More volts with the load on than off at the ${place}.`,
        again: `${place}.hn.volts.loaded`,
      }
    // An open wire reads next to nothing under load, a poor joint most of its volts: a tenth is neither.
    if (off > 0.7 * nominal && on < off && tenfold(off, on))
      return {
        because: `Under load the ${place} reads a tenth of what it reads without: a slipped point?`,
        again: `${place}.hn.volts.loaded`,
      }
  }
  return undefined
}

/** Frequency that no engine or inverter makes: a slipped point. */
export const frequency: Check = ({ amount, hertz }) => {
  const hz = amount('source.hz')
  if (hz === undefined || hz === 0) return undefined
  return hz < 0.7 * hertz || hz > 1.4 * hertz
    ? { because: `${hz} Hz is no frequency this source can run at.`, again: 'source.hz' }
    : undefined
}
