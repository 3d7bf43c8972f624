import { useSearchParams } from 'react-router-dom'
import { Page } from '../ui/page.tsx'
import { Waiting } from '../ui/waiting.tsx'
import './diagnosis.css'
import { QualifiedStatement } from './qualified-statement.tsx'
import { SheetPage } from './sheet-page.tsx'
import { SheetsPage } from './sheets-page.tsx'
import { useQualified } from './use-qualified.ts'

/** Diagnosis: the statement first, then the sheets on this device, then one of them. */
export function Component() {
  const { qualified, state, withdraw } = useQualified()
  const [search] = useSearchParams()
  const id = search.get('sheet')
  if (qualified === 'pending')
    return (
      <Page title="Diagnosis">
        <h1>Diagnosis</h1>
        <Waiting what="Diagnosis" />
      </Page>
    )
  if (qualified === null) return <QualifiedStatement onState={state} />
  if (id !== null) return <SheetPage key={id} id={id} />
  return <SheetsPage stated={qualified} onWithdraw={withdraw} onState={state} />
}
