import { useSearchParams } from 'react-router-dom'
import { isQualified } from '../../server/people/roles.contract.ts'
import { useMe } from '../people/people.api.ts'
import { Page } from '../ui/page.tsx'
import { Waiting } from '../ui/waiting.tsx'
import './diagnosis.css'
import { ForQualified } from './for-qualified.tsx'
import { SheetPage } from './sheet-page.tsx'
import { SheetsPage } from './sheets-page.tsx'

/** Diagnosis, for techs: the sheets on this device, then one of them. With no network whoever last signed in goes on. */
export function Component() {
  const { known, person } = useMe()
  const [search] = useSearchParams()
  const id = search.get('sheet')
  if (!known)
    return (
      <Page title="Diagnosis">
        <h1>Diagnosis</h1>
        <Waiting what="Diagnosis" />
      </Page>
    )
  if (!isQualified(person?.role)) return <ForQualified person={person} />
  return id === null ? <SheetsPage /> : <SheetPage key={id} id={id} />
}
