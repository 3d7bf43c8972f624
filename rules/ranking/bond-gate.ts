import type { Edition } from '../edition/open.ts'
import { modesOf } from '../findings/facts.ts'
import type { Sheet, TakenReading } from '../findings/sheet.ts'
import type { Bond, BondLine } from './diagnosis-types.ts'

const places = ['receptacle', 'panel', 'source'] as const

type Here = {
  reading: (id: string) => TakenReading | undefined
  observed: (id: string) => string | undefined
  nominal: number
  /** Most volts across the bulb that still say nothing holds it. */
  limit: number
}

function inMode(edition: Edition, sheet: Sheet, mode: string): Here {
  const nominal = edition.systems.get(sheet.context.system)?.nominalVolts ?? 120
  const taken = new Map(sheet.taken.filter((t) => t.mode === mode).map((t) => [t.id, t]))
  return {
    reading: (id) => {
      const one = taken.get(id)
      return one?.kind === 'reading' ? one : undefined
    },
    observed: (id) => {
      const one = taken.get(id)
      return one?.kind === 'observation' ? one.value : undefined
    },
    nominal,
    limit: nominal === 230 ? 4 : 2,
  }
}

// The gate reads an unsteady reading at whichever of its two numbers keeps the bond held back.
const most = (r: TakenReading | undefined) => r && (r.between?.[1] ?? r.value)
const least = (r: TakenReading | undefined) => r && (r.between?.[0] ?? r.value)

/** Something found in this mode that speaks of a tie already there, or of a balanced output. */
function objection(h: Here): string | undefined {
  for (const place of places) {
    const ohms = least(h.reading(`${place}.ng.ohms`))
    if (ohms !== undefined && ohms < 5)
      return `Neutral to ground at the ${place} reads under 5 Ω: they are tied already`
  }
  for (const place of places) {
    const [hn, hg, ng] = ['hn', 'hg', 'ng'].map((pair) => h.reading(`${place}.${pair}.volts`))
    if (hn === undefined || hg === undefined || ng === undefined) continue
    const live = (most(hn) ?? 0) >= 0.5 * h.nominal
    const base = most(hn) ?? 0
    const tied = (a: TakenReading, b: TakenReading) =>
      (most(a) ?? 0) > 0.9 * (least(hn) ?? 0) && (least(b) ?? Infinity) < 0.05 * base
    if (live && (tied(hg, ng) || tied(ng, hg))) return `At the ${place} ground holds on one of the two wires`
    const between = (r: TakenReading) =>
      (most(r) ?? 0) >= 0.25 * (least(hn) ?? 0) && (least(r) ?? Infinity) <= 0.75 * base
    const heavy = Math.min(hg.meterOhms, ng.meterOhms) <= 10_000
    if (live && heavy && between(hg) && between(ng))
      return `At the ${place} ground stays between the wires against a low-resistance meter: a balanced output`
  }
  for (const id of ['bulb.ng', 'bulb.hg']) {
    const look = h.observed(id)
    if (look === 'dim' || look === 'bright') return 'A test bulb glowed to ground: something holds ground'
  }
  const across = most(h.reading('bulb.ng.volts'))
  if (across !== undefined && across > h.limit) return 'The test bulb kept volts between neutral and ground'
  return undefined
}

function linesIn(h: Here, against: string | undefined): BondLine[] {
  const [ng, hg, hn] = ['ng', 'hg', 'hn'].map((pair) => h.reading(`source.bulb.${pair}.volts`))
  const dark = (r: TakenReading | undefined) => (most(r) ?? Infinity) <= h.limit
  return [
    {
      line: 1,
      met: dark(ng) && dark(hg),
      says: `Test bulb at the source’s terminals: ${h.limit} V or less across it, neutral–ground and hot–ground`,
    },
    {
      line: 2,
      met: (least(hn) ?? 0) >= 0.9 * h.nominal,
      says: 'Hot–neutral stayed up while the bulb hung there',
    },
    {
      line: 3,
      met: h.observed('bulb.proved') === 'yes',
      says: 'Bulb proved on hot–neutral before and after',
    },
    {
      line: 4,
      met: h.observed('instructions.bond') === 'allowed',
      says: 'The manufacturer’s instructions allow a bond there',
    },
    {
      line: 5,
      met: against === undefined,
      says: against ?? 'Nothing found, in any mode, speaks of a tie already there',
    },
  ]
}

/**
 * Whether installing a bond may be shown as a repair: released when, and only when, all five lines hold in one
 * mode; line 5 looks at every mode. No share and no ohm reading ever releases it.
 */
export function bondGate(edition: Edition, sheet: Sheet): Bond {
  const modes = modesOf(sheet)
  const views = modes.map((mode) => inMode(edition, sheet, mode))
  const against = views.map(objection).find((o) => o !== undefined)
  const tried = modes.map((mode, i) => {
    const lines = linesIn(views[i]!, against)
    return { mode, lines, met: lines.filter((l) => l.met).length }
  })
  const best = tried.reduce((a, b) => (b.met > a.met ? b : a))
  return {
    state: best.met === best.lines.length ? 'released' : 'held-back',
    mode: best.mode,
    lines: best.lines,
  }
}
