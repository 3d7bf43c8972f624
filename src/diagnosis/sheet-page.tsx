import { Link } from 'react-router-dom'
import { EditionNotHere, useEdition } from '../editions/edition.api.ts'
import { Failed } from '../ui/failed.tsx'
import { Page } from '../ui/page.tsx'
import { Waiting } from '../ui/waiting.tsx'
import { EarlierEdition } from './earlier-edition.tsx'
import { Contradictions, OthersLine } from './others.tsx'
import { SheetDesk } from './sheet-desk.tsx'
import { useOthers } from './use-others.ts'
import { useSheet } from './use-sheet.ts'
import type { OpenSheet } from './use-sheet.ts'

const troubles = {
  missing: ['This sheet is not on this device', 'It may have been removed, or it lies on another device.'],
  unreadable: [
    'This sheet can’t be read',
    'Another version of this page wrote it. It stays on the device as it is.',
  ],
} as const

function Bare({ title, children }: { title: string; children?: React.ReactNode }) {
  return (
    <Page title={title}>
      <h1>{title}</h1>
      {children}
      <p className="mt-4">
        <Link className="link-alone" to="/diagnosis">
          All sheets on this device
        </Link>
      </p>
    </Page>
  )
}

/** A sheet on the edition it was begun with. */
function OnItsEdition({ sheet }: { sheet: OpenSheet }) {
  const { status, edition, info, error, retry } = useEdition(sheet.edition)
  const others = useOthers(sheet)
  if (status === 'error' || (status === 'success' && edition === undefined))
    return (
      <Bare title={sheet.typed.title}>
        <Failed title="Couldn’t open the edition of this sheet." onRetry={retry}>
          {error instanceof EditionNotHere
            ? 'It was begun with an edition that is not on the server any more. What was typed is kept.'
            : `It was begun with an earlier edition, whose files are not on this device. ${error?.message ?? ''} What was typed is kept.`}
        </Failed>
      </Bare>
    )
  if (edition === undefined || info === undefined)
    return (
      <Bare title={sheet.typed.title}>
        <Waiting what="the edition" />
      </Bare>
    )
  return (
    <SheetDesk
      sheet={sheet}
      edition={edition}
      info={info}
      lines={
        <>
          <EarlierEdition content={sheet.stored} own={info} />
          <OthersLine others={others} />
        </>
      }
      contradictions={<Contradictions sheet={sheet} edition={edition} others={others} />}
    />
  )
}

/** One findings sheet, by its id on this device. */
export function SheetPage({ id }: { id: string }) {
  const loaded = useSheet(id)
  if (loaded.status === 'open') return <OnItsEdition sheet={loaded.sheet} />
  if (loaded.status === 'pending')
    return (
      <Bare title="Diagnosis">
        <Waiting what="the sheet" />
      </Bare>
    )
  const [title, why] = troubles[loaded.status]
  return (
    <Bare title={title}>
      <p className="mt-3">{why}</p>
    </Bare>
  )
}
