import { Outlet } from 'react-router-dom'
import { useArticles, useEdition, useProcedures } from '../editions/edition.api.ts'
import { TriageProvider } from './triage-store.tsx'
import './triage.css'

export { DangerStep } from './danger-step.tsx'
export { StopNow } from './stop-now.tsx'

/**
 * The check: its steps share the answers that lie on this device. What the result needs is fetched meanwhile. This
 * part carries the first step and the stop alone, so that danger is asked about at once on a slow network.
 */
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
