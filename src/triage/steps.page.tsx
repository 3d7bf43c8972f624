import type { ReactNode } from 'react'
import { Navigate, useParams } from 'react-router-dom'
import { FeedsStep } from './feeds-step.tsx'
import { LampsStep } from './lamps-step.tsx'
import { NoticeStep } from './notice-step.tsx'
import { insteadOf } from './step-gate.ts'
import { useTriage } from './triage-store.tsx'

const screens: Readonly<Record<number, () => ReactNode>> = { 2: FeedsStep, 3: NoticeStep, 4: LampsStep }

/** Steps 2 to 4, by their number, where they may open. */
export function Component() {
  const step = Number(useParams()['step'])
  const { triage } = useTriage()
  const Screen = screens[step]
  if (Screen === undefined) return <Navigate to="/check/1" replace />
  const instead = insteadOf(step, triage)
  return instead === undefined ? <Screen /> : <Navigate to={instead} replace />
}
