import { useState } from 'react'
import { useEdition } from '../editions/edition.api.ts'
import { Button, CallButton, LinkButton } from '../ui/button.tsx'
import { Empty } from '../ui/empty.tsx'
import { Failed } from '../ui/failed.tsx'
import { Page } from '../ui/page.tsx'
import { shop } from '../ui/shop.ts'
import { Waiting } from '../ui/waiting.tsx'
import { assume } from './feeds.ts'
import { Found } from './found.tsx'
import { GuideLine } from './guide-line.tsx'
import { PhoneWords } from './phone-words.tsx'
import { openQuestions, readOut } from './read-out.ts'
import { LateShare } from './late-share.tsx'
import { byWorst } from './said-stops.ts'
import { StopView } from './stop-view.tsx'
import { stopsHere } from './stops-here.ts'
import { toSheet } from './to-sheet.ts'
import { useTriage } from './triage-store.tsx'
import { useDiagnosis } from './use-diagnosis.ts'

/** What it may be, in plain words. A stop takes the page's place. */
export function Component() {
  const { triage } = useTriage()
  const { edition, status, retry } = useEdition()
  const sheet = toSheet(triage)
  const { diagnosis, failed } = useDiagnosis(edition, sheet)
  // What the professional found stops the homeowner's page as what they said themselves does.
  const [theirs, setTheirs] = useState<readonly string[]>([])
  const own = stopsHere(triage, edition)
  const more = theirs.filter((id) => own.every((stop) => stop.id !== id))
  const stops = byWorst([...own, ...more.map((id) => ({ id, mayBeGhost: false }))])
  if (stops.length > 0) return <StopView stops={stops} edition={edition} onStops={setTheirs} />

  const assumed = assume(triage.feeds).words
  const open = openQuestions(triage)
  const nothing =
    Object.keys(triage.notices).length === 0 &&
    Object.keys(sheet.findings ?? {}).every((id) => !/^(tester|receptacle)\./.test(id))
  return (
    <Page title="What it may be" width="text" className="stop-page">
      <h1>What it may be</h1>
      <p className="-mt-2 text-small text-ink-2">
        Going by what you saw at the outlet (receptacle), and nothing more. Nothing was opened, nothing is
        proved.
      </p>
      {open > 0 ? (
        <Empty title="The questions about danger are still open.">
          <LinkButton to="/check/1" className="mt-2">
            Answer them first
          </LinkButton>
        </Empty>
      ) : nothing ? (
        <Empty title="Nothing to go on yet.">
          <p>No danger was named. Say what you notice, or look at a plug-in tester’s lamps.</p>
          <LinkButton to="/check/3" className="mt-2">
            Say what you notice
          </LinkButton>
        </Empty>
      ) : failed !== undefined ? (
        <Failed title="Your answers can’t be ranked.">{failed}</Failed>
      ) : edition !== undefined && diagnosis !== undefined ? (
        <Found edition={edition} diagnosis={diagnosis} />
      ) : status === 'error' ? (
        <Failed title="The knowledge isn’t on this device yet." onRetry={retry}>
          It must be opened once with a network. Your answers are kept.
        </Failed>
      ) : (
        <Waiting what="what it may be" />
      )}
      <CallButton number={shop.phone} size="glove" wide>
        Call {shop.name}, {shop.phone}
      </CallButton>
      <PhoneWords words={readOut(triage, stops)} />
      {open === 0 && <LateShare edition={edition} onStops={setTheirs} />}
      {assumed.length > 0 && !nothing && (
        <p className="text-small text-ink-2">You left this open, so we took it that {assumed.join('; ')}.</p>
      )}
      <p className="screen-only flex flex-wrap gap-3">
        <LinkButton to="/check/1">Change my answers</LinkButton>
        <Button icon="print" onPress={() => window.print()}>
          Print
        </Button>
      </p>
      <GuideLine />
    </Page>
  )
}
