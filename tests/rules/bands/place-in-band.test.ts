import { describe, expect, test } from 'vitest'
import { bandWords, placeInBand } from '../../../rules/bands/place-in-band.ts'
import { expect as expectOf } from '../../../rules/circuit/expect.ts'
import { overLimitOhms } from '../../../rules/findings/sheet.ts'
import { cabin } from '../loop/loops.ts'

describe('a band in words', () => {
  test.each([
    [{ low: 110.2, high: 124.8 }, 'V', '110 to 125 V'],
    [{ low: 0, high: 1.23 }, 'V', '0 to 1.2 V'],
    [{ low: 119.9, high: 120.2 }, 'V', '120 V'],
    [{ low: 0.21, high: overLimitOhms }, 'Ω', '0.21 Ω to over limit'],
    [{ low: 3200, high: 2_500_000 }, 'Ω', '3.2 kΩ to 2.5 MΩ'],
    [{ low: overLimitOhms, high: overLimitOhms }, 'Ω', 'over limit'],
    [{ low: 59.9, high: 62 }, 'Hz', '60 to 62 Hz'],
  ])('%o %s', (band, unit, words) => expect(bandWords(band, unit)).toBe(words))
})

describe('a reading in its band', () => {
  const half = { low: 30, high: 80 }
  test('lies between its ends on the drawn scale', () => {
    const placed = placeInBand(half, 'V', 144, 57.2)
    expect(placed.outside).toBeUndefined()
    expect(placed.at).toBeGreaterThan(placed.from)
    expect(placed.at).toBeLessThan(placed.to)
  })
  test('is outside only beyond the meter’s own error', () => {
    expect(placeInBand(half, 'V', 144, 81).outside).toBeUndefined()
    expect(placeInBand(half, 'V', 144, 84).outside).toBe('above')
    expect(placeInBand(half, 'V', 144, 29).outside).toBe('below')
    expect(placeInBand({ low: 0, high: 0.2 }, 'V', 144, 0.4).outside).toBeUndefined()
  })
  test('far beyond the scale it is still on it', () => {
    const placed = placeInBand(half, 'V', 144, 600)
    expect(placed.at).toBeLessThanOrEqual(1)
    expect(placed.to).toBeLessThan(placed.at!)
  })
  test('ohms go by orders of magnitude, over limit at the end', () => {
    const placed = placeInBand({ low: 0.1, high: 2 }, 'Ω', 1, overLimitOhms)
    expect(placed.at).toBe(1)
    expect(placed.outside).toBe('above')
    expect(placed.to).toBeLessThan(0.3)
  })
  test('without a reading there is the band alone', () => {
    expect(placeInBand(half, 'V', 144, undefined)).toMatchObject({ at: undefined, outside: undefined })
  })
})

describe('with what the model expects', () => {
  const at = (cause: 'floating-neutral' | 'sound', id: string, value: number, ohms = 10_000_000) =>
    placeInBand(expectOf(cabin, cause, ohms).readings.get(id)!, 'V', 144, value).outside
  test('57.2 V from hot to ground fits a floating neutral and no sound system', () => {
    expect(at('floating-neutral', 'receptacle.hg.volts', 57.2)).toBeUndefined()
    expect(at('sound', 'receptacle.hg.volts', 57.2)).toBe('below')
    expect(at('sound', 'receptacle.hg.volts', 119.4)).toBeUndefined()
  })
  test('through a meter of 3 kΩ the same reading is too high for a floating neutral', () => {
    expect(at('floating-neutral', 'receptacle.hg.volts', 57.2, 3000)).toBe('above')
    expect(at('floating-neutral', 'receptacle.hg.volts', 0.3, 3000)).toBeUndefined()
  })
})
