import { expect, test } from 'vitest'
import type { RawFinding } from '../../rules/findings/sheet.ts'
import { stopsOf } from '../../rules/ranking/stop.ts'
import { european, generator, sheetOf, splitPhase, starter, volts } from '../edition.ts'
import type { CaseContext } from '../edition.ts'

type Row = [
  says: string,
  context: CaseContext,
  findings: Record<string, RawFinding>,
  stop: string | undefined,
]

// The closed list of the command line's contract, each finding alone; the ones that must not stop beside them.
const rows: Row[] = [
  ['a shock', generator, { shock: 'yes' }, 'shock'],
  ['no shock', generator, { shock: 'no' }, undefined],
  ['a tingle is a shock', generator, { tingle: 'yes' }, 'tingle'],
  ['smoke or sparks', generator, { 'smoke-or-arcing': 'yes' }, 'smoke-or-arcing'],
  ['a burnt smell', generator, { smell: 'burnt' }, 'smell-burnt'],
  ['a fishy smell', generator, { smell: 'fishy' }, 'smell-fishy'],
  ['a smell of rotten egg', generator, { smell: 'egg' }, 'smell-egg'],
  ['engine exhaust', generator, { smell: 'exhaust' }, 'smell-exhaust'],
  ['no smell', generator, { smell: 'none' }, undefined],
  ['scorched', generator, { heat: 'burnt' }, 'heat-burnt'],
  ['warm alone is a caution', generator, { heat: 'warm' }, undefined],
  ['buzzing alone', generator, { buzz: 'yes' }, undefined],
  ['warm and buzzing', generator, { heat: 'warm', buzz: 'yes' }, 'heat-warm-and-buzz'],
  ['water', generator, { wet: 'yes' }, 'wet'],
  ['a hissing battery', generator, { battery: 'hot-swollen-hissing' }, 'battery'],
  ['an engine indoors', generator, { 'engine.place': 'indoors' }, 'engine-indoors'],
  ['an engine near a window', generator, { 'engine.place': 'near-opening' }, 'engine-near-opening'],
  ['an engine well away', generator, { 'engine.place': 'outdoors-away' }, undefined],
  ['two sources joined', generator, { 'two-sources-joined': 'yes' }, 'two-sources-joined'],
  ['nobody can tell whether they are joined', generator, { 'two-sources-joined': 'cannot-tell' }, undefined],
  ['a headache', generator, { headache: 'yes' }, 'headache'],
  ['lights too bright', generator, { lights: 'too-bright' }, 'lights-too-bright'],
  [
    'some bright, some dim on two legs',
    splitPhase,
    { lights: 'some-bright-some-dim' },
    'some-bright-some-dim',
  ],
  ['some bright, some dim on one leg', generator, { lights: 'some-bright-some-dim' }, undefined],
  ['legs at 103 and 121 V', splitPhase, { 'panel.l1n.volts': 103, 'panel.l2n.volts': 121 }, 'legs-unequal'],
  ['legs at 119 and 133 V', splitPhase, { 'panel.l1n.volts': 119, 'panel.l2n.volts': 133 }, 'legs-unequal'],
  ['legs at 104 and 121 V', splitPhase, { 'panel.l1n.volts': 104, 'panel.l2n.volts': 121 }, undefined],
  ['legs at 125 and 133 V', splitPhase, { 'panel.l1n.volts': 125, 'panel.l2n.volts': 133 }, undefined],
  ['157 V hot–neutral on 120 V', generator, { 'receptacle.hn.volts': 157 }, 'over-voltage'],
  ['156 V hot–neutral on 120 V', generator, { 'receptacle.hn.volts': 156 }, undefined],
  ['157 V loaded', generator, { 'panel.hn.volts.loaded': 157 }, 'over-voltage'],
  ['157 V at the source with the bulb on', generator, { 'source.bulb.hn.volts': 157 }, 'over-voltage'],
  ['300 V hot–neutral on 230 V', european, { 'source.hn.volts': 300 }, 'over-voltage'],
  ['298 V hot–neutral on 230 V', european, { 'source.hn.volts': 298 }, undefined],
  ['neutral or metal live', generator, volts(120, 0.3, 119.5), 'neutral-live'],
  ['half on both', generator, volts(120, 60, 60), undefined],
  ['full neutral–ground, hot–neutral at nothing', generator, volts(0.2, 120, 120), undefined],
  ['fed from elsewhere', generator, { 'source.hn.volts': 11, 'panel.hn.volts': 61 }, 'fed-from-elsewhere'],
  ['source at 12 V', generator, { 'source.hn.volts': 12, 'panel.hn.volts': 61 }, undefined],
  ['61 V DC on neutral', generator, { 'source.ng.volts.dc': 61 }, 'dc-on-neutral'],
  ['60 V DC on neutral', generator, { 'source.ng.volts.dc': 60 }, undefined],
  ['50 V ground to earth', generator, { 'receptacle.ge.volts': 50 }, 'ground-to-earth-live'],
  ['49.9 V ground to earth', generator, { 'receptacle.ge.volts': 49.9 }, undefined],
  ['the bulb bright between neutral and ground', generator, { 'bulb.ng': 'bright' }, 'bulb-neutral-live'],
  ['the bulb dim between neutral and ground', generator, { 'bulb.ng': 'dim' }, undefined],
  ['91 V across the bulb', generator, { 'bulb.ng.volts': 91 }, 'bulb-neutral-live'],
  ['91 V across the bulb at the source', generator, { 'source.bulb.ng.volts': 91 }, 'bulb-neutral-live'],
  ['90 V across the bulb', generator, { 'bulb.ng.volts': 90 }, undefined],
]

test.each(rows)('%s', (_, context, findings, stop) => {
  const found = stopsOf(starter, sheetOf(context, findings)).map((s) => s.id)
  expect(found).toEqual(stop === undefined ? [] : [stop])
})

test('a stop found in another mode stops too', () => {
  const sheet = sheetOf(
    { source: 'all-in-one-inverter', system: '120', wiring: 'panel' },
    {},
    { battery: {}, 'pass-through': { tingle: 'yes' } },
  )
  expect(stopsOf(starter, sheet)).toMatchObject([{ id: 'tingle', mode: 'pass-through' }])
})

test('ground to earth at a megohm or more may be a ghost, under a low-resistance meter it is not said', () => {
  const at = (meterOhms: number) =>
    stopsOf(starter, sheetOf({ ...generator, meterOhms }, { 'receptacle.ge.volts': 76 }))[0]
  expect(at(10_000_000)?.mayBeGhost).toBe(true)
  expect(at(400_000)?.mayBeGhost).toBe(false)
})

test('every stop has its own words', () => {
  const words = new Set(starter.file.stops.map((s) => s.id))
  const ids = rows.flatMap(([, , , id]) => id ?? [])
  expect(ids.filter((id) => !words.has(id))).toEqual([])
})
