import { NoNetwork } from '../api.ts'
import { Failed } from '../ui/failed.tsx'
import { Page } from '../ui/page.tsx'
import { hashInWords, Stamp } from '../ui/stamp.tsx'
import { Waiting } from '../ui/waiting.tsx'
import { useEdition } from './edition.api.ts'
import { FormerEditions } from './former-editions.tsx'
import { Counts, Files, RuleGroups, TestsByHazard } from './inside.tsx'
import { dayOf } from './moment.ts'
import './editions.css'

/** The edition in force, what is inside, and those before it. */
export function Component() {
  const { status, edition, info, error, retry } = useEdition()
  if (info === undefined || edition === undefined)
    return (
      <Page title="Editions">
        <h1 className="mb-5">Editions</h1>
        {status === 'error' ? (
          <Failed title="Couldn’t fetch the edition in force." onRetry={retry}>
            {error instanceof NoNetwork
              ? 'No network, and this device has not kept an edition yet.'
              : error?.message}
          </Failed>
        ) : (
          <Waiting what="the edition in force" />
        )}
      </Page>
    )
  return (
    <Page title={`Edition ${info.number}`}>
      <header className="edition-head">
        <Stamp hash={info.hash} number={info.number} line="in force" large />
        <div>
          <p className="text-small text-ink-3">In force since {dayOf(info.inForceSince)}</p>
          <h1>Edition {info.number}</h1>
          <p className="text-small text-ink-2">
            {hashInWords(info.hash)}. {info.note}
          </p>
        </div>
      </header>
      <Counts counts={info.counts} />
      <p className="mt-4 text-small text-ink-2">
        An edition never changes. Every findings sheet names the one it was begun with, and gives the same
        answer when it is computed again. The knots of the stamp are drawn from its hash:
      </p>
      <p className="edition-hash">
        <code>{info.hash}</code>
      </p>
      <div className="edition-parts">
        <TestsByHazard edition={edition} />
        <FormerEditions />
        <RuleGroups edition={edition} />
        <Files info={info} />
      </div>
    </Page>
  )
}
