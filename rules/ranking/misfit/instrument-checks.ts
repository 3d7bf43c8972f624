import type { Check } from './contradiction.ts'

/** What a plug-in tester must show on volts that are firm: lamps at hot–neutral, hot–ground, neutral–ground. */
const lampsFor: Record<string, readonly [lit: string[], dark: string[]]> = {
  'on-neutral': [['tester.hn-lamp', 'tester.hg-lamp'], ['tester.ng-lamp']],
  'on-hot': [['tester.hn-lamp', 'tester.ng-lamp'], ['tester.hg-lamp']],
  'across-legs': [['tester.hn-lamp', 'tester.hg-lamp', 'tester.ng-lamp'], []],
  'other-leg': [['tester.hn-lamp', 'tester.hg-lamp', 'tester.ng-lamp'], []],
  needle: [['tester.hg-lamp', 'tester.ng-lamp'], ['tester.hn-lamp']],
  dead: [[], ['tester.hn-lamp', 'tester.hg-lamp', 'tester.ng-lamp']],
}
const pairWords: Record<string, string> = {
  'tester.hn-lamp': 'hot–neutral',
  'tester.hg-lamp': 'hot–ground',
  'tester.ng-lamp': 'neutral–ground',
}
/** Patterns in which one wire hangs free hold only where no load carries it over: the tester may see another one. */
export const testerAgainstMeter: Check = ({ fact, observed, amount, nominal }) => {
  const pattern = fact('receptacle.pattern')
  if (pattern === undefined) {
    const hn = amount('receptacle.hn.volts')
    const lamp = observed('tester.hn-lamp')
    if (hn !== undefined && hn > 0.8 * nominal && lamp === 'dark')
      return {
        because: 'The tester lamp at hot–neutral is dark and the meter reads full voltage.',
        again: 'tester.hn-lamp',
      }
    return undefined
  }
  const [lit, dark] = lampsFor[pattern] ?? [[], []]
  const low = pattern !== 'dead' && (amount('receptacle.hn.volts') ?? 0) < 0.72 * nominal
  for (const id of low ? [] : lit)
    if (observed(id) === 'dark')
      return {
        because: `The tester lamp at ${pairWords[id]} is dark and the meter reads full voltage there.`,
        again: id,
      }
  for (const id of dark)
    if (observed(id) === 'lit')
      return {
        because: `The tester lamp at ${pairWords[id]} is lit and the meter reads next to nothing there.`,
        again: id,
      }
  return undefined
}

/** The bulb's look against the volts across it, and against the meter. */
export const bulbAgainstMeter: Check = ({ observed, amount, nominal, fact }) => {
  const [look, volts] = [observed('bulb.ng'), amount('bulb.ng.volts')]
  if (look !== undefined && volts !== undefined) {
    const part = volts / nominal
    if (
      (look === 'bright' && part < 0.4) ||
      (look === 'dark' && part > 0.75) ||
      (look === 'dim' && part < 0.03)
    )
      return {
        because: 'The test bulb’s look and the volts across it tell different stories.',
        again: 'bulb.ng.volts',
      }
  }
  if (fact('receptacle.pattern') === 'on-neutral' && (look === 'bright' || (volts ?? 0) > 0.75 * nominal))
    return {
      because: 'The test bulb is bright between neutral and ground where the meter reads nothing.',
      again: 'bulb.ng',
    }
  return undefined
}

/** A split phase is bonded in its middle: half on the bulb from one leg’s two wires can’t be. */
export const bulbOnTwoLegs: Check = ({ fact, legs }) =>
  legs === 2 && fact('source-bulb.holds') === 'half'
    ? {
        because:
          'The bulb keeps half both ways: a balanced output, which no 120/240 V source is. Look at what the source is.',
        again: 'source.bulb.ng.volts',
      }
    : undefined

/** Ohms that say the opposite of firm volts at the same receptacle. */
export const ohmsAgainstVolts: Check = ({ amount, fact }) => {
  const [ng, hg] = [amount('receptacle.ng.ohms'), amount('receptacle.hg.ohms')]
  if (ng === undefined || hg === undefined) return undefined
  const pattern = fact('receptacle.pattern')
  if (pattern === 'on-neutral' && hg < 2 && ng > 500)
    return {
      because: 'Volts put ground on neutral, ohms on hot: two readings in each other’s place?',
      again: 'receptacle.hg.ohms',
    }
  if (pattern === 'on-hot' && ng < 2 && hg > 500)
    return {
      because: 'Volts put ground on hot, ohms on neutral: two readings in each other’s place?',
      again: 'receptacle.ng.ohms',
    }
  return undefined
}
