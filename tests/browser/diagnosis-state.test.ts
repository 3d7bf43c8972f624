import { describe, expect, test } from 'vitest'
import { diagnose } from '../../rules/ranking/diagnose.ts'
import { doneTests, modeChangeMinutes, offersOf } from '../../src/diagnosis/choose-test.ts'
import { findFindings } from '../../src/diagnosis/find-findings.ts'
import { meantBy } from '../../src/diagnosis/meant.ts'
import { placeOf, placesOf, readingsAt } from '../../src/diagnosis/places.ts'
import { errorAt, meterOhmsOf, numberIn, rawSheetOf } from '../../src/diagnosis/raw-sheet.ts'
import { readWhatCanBe } from '../../rules/findings/read-what-can-be.ts'
import { newSheet, readingOf, SheetContent } from '../../src/diagnosis/sheet-content.ts'
import { reduce, undoes } from '../../src/diagnosis/sheet-state.ts'
import type { Action } from '../../src/diagnosis/sheet-state.ts'
import { percent, strengthOf } from '../../src/diagnosis/words.ts'
import { starter as edition } from '../edition.ts'

const context = {
  source: 'all-in-one-inverter',
  system: '120',
  wiring: 'panel',
  meter: { kind: '10M' },
} as const
const blank = () => newSheet('Cabin', context, 'battery')
const after = (content: SheetContent, ...actions: Action[]) => actions.reduce(reduce, content)
const at = (id: string, mode = 'battery') => ({ mode, id, of: id })
const type = (id: string, text: string): Action => ({ do: 'type', ...at(id), text })
const hn = 'receptacle.hn.volts'
const ng = 'receptacle.ng.volts'
const textOf = (content: SheetContent, id: string) => readingOf(content, 'battery', id)?.text

describe('what is done to a sheet is taken back step by step', () => {
  test('typing in one field is one step, until the field is left', () => {
    const typed = after(blank(), type(hn, '1'), type(hn, '11'), type(hn, '119'))
    expect(typed.past).toHaveLength(1)
    const again = after(typed, { do: 'settle' }, type(hn, '119.6'))
    expect(again.past).toHaveLength(2)
    expect(textOf(after(again, { do: 'undo' }), hn)).toBe('119')
    expect(textOf(after(again, { do: 'undo' }, { do: 'undo' }), hn)).toBeUndefined()
  })
  test('another field begins another step', () => {
    const typed = after(blank(), type(hn, '120'), type(ng, '5'))
    expect(undoes(typed)).toBe(ng)
    const back = after(typed, { do: 'undo' })
    expect([textOf(back, hn), textOf(back, ng)]).toEqual(['120', undefined])
  })
  test('a removed reading comes back with all that was said of it', () => {
    const full = after(
      blank(),
      type(hn, '119.6'),
      { do: 'set', ...at(hn), part: { upper: '121', note: 'fan running' } },
      { do: 'remove', ...at(hn) },
    )
    expect(textOf(full, hn)).toBeUndefined()
    expect(readingOf(after(full, { do: 'undo' }), 'battery', hn)).toEqual({
      kind: 'reading',
      text: '119.6',
      upper: '121',
      note: 'fan running',
    })
  })
  test('an emptied field leaves no entry behind', () => {
    expect(after(blank(), type(hn, '5'), type(hn, '')).entries['battery']).toEqual({})
  })
  test('undo on a new sheet changes nothing, and forty steps are kept at most', () => {
    const sheet = blank()
    expect(reduce(sheet, { do: 'undo' })).toBe(sheet)
    const many = Array.from({ length: 60 }, (_, i): Action[] => [
      type(hn, String(i + 1)),
      { do: 'settle' },
    ]).flat()
    expect(after(sheet, ...many).past).toHaveLength(40)
  })
  test('a reading that was reached after all is no longer out of reach', () => {
    const set = after(blank(), { do: 'set', ...at(hn), part: { unreachable: true } })
    expect(readingOf(set, 'battery', hn)?.unreachable).toBe(true)
    expect(readingOf(after(set, type(hn, '120')), 'battery', hn)?.unreachable).toBeUndefined()
  })
  test('taken again with another meter, the number before stays behind', () => {
    const again = after(blank(), type(ng, '56.8'), {
      do: 'again',
      ...at(ng),
      meterOhms: 3000,
      was: 10_000_000,
    })
    expect(readingOf(again, 'battery', ng)).toEqual({
      kind: 'reading',
      text: '',
      meterOhms: 3000,
      earlier: { text: '56.8', meterOhms: 10_000_000 },
    })
  })
  test('modes with findings stay in sight when the source changes', () => {
    const pass: Action = { do: 'type', mode: 'pass-through', id: hn, of: hn, text: '120' }
    const changed = after(blank(), pass, {
      do: 'context',
      ...context,
      source: 'generator',
      modes: ['generator'],
    })
    expect(changed.moreModes).toEqual(['pass-through'])
    expect(changed.mode).toBe('generator')
    expect(after(changed, { do: 'undo' }).context.source).toBe('all-in-one-inverter')
  })
})

describe('what if', () => {
  const kept = () => after(blank(), type(hn, '120'), { do: 'settle' })
  const tried = () => after(kept(), { do: 'what-if' }, type(hn, '60'))
  test('tries without keeping', () => {
    expect(tried().entries).toEqual(kept().entries)
    expect(textOf(tried(), hn)).toBe('60')
  })
  test('dropped, all is as before; kept, it is typed; both can be taken back', () => {
    const dropped = after(tried(), { do: 'drop-what-if' })
    expect([dropped.whatIf, textOf(dropped, hn)]).toEqual([null, '120'])
    expect(textOf(after(dropped, { do: 'undo' }), hn)).toBe('60')
    const keeps = after(tried(), { do: 'keep-what-if' })
    expect([keeps.whatIf, textOf(keeps, hn)]).toEqual([null, '60'])
  })
})

describe('what the core is given', () => {
  test.each([
    ['119.6', 119.6],
    ['119,6', 119.6],
    [' 57 ', 57],
    ['5.', 5],
    ['.5', 0.5],
    ['', undefined],
    ['-3', undefined],
    ['1e3', undefined],
    ['12a', undefined],
  ])('“%s” is %s', (text, value) => expect(numberIn(text)).toBe(value))

  test('findings of the mode in view, and the others by mode, with instruments and limits', () => {
    const sheet = after(
      blank(),
      type(hn, '119,6'),
      { do: 'set', ...at(ng), part: { text: '40', upper: '60' } },
      type('receptacle.ng.ohms', 'OL'),
      { do: 'set', ...at('receptacle.hg.volts'), part: { text: '57', meterOhms: 3000 } },
      { do: 'observe', mode: 'pass-through', id: 'tingle', value: 'no', by: 'owner', of: 'Tingle' },
    )
    expect(rawSheetOf(edition, sheet)).toEqual({
      context: {
        source: 'all-in-one-inverter',
        system: '120',
        wiring: 'panel',
        mode: 'battery',
        meterOhms: 10_000_000,
      },
      findings: {
        [hn]: 119.6,
        [ng]: { value: 40, between: [40, 60] },
        'receptacle.ng.ohms': { overLimit: true },
        'receptacle.hg.volts': { value: 57, meterOhms: 3000 },
      },
      otherModes: { 'pass-through': { tingle: 'no' } },
    })
  })
  test('what can’t be reached was not taken', () => {
    const sheet = after(blank(), type(hn, '120'), { do: 'set', ...at(hn), part: { unreachable: true } })
    expect(rawSheetOf(edition, sheet).findings).toEqual({})
  })
  test('an entry that is no number is named beside its field, and blinds nothing else', () => {
    const sheet = after(blank(), type(hn, '119.6'), type(ng, 'abc'))
    const { sheet: read, errors } = readWhatCanBe(edition, rawSheetOf(edition, sheet))
    expect(read?.taken.map((t) => t.id)).toEqual([hn])
    expect(errorAt(errors, sheet, 'battery', ng)).toBe('must be a number')
    expect(errorAt(errors, sheet, 'battery', hn)).toBeUndefined()
  })
  test('a meter whose ohms are not typed yet is an error, and counts as the lightest', () => {
    const sheet = newSheet('Cabin', { ...context, meter: { kind: 'low', ohms: '' } }, 'battery')
    const { sheet: read, errors } = readWhatCanBe(edition, rawSheetOf(edition, sheet))
    expect(errors['context.meterOhms']).toBeDefined()
    expect(read?.context.meterOhms).toBe(10_000_000)
    expect(meterOhmsOf({ kind: 'low', ohms: '3000' })).toBe(3000)
  })
  test('a stored sheet reads back as it was', () => {
    const sheet = after(blank(), type(hn, '119.6'), { do: 'what-if' }, type(ng, '7'))
    expect(SheetContent.parse(structuredClone(sheet))).toEqual(sheet)
  })
})

describe('a slipped point is asked about, never mended', () => {
  const reading = () => edition.readings.get(hn)!
  test.each([
    ['572', '57.2'],
    ['1196', '119.6'],
    ['12100', '121'],
  ])('%s: meant %s?', (text, meant) => expect(meantBy(text, reading(), 120)?.text).toBe(meant))
  test('up to 2.5 × nominal nothing is asked, on 120 and on 230', () => {
    expect(meantBy('300', reading(), 120)).toBeUndefined()
    expect(meantBy('572', reading(), 230)).toBeUndefined()
    expect(meantBy('576', reading(), 230)?.text).toBe('57.6')
  })
  test('leg to leg is twice the system’s voltage; ohms are never asked about', () => {
    const legs = edition.readings.get('panel.l1l2.volts')!
    expect(meantBy('590', legs, 120)).toBeUndefined()
    expect(meantBy('2400', legs, 120)?.text).toBe('240')
    expect(meantBy('5000', edition.readings.get('receptacle.ng.ohms')!, 120)).toBeUndefined()
  })
})

describe('places', () => {
  const names = (system: string, wiring: string) =>
    placesOf(edition, { system, wiring }).map((place) => place.label)
  test('as the wiring has them', () => {
    expect(names('120', 'panel')).toEqual(['Source', 'Feeder', 'Panel', 'Receptacle', 'Rod'])
    expect(names('120', 'direct')).toEqual(['Source', 'Its receptacle'])
  })
  test('every reading of the context lies at exactly one place', () => {
    for (const system of ['120', '120/240', '230'])
      for (const wiring of ['panel', 'direct']) {
        const all = placesOf(edition, { system, wiring }).flatMap((place) =>
          readingsAt(place).map((r) => r.id),
        )
        expect(new Set(all).size).toBe(all.length)
        const fitting = edition.file.readings.filter(
          (r) => (r.systems?.includes(system) ?? true) && (r.wirings?.includes(wiring) ?? true),
        )
        expect([...all].sort()).toEqual(fitting.map((r) => r.id).sort())
      }
  })
  test('what is clamped on a circuit is typed where it ends', () => {
    expect(placeOf(placesOf(edition, { system: '120', wiring: 'panel' }), 'branch.egc.amps')?.id).toBe(
      'receptacle',
    )
  })
})

describe('which test is put first', () => {
  const offersFor = async (sheet: SheetContent) => {
    const { sheet: read } = readWhatCanBe(edition, rawSheetOf(edition, sheet))
    return offersOf(edition, sheet, (await diagnose(edition, read!)).nextTests)
  }
  test('most bits a minute, and changing the mode counts', async () => {
    const { open } = await offersFor(after(blank(), type(hn, '119.6')))
    const worth = open.map((offer) => offer.next.gainBits / offer.minutes)
    expect(worth).toEqual([...worth].sort((a, b) => b - a))
    for (const offer of open)
      expect(offer.minutes).toBe(offer.test.minutes + (offer.mode === 'battery' ? 0 : modeChangeMinutes))
  })
  test('put aside, it waits; taken up again, it is back', async () => {
    const sheet = after(blank(), type(hn, '119.6'))
    const first = (await offersFor(sheet)).open[0]!
    const aside = after(sheet, { do: 'skip', test: first.key, of: first.test.label })
    const without = await offersFor(aside)
    expect(without.open.map((offer) => offer.key)).not.toContain(first.key)
    expect(without.skipped.map((offer) => offer.key)).toEqual([first.key])
    const back = await offersFor(after(aside, { do: 'take-up', test: first.key, of: first.test.label }))
    expect(back.open[0]?.key).toBe(first.key)
  })
  test('a test of which nothing can be reached is not offered', async () => {
    const unreached = ['hn', 'ng', 'hg'].map((pair): Action => ({
      do: 'set',
      ...at(`panel.${pair}.volts`),
      part: { unreachable: true },
    }))
    const { open } = await offersFor(after(blank(), ...unreached))
    expect(open.map((offer) => offer.key)).not.toContain('panel-volts battery')
    expect(open.map((offer) => offer.key)).toContain('panel-volts pass-through')
  })
  test('done is folded to its answers', () => {
    const sheet = after(blank(), type(hn, '119.6'), type(ng, '56.8'), type('receptacle.hg.volts', '57.2'), {
      do: 'observe',
      ...at('tingle'),
      value: 'no',
      by: 'owner',
    })
    const done = doneTests(edition, sheet)
    expect(done.map((one) => one.test.id)).toEqual(['receptacle-volts'])
    expect(done[0]?.answers).toContain('119.6')
  })
})

test('findings are found by any word of them, and only those that this context has', () => {
  const ids = (query: string, wiring = 'panel') =>
    findFindings(edition, { system: '120', wiring }, query).map((one) => one.id)
  expect(ids('plug-in')).toContain('gfci.plug-test')
  expect(ids('tingle')[0]).toBe('tingle')
  expect(ids('panel neutral ground')).toContain('panel.ng.volts')
  expect(ids('panel neutral ground', 'direct')).not.toContain('panel.ng.volts')
  expect(ids('zzz')).toEqual([])
})

test('shares and bits in words', () => {
  expect([0, 0.001, 0.614, 1].map(percent)).toEqual(['0', '<1', '61', '100'])
  expect([1, 2, 3, 4, 5, -1, -5].map(strengthOf)).toEqual([
    'Slight, for',
    'Some, for',
    'Good, for',
    'Strong, for',
    'Near certain, for',
    'Slight, against',
    'Near certain, against',
  ])
})
