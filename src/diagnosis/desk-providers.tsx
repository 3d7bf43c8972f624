import type { ReactNode } from 'react'
import { DeskContext } from './desk.ts'
import type { Desk } from './desk.ts'
import { ExpectedContext, SelectedContext } from './expected.ts'
import type { Expected, SelectedCause } from './expected.ts'

type DeskProvidersProps = {
  desk: Desk
  selected: SelectedCause
  expected: Expected | undefined
  children: ReactNode
}

/** What every part of an open sheet can ask for: the sheet, the selected cause, and its bands. */
export function DeskProviders({ desk, selected, expected, children }: DeskProvidersProps) {
  return (
    <DeskContext value={desk}>
      <SelectedContext value={selected}>
        <ExpectedContext value={expected}>{children}</ExpectedContext>
      </SelectedContext>
    </DeskContext>
  )
}
