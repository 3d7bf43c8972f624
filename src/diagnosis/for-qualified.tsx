import type { Person } from '../../server/people/people.contract.ts'
import { LinkButton } from '../ui/button.tsx'
import { Page } from '../ui/page.tsx'
import { Rail } from '../ui/rail.tsx'
import { shop } from '../ui/shop.ts'
import { SignalPanel } from '../ui/signal-panel.tsx'

/** What Diagnosis shows to whoever is not signed in as a qualified person. */
export function ForQualified({ person }: { person: Person | undefined }) {
  const here = window.location.pathname + window.location.search
  return (
    <Page title="Diagnosis" width="text">
      <h1>Diagnosis is for qualified people</h1>
      <p className="mt-3">
        It names tests with a cover off, with power on, and with a test bulb that can make metal live. A wrong
        move in one of them can kill.
      </p>
      <SignalPanel word="warning" className="mt-5">
        <p>
          <b>Leave this to qualified people.</b> Nothing here makes up for training, protective equipment and
          a second person. Local code and the authority having jurisdiction decide who may do this work.
        </p>
      </SignalPanel>
      <Rail title="What “qualified” means here" className="mt-6">
        <ul className="mt-2 grid list-disc gap-2 pl-5">
          <li>
            Trained to recognize and avoid the hazards of live work and of the equipment in front of you.
          </li>
          <li>Licensed for this work where you are, or working under someone who is.</li>
          <li>
            Equipped with a meter and leads rated for the circuit, and used to proving them on a known source
            before and after.
          </li>
          <li>Able to turn off every source, lock it, tag it, and verify absence of voltage.</li>
        </ul>
        <p className="mt-4">
          {person === undefined
            ? `An admin of ${shop.name} makes the accounts of qualified people. Sign in with yours.`
            : `You are signed in as ${person.name}, with a homeowner’s account. An admin of ${shop.name} makes the accounts of qualified people.`}
        </p>
        <div className="mt-4 flex flex-wrap items-start gap-3">
          {person === undefined && (
            <LinkButton to={`/sign-in?next=${encodeURIComponent(here)}`} look="main" size="glove">
              Sign in
            </LinkButton>
          )}
          <LinkButton to="/check" size="glove">
            Check my power
          </LinkButton>
        </div>
        <p className="mt-3 text-small text-ink-2">
          “Check my power” is for everyone: with nothing opened, and no account needed.
        </p>
      </Rail>
    </Page>
  )
}
