import { createContext, useContext } from 'react'
import type { Edition } from '../../rules/edition/open.ts'
import type { FieldErrors } from '../../rules/findings/parse.ts'
import type { Place } from './places.ts'
import type { SheetContent } from './sheet-content.ts'
import type { Action } from './sheet-state.ts'

/** Which number is typed into. */
export type Chosen = { id: string; which: 'lower' | 'upper' }

/** What all parts of an open sheet share. Data flows down; changes go up as actions. */
export type Desk = {
  edition: Edition
  typed: SheetContent
  stored: SheetContent
  dispatch: (action: Action) => void
  errors: FieldErrors
  /** What was typed last does not lie on the device. */
  unkept: boolean
  /** Of the system, volts. */
  nominal: number
  /** Of the sheet's meter, ohms; 10 MΩ while a low one is not typed in full. */
  meterOhms: number
  places: readonly Place[]
  place: Place | undefined
  lookAt: (place: string) => void
  /** The field last chosen; its strip stays until another is. */
  chosen: Chosen | undefined
  /** Whether the cursor is in it. */
  typing: boolean
  choose: (chosen: Chosen) => void
  leave: () => void
  /** Goes to the first of these findings, wherever it is, and puts the cursor there. */
  go: (findings: readonly string[], mode?: string) => void
  /** Puts the cursor into a field that is in sight. */
  focus: (chosen: Chosen) => void
  /** Goes on to what is typed after this reading; out of the fields after the last. */
  goOn: (id: string) => void
  /** Whether something is typed after this reading, and whether it is a side of the triangle. */
  after: (id: string) => 'side' | 'reading' | undefined
  /** Keeps a field's input, so that `go` finds it. */
  register: (id: string, which: Chosen['which']) => (input: HTMLInputElement | null) => void
  /** Observations whose answers are asked for now. */
  asking: readonly string[]
  ask: (observations: readonly string[]) => void
  /** Our own number pad is up instead of the system's keyboard. */
  ownPad: boolean
}

export const DeskContext = createContext<Desk | undefined>(undefined)

/** The open sheet that this part stands on. */
export function useDesk(): Desk {
  const desk = useContext(DeskContext)
  if (desk === undefined) throw new Error('no sheet is open around this part')
  return desk
}
