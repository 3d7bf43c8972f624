import { describe, expect, test } from 'vitest'
import { readCase, readSheet } from '../../rules/findings/parse.ts'
import { generator, powerStation, starter } from '../edition.ts'

const errorsOf = (raw: unknown) => {
  const read = readCase(starter, raw)
  return read.ok ? [] : Object.keys(read.errors).sort()
}
const one = (findings: unknown, context: unknown = generator) => errorsOf({ id: 'x', context, findings })

describe('a case that can’t be read names each bad field', () => {
  test.each([
    ['a number', 5, ['']],
    ['null', null, ['']],
    ['a list', [], ['']],
    ['nothing at all', undefined, ['']],
    ['no id and no context', {}, ['context.source', 'context.system', 'context.wiring', 'id']],
    ['an empty id', { id: '', context: generator }, ['id']],
    ['an id that is a number', { id: 7, context: generator }, ['id']],
    ['an unknown source', { id: 'x', context: { ...generator, source: 'sun' } }, ['context.source']],
    ['an unknown system', { id: 'x', context: { ...generator, system: '110' } }, ['context.system']],
    ['a missing wiring', { id: 'x', context: { source: 'utility', system: '120' } }, ['context.wiring']],
    ['an unknown mode', { id: 'x', context: { ...generator, mode: 'turbo' } }, ['context.mode']],
    ['a meter of 0 ohms', { id: 'x', context: { ...generator, meterOhms: 0 } }, ['context.meterOhms']],
    ['a meter in words', { id: 'x', context: { ...generator, meterOhms: '10M' } }, ['context.meterOhms']],
    ['a meter of null', { id: 'x', context: { ...generator, meterOhms: null } }, ['context.meterOhms']],
    ['findings that are a list', { id: 'x', context: generator, findings: [] }, ['findings']],
    ['modes that are words', { id: 'x', context: generator, otherModes: 'battery' }, ['otherModes']],
    [
      'an unknown other mode',
      { id: 'x', context: generator, otherModes: { turbo: {} } },
      ['otherModes.turbo'],
    ],
    [
      'a bad finding in another mode',
      { id: 'x', context: generator, otherModes: { battery: { tingle: 'perhaps' } } },
      ['otherModes.battery.tingle'],
    ],
  ])('%s', (_, raw, paths) => expect(errorsOf(raw)).toEqual(paths))

  test.each([
    ['an unknown finding', { 'receptacle.xx.volts': 1 }, 'findings.receptacle.xx.volts'],
    ['null', { 'receptacle.hn.volts': null }, 'findings.receptacle.hn.volts'],
    ['words for a number', { 'receptacle.hn.volts': '120' }, 'findings.receptacle.hn.volts'],
    ['a negative number', { 'receptacle.hn.volts': -1 }, 'findings.receptacle.hn.volts'],
    ['a number too large to be one', { 'receptacle.hn.volts': Infinity }, 'findings.receptacle.hn.volts'],
    ['an object for a number', { 'receptacle.hn.volts': { value: 120 } }, 'findings.receptacle.hn.volts'],
    ['a value not listed', { tingle: 'maybe' }, 'findings.tingle'],
    ['a number for a word', { tingle: 1 }, 'findings.tingle'],
    ['a second leg on 120 V', { 'panel.l2n.volts': 120 }, 'findings.panel.l2n.volts'],
  ])('%s', (_, findings, path) => expect(one(findings)).toEqual([path]))
  test('a panel reading where loads plug straight into the source', () =>
    expect(one({ 'panel.hn.volts': 120 }, powerStation)).toEqual(['findings.panel.hn.volts']))
  test('every bad field has its own sentence', () => {
    const read = readCase(starter, {
      id: 'x',
      context: generator,
      findings: { tingle: 'maybe', shock: 3, 'rod.amps': -2 },
    })
    expect(read.ok).toBe(false)
    if (!read.ok) expect(new Set(Object.values(read.errors)).size).toBeGreaterThan(1)
  })
})

describe('a case that can be read', () => {
  test('needs no findings, takes 10 MΩ and the source’s own mode where nothing is said, ignores what it doesn’t know', () => {
    const read = readCase(starter, {
      id: 'x',
      truth: 'sound',
      note: 1,
      context: { ...generator, color: 'red' },
    })
    expect(read).toMatchObject({
      ok: true,
      sheet: { context: { meterOhms: 10_000_000, mode: 'generator' }, taken: [] },
    })
  })
  test('what can’t be true is still read', () => expect(one({ 'receptacle.hn.volts': 99_999 })).toEqual([]))
  test('1e9 ohms is over limit', () => {
    const read = readCase(starter, { id: 'x', context: generator, findings: { 'source.ng.ohms': 1e9 } })
    expect(read.ok && read.sheet.taken[0]).toMatchObject({ overLimit: true })
  })
})

describe('a sheet from the screens keeps more of a reading', () => {
  const taken = (finding: unknown) => {
    const read = readSheet(starter, { context: generator, findings: { 'receptacle.hg.volts': finding } })
    return read.ok ? read.sheet.taken[0] : read.errors
  }
  test('value, unit, place, pair, mode, instrument', () =>
    expect(taken({ value: 57.2, meterOhms: 400_000 })).toEqual({
      kind: 'reading',
      id: 'receptacle.hg.volts',
      mode: 'generator',
      value: 57.2,
      unit: 'V',
      place: 'receptacle',
      pair: 'hg',
      loaded: false,
      meterOhms: 400_000,
      overLimit: false,
      between: undefined,
    }))
  test('an unsteady reading keeps its two numbers, in order', () =>
    expect(taken({ between: [60, 40] })).toMatchObject({ value: 50, between: [40, 60] }))
  test('over limit without a number', () => expect(taken({ overLimit: true })).toMatchObject({ value: 1e9 }))
  test('a bad instrument is said beside the field', () =>
    expect(taken({ value: 3, meterOhms: 0 })).toHaveProperty(['findings.receptacle.hg.volts']))
})
