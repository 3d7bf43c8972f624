import type { Edition } from '../edition/open.ts'
import { modesOf } from '../findings/facts.ts'
import type { Sheet, Taken, TakenReading } from '../findings/sheet.ts'
import type { Stop } from './diagnosis-types.ts'

type Look = { value: (id: string) => number | string | undefined; nominal: number; system: string }
/** One thing that stops: its words' id, and the findings that say so. */
type Says = { id: string; findings: string[] }

const places = ['receptacle', 'panel', 'source'] as const

/** What people answer that stops at once. */
const answers: readonly [string, string, string][] = [
  ['shock', 'yes', 'shock'],
  ['tingle', 'yes', 'tingle'],
  ['smoke-or-arcing', 'yes', 'smoke-or-arcing'],
  ['smell', 'burnt', 'smell-burnt'],
  ['smell', 'fishy', 'smell-fishy'],
  ['smell', 'egg', 'smell-egg'],
  ['smell', 'exhaust', 'smell-exhaust'],
  ['heat', 'burnt', 'heat-burnt'],
  ['wet', 'yes', 'wet'],
  ['battery', 'hot-swollen-hissing', 'battery'],
  ['engine.place', 'indoors', 'engine-indoors'],
  ['engine.place', 'near-opening', 'engine-near-opening'],
  ['two-sources-joined', 'yes', 'two-sources-joined'],
  ['headache', 'yes', 'headache'],
  ['lights', 'too-bright', 'lights-too-bright'],
  ['bulb.ng', 'bright', 'bulb-neutral-live'],
]

function* answersThatStop({ value, system }: Look): Generator<Says> {
  for (const [finding, answer, id] of answers)
    if (value(finding) === answer) yield { id, findings: [finding] }
  if (value('heat') === 'warm' && value('buzz') === 'yes')
    yield { id: 'heat-warm-and-buzz', findings: ['heat', 'buzz'] }
  if (value('lights') === 'some-bright-some-dim' && system === '120/240')
    yield { id: 'some-bright-some-dim', findings: ['lights'] }
}

function* readingsThatStop({ value, nominal }: Look): Generator<Says> {
  const volts = (id: string): number | undefined => {
    const v = value(id)
    return typeof v === 'number' ? v : undefined
  }
  const over = (id: string, limit: number) => (volts(id) ?? -Infinity) > limit
  const [l1, l2] = ['panel.l1n.volts', 'panel.l2n.volts']
  const [a, b] = [volts(l1), volts(l2)]
  // 104 V and 132 V: ANSI C84.1 utilization range B's lower end, and ten per cent above nominal.
  const unequal = (x: number, y: number) => (x < 104 && y > 120) || (x > 132 && y < 120)
  if (a !== undefined && b !== undefined && (unequal(a, b) || unequal(b, a)))
    yield { id: 'legs-unequal', findings: [l1, l2] }
  if (over('source.bulb.hn.volts', 1.3 * nominal))
    yield { id: 'over-voltage', findings: ['source.bulb.hn.volts'] }
  for (const place of places) {
    for (const id of [`${place}.hn.volts`, `${place}.hn.volts.loaded`])
      if (over(id, 1.3 * nominal)) yield { id: 'over-voltage', findings: [id] }
    const [hn, ng] = [`${place}.hn.volts`, `${place}.ng.volts`]
    if (over(hn, 0.75 * nominal) && over(ng, 0.75 * nominal)) yield { id: 'neutral-live', findings: [hn, ng] }
  }
  const source = volts('source.hn.volts')
  if (source !== undefined && source < 0.1 * nominal && over('panel.hn.volts', 0.5 * nominal))
    yield { id: 'fed-from-elsewhere', findings: ['source.hn.volts', 'panel.hn.volts'] }
  if (over('source.ng.volts.dc', 60)) yield { id: 'dc-on-neutral', findings: ['source.ng.volts.dc'] }
  if ((volts('receptacle.ge.volts') ?? 0) >= 50)
    yield { id: 'ground-to-earth-live', findings: ['receptacle.ge.volts'] }
  for (const id of ['bulb.ng.volts', 'source.bulb.ng.volts'])
    if (over(id, 0.75 * nominal)) yield { id: 'bulb-neutral-live', findings: [id] }
}

const ghostly = 1_000_000 // ohms: from here a voltage to ground or earth may be a ghost

/** Findings whose voltage a light meter can leave standing as a ghost. */
const canBeGhost = new Set(['ground-to-earth-live', 'neutral-live'])

/**
 * Everything found, in any mode, that stops: make safe, call a professional, before any ranking.
 * A closed list (common practice; 50 V: IEC 61140 and IEC 60364-4-41, from memory).
 */
export function stopsOf(edition: Edition, sheet: Sheet): Stop[] {
  const nominal = edition.systems.get(sheet.context.system)?.nominalVolts ?? 120
  return modesOf(sheet).flatMap((mode) => {
    const here = new Map<string, Taken>(sheet.taken.filter((t) => t.mode === mode).map((t) => [t.id, t]))
    const ends = (pick: (r: TakenReading) => number): Look => ({
      value: (id) => {
        const one = here.get(id)
        return one?.kind === 'reading' ? pick(one) : one?.value
      },
      nominal,
      system: sheet.context.system,
    })
    // An unsteady reading stops with either of its two numbers.
    const looks = [ends((r) => r.between?.[1] ?? r.value), ends((r) => r.between?.[0] ?? r.value)]
    const found = looks.flatMap((look) => [...answersThatStop(look), ...readingsThatStop(look)])
    const once = new Map(found.map((s) => [s.id + s.findings.join(), s]))
    return [...once.values()].map(({ id, findings }) => ({
      id,
      findings,
      mode,
      mayBeGhost:
        canBeGhost.has(id) &&
        findings.every((f) => {
          const one = here.get(f)
          return one?.kind === 'reading' && one.meterOhms >= ghostly
        }),
    }))
  })
}
