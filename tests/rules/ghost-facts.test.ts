import { describe, expect, test } from 'vitest'
import { meterOf, reads } from '../../rules/circuit/instruments/meter.ts'
import { factor } from '../../rules/circuit/solve.ts'
import { deriveFacts } from '../../rules/findings/facts.ts'
import { readSheet } from '../../rules/findings/parse.ts'
import type { RawFinding } from '../../rules/findings/sheet.ts'
import { diagnose } from '../../rules/ranking/diagnose.ts'
import { rawSheetOf } from '../../src/diagnosis/raw-sheet.ts'
import { newSheet } from '../../src/diagnosis/sheet-content.ts'
import { generator, powerStation, starter } from '../edition.ts'
import type { CaseContext } from '../edition.ts'
import { at60, c, r, v } from './circuit/build.ts'

const twice = (now: number, nowOhms: number, before: number, beforeOhms = 1e7): RawFinding => ({
  value: now,
  meterOhms: nowOhms,
  earlier: { value: before, meterOhms: beforeOhms },
})
/** As the screens hand it in: a case file knows plain numbers alone. */
function sheetOf(context: CaseContext, findings: Record<string, RawFinding>) {
  const read = readSheet(starter, { context, findings })
  if (!read.ok) throw new Error(JSON.stringify(read.errors))
  return read.sheet
}
const ghost = (context: CaseContext, findings: Record<string, RawFinding>) =>
  [...deriveFacts(starter, sheetOf(context, findings)).values()][0]!.get('receptacle.ghost')

/** Both voltages to ground of a pin that hangs on these capacitances, each read at 10 MΩ and then at 400 kΩ. */
function pin(toHot: number, toNeutral: number, heavyOhms = 400_000): Record<string, RawFinding> {
  const net = factor(at60(v('n', 'h', 120, 0, 0.1), c('h', 'g', toHot), c('n', 'g', toNeutral)))
  const read = (wire: string, ohms: number) => Math.round(10 * reads(net, wire, 'g', meterOf(ohms))) / 10
  const both = (wire: string) => twice(read(wire, heavyOhms), heavyOhms, read(wire, 1e7))
  return { 'receptacle.hn.volts': 120, 'receptacle.hg.volts': both('h'), 'receptacle.ng.volts': both('n') }
}

describe('one voltage to ground, read with two meters', () => {
  test.each([
    ['10 ft of dead wire', 0.2e-9, 0.2e-9, 'short'],
    ['60 ft of it', 1.2e-9, 1.2e-9, 'cable'],
    ['filters and feeder of a panel', 4e-9, 4e-9, 'filters'],
    ['one wire’s filter larger', 2e-9, 6e-9, 'filters'],
  ])('%s', (_, toHot, toNeutral, band) => {
    expect(ghost(generator, pin(toHot, toNeutral))?.value).toBe(band)
  })
  test('half a microfarad holds against 400 kΩ, and tells itself at 3 kΩ', () => {
    expect(ghost(generator, pin(0.25e-6, 0.25e-6))?.value).toBe('firm')
    expect(ghost(generator, pin(0.25e-6, 0.25e-6, 3000))?.value).toBe('held')
  })
  test('names the readings it rests on', () => {
    expect(ghost(generator, pin(0.2e-9, 0.2e-9))?.from).toEqual([
      'receptacle.hg.volts',
      'receptacle.ng.volts',
    ])
    const one = { 'receptacle.ng.volts': twice(4, 400_000, 48) }
    expect(ghost(generator, one)?.from).toEqual(['receptacle.ng.volts'])
  })
  test('too little left for a digit: said only where the bound decides', () => {
    // Half a digit at 3 kΩ is 17 µA, 0.8 nF on 57 V at most: a stub. At 1 kΩ it is 50 µA and decides nothing.
    expect(ghost(generator, { 'receptacle.ng.volts': twice(0, 3000, 57) })?.value).toBe('short')
    expect(ghost(generator, { 'receptacle.ng.volts': twice(0, 1000, 57) })).toBeUndefined()
    // 30 V on 10 MΩ are 3 µA already, which 400 kΩ would show as a volt: these two can't both be right.
    expect(ghost(generator, { 'receptacle.ng.volts': twice(0, 400_000, 30) })).toBeUndefined()
  })
  test('silent without a second meter, with two alike, and where the two sides disagree', () => {
    expect(ghost(generator, { 'receptacle.ng.volts': 57 })).toBeUndefined()
    expect(ghost(generator, { 'receptacle.ng.volts': twice(40, 5e6, 57) })).toBeUndefined()
    const apart = { ...pin(4e-9, 4e-9), 'receptacle.ng.volts': twice(4, 400_000, 48) }
    expect(ghost(generator, apart)).toBeUndefined()
  })
  test('a wire is firm', () => {
    const net = factor(at60(v('n', 'h', 120, 0, 0.1), r('n', 'g', 0.05)))
    const read = (ohms: number) => reads(net, 'h', 'g', meterOf(ohms))
    expect(ghost(generator, { 'receptacle.hg.volts': twice(read(3000), 3000, read(1e7)) })?.value).toBe(
      'firm',
    )
  })
})

describe('the ranking takes it', () => {
  const share = async (context: CaseContext, findings: Record<string, RawFinding>, cause: string) =>
    (await diagnose(starter, sheetOf(context, findings))).ranking.find((one) => one.cause === cause)!.share
  const forgotten = (findings: Record<string, RawFinding>): Record<string, RawFinding> =>
    Object.fromEntries(
      Object.entries(findings).map(([id, one]) =>
        typeof one === 'object' && 'value' in one
          ? [id, { value: one.value, meterOhms: one.meterOhms! }]
          : [id, one],
      ),
    )

  test('a stub speaks for an open ground and against a floating source, more than the second meter alone', async () => {
    const stub = pin(0.2e-9, 0.2e-9)
    expect(await share(generator, stub, 'open-ground')).toBeGreaterThan(
      await share(generator, forgotten(stub), 'open-ground'),
    )
    expect(await share(generator, stub, 'floating-neutral')).toBeLessThan(
      await share(generator, forgotten(stub), 'floating-neutral'),
    )
  })
  test('filters the other way', async () => {
    const filters = pin(4e-9, 4e-9)
    expect(await share(generator, filters, 'open-ground')).toBeLessThan(
      await share(generator, forgotten(filters), 'open-ground'),
    )
    expect(await share(powerStation, filters, 'isolated-output')).toBeLessThan(
      await share(powerStation, forgotten(filters), 'isolated-output'),
    )
  })
})

describe('the sheet keeps the reading before', () => {
  test.each([
    ['no number', { value: 5, earlier: { value: '57', meterOhms: 1e7 } }, 'a number of 0 or more'],
    ['below 0', { value: 5, earlier: { value: -1, meterOhms: 1e7 } }, 'a number of 0 or more'],
    ['no instrument', { value: 5, earlier: { value: 57 } }, 'ohms above 0'],
    ['nothing at all', { value: 5, earlier: null }, 'a number of 0 or more'],
  ])('%s before: said beside its field', (_, raw, words) => {
    const read = readSheet(starter, { context: generator, findings: { 'receptacle.ng.volts': raw } })
    expect(read.ok ? '' : read.errors['findings.receptacle.ng.volts']).toContain(words)
  })
  test('from the page, as typed; text that was no number is left out', () => {
    const sheet = newSheet('', { ...generator, meter: { kind: '10M' } }, 'generator')
    const typed = (before: string) =>
      rawSheetOf(starter, {
        ...sheet,
        entries: {
          generator: {
            'receptacle.ng.volts': {
              kind: 'reading',
              text: '4,5',
              meterOhms: 400_000,
              earlier: { text: before, meterOhms: 1e7 },
            },
          },
        },
      }).findings?.['receptacle.ng.volts']
    expect(typed('57')).toEqual(twice(4.5, 400_000, 57))
    expect(typed('57 V?')).toEqual({ value: 4.5, meterOhms: 400_000 })
  })
})
