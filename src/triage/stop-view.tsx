import { Link } from 'react-router-dom'
import type { Edition } from '../../rules/edition/open.ts'
import { CallButton } from '../ui/button.tsx'
import { Page } from '../ui/page.tsx'
import { Rail } from '../ui/rail.tsx'
import { shop } from '../ui/shop.ts'
import { GuideLine } from './guide-line.tsx'
import { MadeOff } from './made-off.tsx'
import { PhoneWords } from './phone-words.tsx'
import { readOut } from './read-out.ts'
import { LateShare } from './late-share.tsx'
import { StopWords } from './stop-words.tsx'
import { useTriage } from './triage-store.tsx'
import { WhichWasIt } from './which-was-it.tsx'
import { WhyList } from './why-list.tsx'
import { dangersSaid } from './said-stops.ts'
import type { Here } from './said-stops.ts'

type StopViewProps = {
  stops: readonly Here[]
  edition: Edition | undefined
  /** Told what stops by the professional's findings too. */
  onStops?: (stops: readonly string[]) => void
}
const nobody = () => undefined

/** Stopped: what to do now, whom to call, then why. No causes, no shares, nothing further to measure. */
export function StopView({ stops, edition, onStops = nobody }: StopViewProps) {
  const { triage } = useTriage()
  const why = stops.flatMap(({ id }) => edition?.file.stops.find((one) => one.id === id)?.why ?? [])
  return (
    <Page title="Stop" width="text" className="stop-page">
      <StopWords stops={stops} edition={edition} />
      <CallButton number={shop.phone} size="glove" wide>
        Call {shop.name}, {shop.phone}
      </CallButton>
      <MadeOff stops={stops} />
      <WhichWasIt />
      <Rail title="Why we say so">
        <WhyList triage={triage} />
        {why.map((words) => (
          <p key={words} className="mt-[10px] text-small">
            {words}
          </p>
        ))}
      </Rail>
      <PhoneWords words={readOut(triage, stops)} />
      <LateShare edition={edition} onStops={onStops} />
      <p className="screen-only">
        <Link to="/check/2" className="link-alone">
          Add what feeds it and what you notice, for the phone
        </Link>
        <br />
        <Link to="/check/1" className="link-alone">
          I answered wrong: back to the questions
        </Link>
        {dangersSaid(triage).length === 0 && (
          <>
            <br />
            <Link to="/check/5" className="link-alone">
              I typed a number wrong: back to the volts
            </Link>
          </>
        )}
      </p>
      <GuideLine />
    </Page>
  )
}
