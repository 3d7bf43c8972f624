/** The run of wire, and which readings lie at each place of it. */
import { fitsContext } from '../../rules/edition/open.ts'
import type { Edition } from '../../rules/edition/open.ts'
import type { Reading } from '../../rules/edition/schema.ts'
import type { Side } from '../../rules/triangle/sides.ts'

export type Seats = Readonly<Record<Side, Reading>>
type Group = { id: string; title: string; caution: string | undefined; readings: readonly Reading[] }
export type Place = {
  id: string
  label: string
  /** The three readings of the triangle, where there are three. */
  seats: Seats | undefined
  groups: readonly Group[]
}

/** From the source on. What is clamped along a circuit is read where that circuit ends. */
const run = ['source', 'feeder', 'panel', 'receptacle', 'rod'] as const
const foldedInto = (place: string, wiring: string): string => {
  if (place === 'branch') return 'receptacle'
  // Plugged in directly there are two places, so the rod's one reading stands with the source.
  return place === 'rod' && wiring === 'direct' ? 'source' : place
}

type Kind = { id: string; title: string; caution?: string; holds: (reading: Reading) => boolean }
/** In the order they are taken: the first that holds has the reading. */
const kinds: readonly Kind[] = [
  {
    id: 'bulb',
    title: 'Test bulb',
    caution:
      'Qualified people only. Fused leads, filament bulb rated for leg-to-leg volts; ground read by meter first; nobody touches metal.',
    holds: (reading) => reading.id.includes('bulb.'),
  },
  { id: 'loaded', title: 'With the load on', holds: (reading) => reading.loaded === true },
  { id: 'legs', title: 'Legs', holds: (reading) => reading.pair?.startsWith('l') === true },
  {
    id: 'dead',
    title: 'Source off',
    caution:
      'First: every source listed, off, locked, absence of voltage verified (“proved dead”); backfeed looked for.',
    holds: (reading) => reading.dead === true,
  },
  { id: 'amps', title: 'Amps', holds: (reading) => reading.unit === 'A' || reading.unit === 'mA' },
  { id: 'other', title: 'Other', holds: () => true },
]

function seatsOf(edition: Edition, place: string): Seats | undefined {
  const [hn, ng, hg] = ['hn', 'ng', 'hg'].map((pair) => edition.readings.get(`${place}.${pair}.volts`))
  return hn && ng && hg ? { hn, ng, hg } : undefined
}

function groupsOf(readings: readonly Reading[]): Group[] {
  const kindOf = (reading: Reading) => kinds.find((kind) => kind.holds(reading))
  return kinds.flatMap((kind) => {
    const own = readings.filter((reading) => kindOf(reading) === kind)
    return own.length === 0 ? [] : [{ id: kind.id, title: kind.title, caution: kind.caution, readings: own }]
  })
}

/** The places that this context has, from the source on. */
export function placesOf(edition: Edition, context: { system: string; wiring: string }): Place[] {
  const fitting = edition.file.readings.filter((reading) => fitsContext(reading, context))
  return run.flatMap((id): Place[] => {
    const here = fitting.filter((reading) => foldedInto(reading.place, context.wiring) === id)
    if (here.length === 0) return []
    const seats = seatsOf(edition, id)
    const taken = new Set<string>(seats === undefined ? [] : Object.values(seats).map((seat) => seat.id))
    const own = edition.file.places.find((place) => place.id === id)
    const label = context.wiring === 'direct' && id === 'receptacle' ? 'Its receptacle' : (own?.short ?? id)
    return [{ id, label, seats, groups: groupsOf(here.filter((reading) => !taken.has(reading.id))) }]
  })
}

/** Every reading of a place, the triangle's first. */
export const readingsAt = (place: Place): Reading[] => [
  ...(place.seats === undefined ? [] : [place.seats.hn, place.seats.ng, place.seats.hg]),
  ...place.groups.flatMap((group) => group.readings),
]

/** The place a reading is typed at. */
export const placeOf = (places: readonly Place[], id: string): Place | undefined =>
  places.find((place) => readingsAt(place).some((reading) => reading.id === id))
