/** What the check makes of its answers: no browser needed. The vocabulary is the starter edition's. */
import { describe, expect, test } from 'vitest'
import { readSheet } from '../../rules/findings/parse.ts'
import { diagnose } from '../../rules/ranking/diagnose.ts'
import { stopsOf } from '../../rules/ranking/stop.ts'
import { dangers } from '../../src/triage/dangers.ts'
import { assume, modes, sources, wirings } from '../../src/triage/feeds.ts'
import { noticesToAsk, notices, someVeryBright } from '../../src/triage/notices.ts'
import { openTests, plainVerdict } from '../../src/triage/plain-verdict.ts'
import { readOut } from '../../src/triage/read-out.ts'
import { onlyWarm, saidStops } from '../../src/triage/said-stops.ts'
import { insteadOf } from '../../src/triage/step-gate.ts'
import { stopsHere } from '../../src/triage/stops-here.ts'
import { toSheet } from '../../src/triage/to-sheet.ts'
import { blank, conditions, dangerIds, mayMeasure, readVolts, Triage } from '../../src/triage/triage-state.ts'
import { pressPadKey } from '../../src/ui/pad-text.ts'
import { starter } from '../edition.ts'

const allNo: Triage = { ...blank, dangers: Object.fromEntries(dangerIds.map((id) => [id, 'no'])) }
const measured: Triage = { ...allNo, usedMeter: 'yes', ticked: conditions.map(() => true) }
const sheetOf = (triage: Triage) => {
  const read = readSheet(starter, toSheet(triage))
  if (!read.ok) throw new Error(JSON.stringify(read.errors))
  return read.sheet
}

describe('the questions speak the edition’s language', () => {
  const valuesOf = (finding: string) =>
    starter.observations.get(finding)?.values.map((value) => value.id) ?? []

  test('every answer about danger is a value of its finding, and every stop has its words', () => {
    const words = starter.file.stops.map((stop) => stop.id)
    for (const danger of dangers) {
      for (const findings of [danger.no, ...danger.parts.map((part) => part.findings)])
        for (const [finding, value] of Object.entries(findings)) expect(valuesOf(finding)).toContain(value)
      for (const part of danger.parts) if (part.stop !== undefined) expect(words).toContain(part.stop)
    }
  })
  test('every answer about what is noticed is a value of its finding', () => {
    for (const notice of notices)
      for (const way of notice.ways)
        if (way.value !== someVeryBright) expect(valuesOf(notice.finding)).toContain(way.value)
  })
  test('what feeds it is named by the edition’s ids', () => {
    const ids = (list: readonly { value: string }[]) =>
      list.map((one) => one.value).filter((id) => id !== 'unsure')
    for (const id of ids(sources)) expect([...starter.sources.keys()]).toContain(id)
    for (const id of ids(wirings)) expect([...starter.wirings]).toContain(id)
    for (const id of ids(modes)) expect([...starter.modes]).toContain(id)
  })
})

describe('one yes stops', () => {
  test.each(dangers.flatMap((danger) => danger.parts.map((part) => [danger.id, part.id] as const)))(
    'a yes to %s, %s: recorded alone, and the core agrees that it stops',
    (id, partId) => {
      const danger = dangers.find((one) => one.id === id)
      const part = danger?.parts.find((one) => one.id === partId)
      const triage: Triage = {
        ...allNo,
        dangers: { ...allNo.dangers, [id]: 'yes' },
        which: { [id]: partId },
        feeds: { twoForty: 'yes', source: 'utility' },
      }
      expect(toSheet(triage).findings).toMatchObject(part?.findings ?? {})
      const others =
        danger?.parts.filter((one) => one !== part).flatMap((one) => Object.keys(one.findings)) ?? []
      for (const finding of others) {
        const own = part?.findings[finding]
        expect(toSheet(triage).findings?.[finding]).toBe(own)
      }
      if (part?.stop === undefined) {
        expect(onlyWarm(triage)).toBe(true)
        expect(stopsHere(triage, starter)).toEqual([])
        return
      }
      expect(saidStops(triage).map((stop) => stop.id)).toEqual([part.stop])
      const computed = stopsOf(starter, sheetOf(triage)).map((stop) => stop.id)
      // Buzzing alone is no stop to the core, but whoever can't tell whether it is warm is stopped here.
      expect(computed).toEqual(partId === 'buzz' ? [] : [part.stop])
    },
  )
  test('a yes stops before it was said which, with the worst of the question', () => {
    const triage: Triage = { ...blank, dangers: { metal: 'yes' } }
    expect(saidStops(triage).map((stop) => stop.id)).toEqual(['shock'])
    expect(toSheet(triage).findings).toEqual({})
  })
  test('bright and dim lights stop whatever the system', () => {
    const triage: Triage = { ...blank, dangers: { lights: 'yes' }, feeds: { twoForty: 'no' } }
    expect(stopsHere(triage, starter).map((stop) => stop.id)).toEqual(['some-bright-some-dim'])
  })
  test('people get out before metal is spoken of', () => {
    const triage: Triage = {
      ...blank,
      dangers: { metal: 'yes', engine: 'yes' },
      which: { engine: 'headache' },
    }
    expect(stopsHere(triage, starter).map((stop) => stop.id)).toEqual(['headache', 'shock'])
  })
  test('a neutral at full voltage stops, though every question was answered no', () => {
    const triage: Triage = { ...measured, volts: { hn: '119', ng: '118', hg: '2' } }
    expect(stopsHere(triage, starter).map((stop) => stop.id)).toContain('neutral-live')
  })
})

describe('danger comes first', () => {
  test('no later step opens before all eight questions are answered', () => {
    const seven: Triage = { ...allNo, dangers: { ...allNo.dangers, joined: undefined } }
    for (const step of [2, 3, 4, 5]) expect(insteadOf(step, seven)).toBe('/check/1')
    for (const step of [1, 2, 3, 4, 5]) expect(insteadOf(step, allNo)).toBeUndefined()
  })
  test('after a stop nothing is plugged in or measured, but what feeds it may be told', () => {
    const stopped: Triage = { ...blank, dangers: { battery: 'yes' } }
    expect([1, 2, 3, 4, 5].map((step) => insteadOf(step, stopped))).toEqual([
      undefined,
      undefined,
      undefined,
      '/check/stop',
      '/check/stop',
    ])
  })
})

describe('volts count only on the five conditions', () => {
  const volts = { hn: '119,6', ng: '0.4', hg: '119.5' }
  test('with a meter they know and all five ticked', () => {
    expect(toSheet({ ...measured, volts }).findings).toMatchObject({
      'receptacle.hn.volts': 119.6,
      'receptacle.ng.volts': 0.4,
      'receptacle.hg.volts': 119.5,
    })
  })
  test.each(conditions.map((words, index) => [words, index] as const))('not without: %s', (_, index) => {
    const one = { ...measured, volts, ticked: conditions.map((__, i) => i !== index) }
    expect(mayMeasure(one)).toBe(false)
    expect(Object.keys(toSheet(one).findings ?? {}).filter((id) => id.endsWith('volts'))).toEqual([])
  })
  test('and none may be taken after a yes', () => {
    expect(mayMeasure({ ...measured, dangers: { ...allNo.dangers, water: 'yes' } })).toBe(false)
  })
  test('what is no number is not read as one', () => {
    expect(['', ' ', 'abc', '1.2.3', '-5', '1e3', '.'].map(readVolts)).toEqual(Array(7).fill(undefined))
    expect(['0', '119.6', '119,6', '.5', '57.'].map(readVolts)).toEqual([0, 119.6, 119.6, 0.5, 57])
  })
})

describe('what was left open', () => {
  test('is assumed in plain words, and none is assumed where all was said', () => {
    expect(assume({}).context).toEqual({
      source: 'all-in-one-inverter',
      system: '120',
      wiring: 'panel',
      mode: 'battery',
    })
    expect(assume({}).words).toHaveLength(4)
    expect(assume({ source: 'generator', twoForty: 'no', wiring: 'direct' })).toEqual({
      context: { source: 'generator', system: '120', wiring: 'direct' },
      words: [],
    })
    expect(assume({ source: 'utility' }).context.system).toBe('120/240')
  })
  test('is not on the sheet', () => {
    expect(toSheet(blank).findings).toEqual({})
    expect(readSheet(starter, toSheet(blank)).ok).toBe(true)
  })
  test('an answer to a question that no longer stands is not on the sheet', () => {
    const answered = { 'breaker.in-use': 'holds', 'breaker.reset': 'trips-again' }
    expect(noticesToAsk(answered).map((notice) => notice.finding)).not.toContain('breaker.reset')
    expect(toSheet({ ...allNo, notices: answered }).findings).not.toHaveProperty('breaker.reset')
  })
})

describe('the words', () => {
  const halfway: Triage = {
    ...measured,
    where: 'kitchen, left of the sink',
    lamps: { hn: 'lit', ng: 'dim', hg: 'dim' },
    volts: { hn: '119.6', ng: '56.8', hg: '57.2' },
    feeds: { source: 'all-in-one-inverter', mode: 'battery' },
    notices: { onset: 'after-new-work' },
  }
  test('to read out say what was found, where, and what feeds it', () => {
    const said = readOut(halfway, []).join(' ')
    expect(said).toContain(
      'Tester at kitchen, left of the sink: hot to neutral lit, neutral to ground dim, hot to ground dim.',
    )
    expect(said).toContain(
      'hot to neutral 119.6 volts, neutral to ground 56.8 volts, hot to ground 57.2 volts.',
    )
    expect(said).toContain('A hard-wired inverter feeds it. It was on battery.')
    expect(said).toContain('It began after new work.')
  })
  test('say that it is off only where they said so, and never that it is safe', () => {
    const stopped: Triage = { ...halfway, dangers: { metal: 'yes' }, madeOff: true }
    expect(readOut(stopped, stopsHere(stopped, starter)).at(-1)).toBe('I have switched it off.')
    expect(readOut({ ...stopped, madeOff: false }, []).join(' ')).not.toContain('switched it off')
    expect(readOut(stopped, []).join(' ')).not.toMatch(/\bsafe\b/i)
  })
  test('nothing fits before anything was found', async () => {
    const verdict = plainVerdict(starter, await diagnose(starter, sheetOf(allNo)))
    expect([...verdict.fits, ...verdict.may]).toEqual([])
    expect(verdict.metalMayBeLive).toBe(false)
  })
  test('two dim lamps on a floating system: something fits or may, and no test opens anything', async () => {
    const diagnosis = await diagnose(starter, sheetOf(halfway))
    const verdict = plainVerdict(starter, diagnosis)
    expect(verdict.fits.length + verdict.may.length).toBeGreaterThan(0)
    for (const { test: id } of openTests(starter, diagnosis, halfway, false)) {
      expect(starter.tests.get(id)).toMatchObject({ who: 'anyone', hazard: 'closed' })
      expect(id).not.toBe('breaker-reset')
    }
  })
  test('no meter test is offered to someone who may not measure', async () => {
    const noMeter: Triage = { ...halfway, usedMeter: 'no' }
    const diagnosis = await diagnose(starter, sheetOf(noMeter))
    expect(openTests(starter, diagnosis, noMeter, false).map((one) => one.test)).not.toContain(
      'receptacle-volts',
    )
  })
})

test('answers that another build kept are read again, and broken ones are not', () => {
  expect(Triage.safeParse(JSON.parse(JSON.stringify(measured))).success).toBe(true)
  expect(Triage.safeParse({ ...blank, dangers: { metal: 'perhaps' } }).success).toBe(false)
  expect(Triage.safeParse(undefined).success).toBe(false)
})

test('the pad types digits, one point, and takes them back', () => {
  const type = (keys: string) =>
    [...keys].reduce((text, key) => pressPadKey(text, key === '<' ? 'erase' : (key as '1')), '')
  expect(type('57.2')).toBe('57.2')
  expect(type('5.7.2')).toBe('5.72')
  expect(type('.4')).toBe('0.4')
  expect(type('007')).toBe('7')
  expect(type('119<<')).toBe('1')
  expect(type('123456789')).toBe('1234567')
  expect(pressPadKey('57.2', 'clear')).toBe('')
})
