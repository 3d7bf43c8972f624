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
  if (pattern === 'half' && observed('tester.hg-lamp') === 'lit' && observed('tester.ng-lamp') === 'dark')
    return {
      because: 'The meter puts ground halfway, and the tester lamps show it on neutral.',
      again: 'receptacle.ng.volts',
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
