import { useCallback, useEffect, useMemo, useRef, useState } from 'react'
import { useLocation, useNavigate } from 'react-router-dom'
import { queryOf } from '../../rules/worksheets/address.ts'
import type { Flat } from '../../rules/worksheets/address.ts'
import { Units } from '../../rules/worksheets/wire.ts'
import { computeWorksheet } from '../../rules/worksheets/worksheets.ts'
import type { Answer, WorksheetName } from '../../rules/worksheets/worksheets.ts'
import { convertUnits } from './convert-units.ts'
import type { Form } from './forms/parts.ts'
import { keepInputs, keepUnits, keptInputs } from './kept-inputs.ts'
import { readTyped } from './read-typed.ts'

/** Where the inputs came from: an example is not anybody's system, and the page says so. */
type From = 'address' | 'device' | 'example'
type State = { values: Flat; units: Units; from: From }

export type Worksheet = State & {
  answer: Answer
  /** Sets values; those left out stay. */
  change: (more: Flat) => void
  /** Puts all values anew. */
  replace: (values: Flat) => void
  switchUnits: (to: Units) => void
  /** Back to the example; returns the way back to what was typed. */
  beginAnew: () => () => void
}

// Typing must not write an address for every key: browsers refuse too many in a row.
const settleMs = 300

function fromAddress(search: string): State | undefined {
  const { units, ...values } = Object.fromEntries(new URLSearchParams(search))
  if (Object.keys(values).length === 0) return undefined
  return { values, units: Units.safeParse(units).data ?? 'american', from: 'address' }
}

async function fromDevice(name: WorksheetName, form: Form): Promise<State> {
  const { values: kept, units } = await keptInputs(name)
  if (kept === undefined) return { values: form.example(units), units, from: 'example' }
  const { units: its, ...values } = kept
  const then = Units.safeParse(its).data ?? 'american'
  return { values: form.hasUnits ? convertUnits(form, values, then, units) : values, units, from: 'device' }
}

/** The inputs of a worksheet: from its address, else from this device, else an example; kept in both as they change. */
export function useWorksheet(name: WorksheetName, form: Form): Worksheet | undefined {
  const { search } = useLocation()
  const navigate = useNavigate()
  const [state, setState] = useState<State | undefined>(() => fromAddress(search))
  /** The query this page wrote itself, and the inputs before a change of units, so that changing back is exact. */
  const written = useRef(search)
  const beforeUnits = useRef<{ before: State; after: Flat } | undefined>(undefined)

  useEffect(() => {
    // Opened without inputs, or left for the same page with none: what the device knows.
    if (state !== undefined) return
    let wanted = true
    void fromDevice(name, form).then((found) => wanted && setState(found))
    return () => {
      wanted = false
    }
  }, [name, form, state])

  useEffect(() => {
    if (search === written.current) return
    written.current = search
    setState(fromAddress(search))
  }, [search])

  useEffect(() => {
    if (state === undefined) return
    const all = form.hasUnits ? { units: state.units, ...state.values } : state.values
    if (state.from !== 'example') keepInputs(name, all)
    const timer = setTimeout(() => {
      const query = `?${queryOf(all)}`
      if (query === written.current) return
      written.current = query
      void navigate({ search: query }, { replace: true, preventScrollReset: true })
    }, settleMs)
    return () => clearTimeout(timer)
  }, [name, form, state, navigate])

  const replace = useCallback(
    (values: Flat) => setState((now) => now && { ...now, values, from: 'device' }),
    [],
  )
  const change = useCallback(
    (more: Flat) => setState((now) => now && { ...now, values: { ...now.values, ...more }, from: 'device' }),
    [],
  )
  const answer = useMemo(
    () => state && computeWorksheet(name, readTyped(form, state.values, state.units)),
    [name, form, state],
  )
  if (state === undefined || answer === undefined) return undefined
  return {
    ...state,
    answer,
    change,
    replace,
    switchUnits: (to) => {
      const { before, after } = beforeUnits.current ?? {}
      const back = before?.units === to && after === state.values
      const next = back
        ? before
        : state.from === 'example'
          ? { ...state, values: form.example(to), units: to }
          : { ...state, values: convertUnits(form, state.values, state.units, to), units: to }
      beforeUnits.current = { before: state, after: next.values }
      keepUnits(to)
      setState(next)
    },
    beginAnew: () => {
      setState({ ...state, values: form.example(state.units), from: 'example' })
      return () => setState(state)
    },
  }
}
