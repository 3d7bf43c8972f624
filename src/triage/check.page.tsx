import { Navigate, Outlet, useParams } from 'react-router-dom'
import { useArticles, useEdition, useProcedures } from '../editions/edition.api.ts'
import { DangerStep } from './danger-step.tsx'
import { FeedsStep } from './feeds-step.tsx'
import { LampsStep } from './lamps-step.tsx'
import { NoticeStep } from './notice-step.tsx'
import { insteadOf } from './step-gate.ts'
import { TriageProvider, useTriage } from './triage-store.tsx'
import './triage.css'

export { StopNow } from './stop-now.tsx'

const steps = [DangerStep, FeedsStep, NoticeStep, LampsStep] as const

/** The check: its steps share the answers that lie on this device. What the result needs is fetched meanwhile. */
export function Component() {
  const { info } = useEdition()
  useProcedures(false)
  useArticles(false)
  return (
    <TriageProvider edition={info?.hash}>
      <Outlet />
    </TriageProvider>
  )
}

/** One of the first four steps, by its number. The fifth, and the result, are fetched later: they carry the core. */
export function Step() {
  const step = Number(useParams()['step'])
  const { triage } = useTriage()
  const Screen = steps[step - 1]
  if (Screen === undefined) return <Navigate to="/check/1" replace />
  const instead = insteadOf(step, triage)
  return instead === undefined ? <Screen /> : <Navigate to={instead} replace />
}
