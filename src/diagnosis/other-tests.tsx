import { useState } from 'react'
import { Button } from '../ui/button.tsx'
import { HazardMark } from '../ui/hazard-mark.tsx'
import { doneTests } from './choose-test.ts'
import type { Offer, Offers } from './choose-test.ts'
import { useDesk } from './desk.ts'
import { modeLabel } from './words.ts'

const shownAtFirst = 6

function Row({ offer, action, onPress }: { offer: Offer; action: string; onPress: () => void }) {
  const { edition, typed } = useDesk()
  const where = offer.mode === typed.mode ? '' : `, ${modeLabel(edition, offer.mode).toLowerCase()}`
  return (
    <li className="other-test">
      <span className="min-w-0">
        <b>{offer.test.title}</b>
        {where}
        <span className="mt-1 flex flex-wrap items-center gap-x-4 gap-y-1 text-note">
          <span>{offer.minutes} min</span>
          <HazardMark hazard={offer.hazard} />
        </span>
      </span>
      <Button size="small" onPress={onPress} label={`${action}: ${offer.test.title}${where}`}>
        {action}
      </Button>
    </li>
  )
}

type OtherTestsProps = {
  offers: Offers
  leading: string | undefined
  onPick: (key: string | undefined) => void
}

/** What else can be done, what was put aside, and what is done, folded to its answer. */
export function OtherTests({ offers, leading, onPick }: OtherTestsProps) {
  const { edition, typed, dispatch } = useDesk()
  const others = offers.open.filter((offer) => offer.key !== leading)
  const done = doneTests(edition, typed)
  const [all, setAll] = useState(false)
  const shown = all ? others : others.slice(0, shownAtFirst)
  return (
    <div className="mt-3">
      {others.length > 0 && (
        <ul aria-label="Other tests">
          {shown.map((offer) => (
            <Row key={offer.key} offer={offer} action="Take this one" onPress={() => onPick(offer.key)} />
          ))}
        </ul>
      )}
      {others.length > shownAtFirst && (
        <Button look="plain" size="small" expanded={all} onPress={() => setAll(!all)}>
          {all ? 'Show fewer' : `Show all ${others.length}`}
        </Button>
      )}
      {offers.skipped.length > 0 && (
        <>
          <h3 className="mt-4 text-small">Put aside</h3>
          <ul aria-label="Tests put aside">
            {offers.skipped.map((offer) => (
              <Row
                key={offer.key}
                offer={offer}
                action="Take up again"
                onPress={() => dispatch({ do: 'take-up', test: offer.key, of: offer.test.label })}
              />
            ))}
          </ul>
        </>
      )}
      {done.length > 0 && (
        <>
          <h3 className="mt-4 text-small">Done</h3>
          <ul className="text-small" aria-label="Tests done">
            {done.map(({ key, test, mode, answers }) => (
              <li key={key} className="border-t border-rule py-2">
                <b>{test.label}</b>, {modeLabel(edition, mode).toLowerCase()}: {answers}
              </li>
            ))}
          </ul>
        </>
      )}
    </div>
  )
}
