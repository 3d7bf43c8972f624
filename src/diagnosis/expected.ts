import { createContext, useContext } from 'react'
import type { Edges } from '../../rules/bands/place-in-band.ts'

/** What the selected cause lets one expect of the readings on this sheet. */
export type Expected = {
  cause: string
  /** The band of a reading through a meter of this resistance; undefined while it is computed, or where none is. */
  bandOf: (reading: string, meterOhms: number) => Edges | undefined
}

export const ExpectedContext = createContext<Expected | undefined>(undefined)
export const useExpectedHere = (): Expected | undefined => useContext(ExpectedContext)

/** The cause for which bands and loop are drawn: the leader, or one that was chosen. */
export type SelectedCause = {
  cause: string | undefined
  chosen: boolean
  /** Undefined: the leader again. */
  select: (cause: string | undefined) => void
}

export const SelectedContext = createContext<SelectedCause>({
  cause: undefined,
  chosen: false,
  select: () => undefined,
})
export const useSelected = (): SelectedCause => useContext(SelectedContext)
