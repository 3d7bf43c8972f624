import { useState } from 'react'
import { Button, LinkButton } from '../ui/button.tsx'
import { Page } from '../ui/page.tsx'
import { Rail } from '../ui/rail.tsx'
import { SignalPanel } from '../ui/signal-panel.tsx'
import { CheckRow } from '../ui/tick.tsx'

/** What Diagnosis asks of whoever opens it, before it shows a test with a cover off or power on. */
export function QualifiedStatement({ onState }: { onState: () => void }) {
  const [checked, setChecked] = useState(false)
  return (
    <Page title="Diagnosis" width="text">
      <h1>Diagnosis is for qualified people</h1>
      <p className="mt-3">
        It names tests with a cover off, with power on, and with a test bulb that can make metal live. A wrong
        move in one of them can kill.
      </p>
      <SignalPanel word="warning" className="mt-5">
        <p>
          <b>Stay out if you are not qualified.</b> Nothing here makes up for training, protective equipment
          and a second person. Local code and the authority having jurisdiction decide who may do this work.
        </p>
      </SignalPanel>
      <Rail title="What “qualified” means here" className="mt-6">
        <ul className="mt-2 grid list-disc gap-2 pl-5">
          <li>
            You are trained to recognize and avoid the hazards of live work and of the equipment in front of
            you.
          </li>
          <li>You hold the license that this work takes where you are, or work under someone who does.</li>
          <li>
            You have a meter and leads rated for the circuit, and prove them on a known source before and
            after.
          </li>
          <li>You can turn off every source, lock it, tag it, and verify absence of voltage.</li>
        </ul>
        <div className="mt-4">
          <CheckRow checked={checked} onChange={setChecked}>
            I am qualified for this work.
          </CheckRow>
        </div>
        <p className="mt-3 text-small text-ink-2">
          This device remembers that you said so, and the date. You can take it back on the Diagnosis page at
          any time.
        </p>
        <div className="mt-4 flex flex-wrap items-start gap-3">
          <div>
            <Button
              look="main"
              size="glove"
              onPress={onState}
              {...(checked ? {} : { barredBecause: 'Tick the statement first.' })}
            >
              Open Diagnosis
            </Button>
          </div>
          <LinkButton to="/check" size="glove">
            Check my power
          </LinkButton>
        </div>
        <p className="mt-3 text-small text-ink-2">
          “Check my power” is for everyone: with nothing opened, and no tools needed.
        </p>
      </Rail>
    </Page>
  )
}
