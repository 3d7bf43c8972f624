import { useState } from 'react'
import { Link } from 'react-router-dom'
import type { TestProcedure } from '../../rules/edition/schema.ts'
import { Button } from '../ui/button.tsx'
import { HazardMark } from '../ui/hazard-mark.tsx'
import type { Offer, Offers } from './choose-test.ts'
import { useDesk } from './desk.ts'
import { Fork } from './fork.tsx'
import { OtherTests } from './other-tests.tsx'
import { causeLabel, inSentence, listed, modeLabel } from './words.ts'

/** What the test tells apart, in words. */
function Tells({ offer }: { offer: Offer }) {
  const { edition } = useDesk()
  const parts = offer.next.parts.map((id) => inSentence(causeLabel(edition, id)))
  if (parts.length < 2) return null
  const [first, ...rest] = parts
  return (
    <>
      Tells {first} from {listed(rest, 'or')}.
    </>
  )
}

function WhyThisOne({ offer }: { offer: Offer }) {
  const { gainBits } = offer.next
  return (
    <p className="mt-2 text-small text-ink-2">
      It is expected to tell {gainBits.toFixed(2)} bits in {offer.minutes} min: more for each minute than any
      other test still to do. One bit halves the doubt.
    </p>
  )
}

type NextStepProps = {
  offers: Offers
  /** Something stops: nothing is entered before that is dealt with. */
  stopped: boolean
  /** No single cause fits: the reading to take again comes first. */
  misfit: boolean
  procedure: (test: string) => TestProcedure | undefined
  /** A test taken from the list of others, by key. */
  picked: string | undefined
  onPick: (key: string | undefined) => void
}

/** The one next thing: the test that tells most for its minutes, and the way to enter what it shows. */
export function NextStep({ offers, stopped, misfit, procedure, picked, onPick }: NextStepProps) {
  const desk = useDesk()
  const [why, setWhy] = useState(false)
  const [others, setOthers] = useState(false)
  const best = offers.open[0]
  const offer = offers.open.find((one) => one.key === picked) ?? best
  if (offer === undefined || (offer.next.gainBits <= 0 && picked === undefined))
    return (
      <section className="plate-dashed next-step" aria-labelledby="next-title">
        <h2 id="next-title" className="text-lead">
          No test left that would tell more
        </h2>
        <p className="mt-1 text-small">
          Every finding that would move the ranking is taken, put aside or out of reach.
        </p>
        <OtherTests offers={offers} leading={undefined} onPick={onPick} />
      </section>
    )
  const { test, next, hazard, mode } = offer
  const elsewhere = mode !== desk.typed.mode
  const before = procedure(test.id)?.before ?? []
  return (
    <section className="plate-edged next-step" aria-labelledby="next-title">
      <p className="flex flex-wrap justify-between gap-x-4 gap-y-1 text-small font-bold">
        <span className="text-ink-3">{offer === best ? 'Do this next' : 'Chosen from the list'}</span>
        <span>{offer.minutes} min</span>
      </p>
      <h2 id="next-title" className="mt-1 text-head">
        {test.title}
      </h2>
      <p className="mt-1">
        <HazardMark hazard={hazard} />
      </p>
      {stopped && (
        <p className="mt-2 font-bold">Not before what the danger panel says has been done and proved.</p>
      )}
      <p className="mt-2 text-small text-ink-2">
        {elsewhere && (
          <>
            To be done <b className="text-ink">{modeLabel(desk.edition, mode).toLowerCase()}</b>; changing the
            mode is in the minutes.{' '}
          </>
        )}
        <Tells offer={offer} />
      </p>
      {before.length > 0 && (
        <ul className="mt-2 grid list-disc gap-1 pl-5 text-small text-ink-2">
          {before.slice(0, 3).map((one) => (
            <li key={one}>{one}</li>
          ))}
        </ul>
      )}
      <Link className="link-alone text-small" to={`/tests/${test.id}`}>
        All steps and cautions
      </Link>
      <Fork outcomes={next.outcomes} />
      <div className="mt-3 flex flex-wrap items-center gap-x-3 gap-y-2">
        <Button
          look={stopped || misfit ? 'outline' : 'main'}
          size="glove"
          className="next-enter"
          onPress={() => desk.go(next.findings, mode)}
        >
          {test.enter}
        </Button>
        <Button
          look="plain"
          onPress={() => {
            desk.dispatch({ do: 'skip', test: offer.key, of: test.label })
            onPick(undefined)
          }}
        >
          Put aside
        </Button>
        <Button look="plain" expanded={why} onPress={() => setWhy(!why)}>
          Why this one
        </Button>
        <Button look="plain" expanded={others} onPress={() => setOthers(!others)}>
          Other tests, {offers.open.length - 1}
        </Button>
      </div>
      {why && <WhyThisOne offer={offer} />}
      {others && <OtherTests offers={offers} leading={offer.key} onPick={onPick} />}
    </section>
  )
}
