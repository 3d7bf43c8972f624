import { useState } from 'react'
import { useNavigate } from 'react-router-dom'
import { useEdition } from '../editions/edition.api.ts'
import { Button } from '../ui/button.tsx'
import { Failed } from '../ui/failed.tsx'
import { Page } from '../ui/page.tsx'
import { Rail } from '../ui/rail.tsx'
import { Waiting } from '../ui/waiting.tsx'
import { NewSheet } from './new-sheet.tsx'
import { ServerSheets } from './server-sheets.tsx'
import { SheetsList } from './sheets-list.tsx'

/** Diagnosis without a sheet open: those on this device, and a new one. */
export function SheetsPage() {
  const { status, edition, info, error, retry } = useEdition()
  const [making, setMaking] = useState(false)
  const navigate = useNavigate()
  return (
    <Page title="Diagnosis">
      <h1>Diagnosis</h1>
      {status === 'error' && (
        <Failed title="Couldn’t open the edition." onRetry={retry}>
          {error?.message} Sheets on this device stay as they are.
        </Failed>
      )}
      {making && edition !== undefined && info !== undefined ? (
        <NewSheet
          edition={edition}
          editionHash={info.hash}
          onMade={(id) => void navigate(`/diagnosis?sheet=${id}`)}
          onClose={() => setMaking(false)}
        />
      ) : (
        <Rail
          title="Findings sheets on this device"
          className="mt-6"
          action={
            <Button
              look="main"
              icon="plus"
              {...(edition === undefined && status !== 'pending'
                ? { barredBecause: 'The edition must open first.' }
                : {})}
              onPress={() => setMaking(true)}
            >
              New sheet
            </Button>
          }
        >
          <div className="mt-3">
            {making ? <Waiting what="the edition" /> : <SheetsList onNew={() => setMaking(true)} />}
          </div>
        </Rail>
      )}
      {!making && <ServerSheets />}
    </Page>
  )
}
