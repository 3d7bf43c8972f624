import { describe, expect, test } from 'vitest'
import { drawnAs } from '../../../rules/loop/drawn-as.ts'
import { loopWords } from '../../../rules/loop/loop-words.ts'
import type { LoopOptions } from '../../../rules/loop/loop-options.ts'
import { starter } from '../../edition.ts'
import { house, loop } from './loops.ts'

const words = (cause: string, turned: Partial<LoopOptions> = {}, context = house) =>
  loopWords(loop(cause, turned, context))

describe('the verdict', () => {
  test('a utility’s sound system trips its breaker; an inverter may shut down first', () => {
    expect(words('sound').title).toBe('The breaker likely trips at once')
    const limited = words('sound', {}, { source: 'all-in-one-inverter', system: '120', wiring: 'panel' })
    expect(limited.title).toBe('The breaker likely trips, or the source shuts down')
    expect(limited.says.join(' ')).toMatch(/far less, typically 1\.5 to 3 times its rating/)
  })
  test('no bond: the breaker does not trip, the loop ends at the bond, and a rod changes nothing', () => {
    const said = words('sound', { bond: false, rod: false })
    expect(said.title).toBe('The breaker does not trip: no way back for the current')
    expect(said.says).toContain('No bond joins neutral to ground; the loop ends there.')
    // A utility's own earth is a way back of its own, and too poor for any breaker.
    expect(words('sound', { bond: false }).title).toMatch(
      /^The breaker does not trip: [5-9](\.\d)? A is too little$/,
    )
    const rod = loopWords(loop('floating-neutral'))
    expect(rod.says.join(' ')).toMatch(/The ground rod changes nothing/)
  })
  test('rods: a few amps are too little, and it is a GFCI that would trip', () => {
    const said = loopWords(loop('rod-only-return'))
    expect(said.title).toBe('The breaker does not trip: 2.2 A is too little')
    expect(said.says.join(' ')).toMatch(/A GFCI at the head of this circuit misses 2\.2 A/)
    expect(said.says.join(' ')).toMatch(/rods pass up to 2\.2 A through the ground: too little for a breaker/)
  })
  test('two bonds: part comes back on the ground wire, with its amps', () => {
    const said = words('double-bond', { state: 'load' })
    expect(said.title).toBe('Part of the current comes back on the ground wire')
    expect(said.says.join(' ')).toMatch(/[\d.]+ A back on neutral and [\d.]+ A back on the ground wire/)
  })
  test('a source that is off is not proved dead', () => {
    expect(words('source-off', { state: 'load' }).says[0]).toMatch(/not proved dead/)
  })
  test('a jumper: the GFCI misses nothing', () => {
    expect(loopWords(loop('bootleg-ground')).says.join(' ')).toMatch(/A GFCI misses nothing here/)
  })
})

describe('danger comes first', () => {
  test('metal that stays live is said with its volts and what a person gets', () => {
    expect(words('open-ground').danger).toEqual([
      expect.stringMatching(/^Metal of what is plugged in is live: 11\d V to earth, .* up to 0\.12 A\.$/),
    ])
    expect(loopWords(loop('rod-only-return')).danger[0]).toMatch(/are live: 5\d to 6\d V to earth/)
    expect(loopWords(loop('floating-neutral')).danger[0]).toMatch(/hot is on that metal.*120 V/)
  })
  test('metal that is cut off at once is no standing danger', () => {
    const said = words('sound')
    expect(said.danger).toEqual([])
    expect(said.says.join(' ')).toMatch(/Until it is cut off/)
  })
  test('a bond on a balanced output is a danger before anything else', () => {
    const said = loopWords(loop('balanced-output', { state: 'load', bond: true }))
    expect(said.title).toBe('A bond here shorts half of the output')
    expect(said.danger[0]).toMatch(/Never bond a balanced output/)
    expect(loopWords(loop('balanced-output')).says.join(' ')).toMatch(/Such an output gets no bond, ever/)
  })
})

describe('of every cause that is drawn', () => {
  const drawn = starter.causeIds.filter((cause) => 'wiring' in (drawnAs(cause) ?? {}))
  test.each(drawn)('%s has its words in both states, and never says safe', (cause) => {
    const context = cause === 'two-hots' || cause === 'shared-neutral-lost' ? house : undefined
    for (const state of ['load', 'fault'] as const) {
      const said = loopWords(loop(cause, { state }, context))
      expect(said.title.length).toBeGreaterThan(10)
      expect(said.says.length).toBeGreaterThanOrEqual(2)
      const all = [said.title, ...said.danger, ...said.says].join(' ')
      expect(all).not.toMatch(/\bsafe|NaN|undefined|Infinity|!|please/i)
      for (const line of [...said.danger, ...said.says]) expect(said.spoken).toContain(line)
    }
  })
})
