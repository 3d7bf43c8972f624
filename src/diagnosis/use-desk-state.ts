import { useCallback, useEffect, useMemo, useRef, useState } from 'react'
import type { Edition } from '../../rules/edition/open.ts'
import type { FieldErrors } from '../../rules/findings/parse.ts'
import { useTouch } from '../ui/use-touch.ts'
import type { Chosen, Desk } from './desk.ts'
import { placeOf, placesOf } from './places.ts'
import { meterOhmsOf } from './raw-sheet.ts'
import type { OpenSheet } from './use-sheet.ts'

/** Where the cursor is, where it goes next, and what is in sight: the state of the page that nobody typed. */
export function useDeskState(edition: Edition, sheet: OpenSheet, errors: FieldErrors): Desk {
  const { typed, stored, dispatch } = sheet
  const { system, wiring, meter } = typed.context
  const places = useMemo(() => placesOf(edition, { system, wiring }), [edition, system, wiring])
  const [at, setAt] = useState('receptacle')
  const place = places.find((one) => one.id === at) ?? places.find((one) => one.id === 'receptacle')
  const [chosen, setChosen] = useState<Chosen>()
  const [typing, setTyping] = useState(false)
  const [asking, setAsking] = useState<readonly string[]>([])
  const [sequence, setSequence] = useState<readonly string[]>([])
  const [wanted, setWanted] = useState<Chosen>()
  const inputs = useRef(new Map<string, HTMLInputElement>())
  const ownPad = useTouch()

  const seats = place?.seats
  const sides = useMemo(() => (seats === undefined ? [] : [seats.hn.id, seats.ng.id, seats.hg.id]), [seats])
  // The sides of the triangle keep their order, whichever test asked for them.
  const order = useCallback((id: string) => (sides.includes(id) ? sides : sequence), [sequence, sides])
  const following = useCallback(
    (id: string): string | undefined => {
      const ids = order(id)
      const index = ids.indexOf(id)
      return index < 0 ? undefined : ids[index + 1]
    },
    [order],
  )

  /** At once where the field is in sight, so that no key typed meanwhile goes astray. */
  const focus = useCallback((next: Chosen) => {
    const input = inputs.current.get(`${next.id} ${next.which}`)
    input?.focus()
    // In a group that is still shut it can't take the cursor.
    if (input === undefined || document.activeElement !== input) return setWanted(next)
    input.scrollIntoView({ block: 'nearest' })
  }, [])
  // A field may only come into being with the place or the group it lies in, so the cursor follows after the draw.
  useEffect(() => {
    if (wanted === undefined) return
    const input = inputs.current.get(`${wanted.id} ${wanted.which}`)
    input?.focus()
    input?.scrollIntoView({ block: 'nearest' })
  }, [wanted])

  const go = useCallback(
    (findings: readonly string[], mode?: string) => {
      const readings = findings.filter((id) => edition.readings.has(id))
      const [first] = findings
      if (first === undefined) return
      if (mode !== undefined) dispatch({ do: 'look', mode })
      setAsking(findings.filter((id) => edition.observations.has(id)))
      setSequence(readings)
      const [reading] = readings
      if (reading === undefined) return
      const where = placeOf(places, reading)
      if (where !== undefined) setAt(where.id)
      setChosen({ id: reading, which: 'lower' })
      if (first === reading) focus({ id: reading, which: 'lower' })
    },
    [edition, dispatch, places, focus],
  )

  return {
    edition,
    typed,
    stored,
    dispatch,
    errors,
    nominal: edition.systems.get(system)?.nominalVolts ?? 120,
    meterOhms: Number.isFinite(meterOhmsOf(meter)) ? meterOhmsOf(meter) : 10_000_000,
    places,
    place,
    lookAt: (id) => {
      setAt(id)
      setChosen(undefined)
    },
    chosen,
    typing,
    choose: (next) => {
      setChosen(next)
      setTyping(true)
    },
    leave: () => {
      setTyping(false)
      dispatch({ do: 'settle' })
    },
    go,
    focus,
    goOn: (id) => {
      const next = following(id)
      if (next !== undefined) focus({ id: next, which: 'lower' })
      else if (document.activeElement instanceof HTMLElement) document.activeElement.blur()
    },
    after: (id) => {
      if (following(id) === undefined) return undefined
      return order(id) === sides ? 'side' : 'reading'
    },
    register: (id, which) => (input) => {
      const name = `${id} ${which}`
      if (input === null) inputs.current.delete(name)
      else inputs.current.set(name, input)
    },
    asking,
    ask: setAsking,
    ownPad,
  }
}
