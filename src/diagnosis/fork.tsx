import type { ForkOutcome } from '../../rules/ranking/diagnosis-types.ts'
import { Icon } from '../ui/icon.tsx'
import { TesterLamp } from '../ui/tester-lamp.tsx'
import { useDesk } from './desk.ts'
import { causeLabel, percent } from './words.ts'

const shownAtMost = 4
const worthShowing = 0.02 // chance below which an outcome is only counted

/** Those that would stop first, then by chance; what hardly happens is left to a count. */
function shownOf(outcomes: readonly ForkOutcome[]): ForkOutcome[] {
  const worth = outcomes.filter((one) => one.chance >= worthShowing)
  const inOrder = (list: readonly ForkOutcome[]) => [...list].sort((a, b) => b.chance - a.chance)
  const stops = inOrder(worth.filter((one) => one.stop))
  return [...stops, ...inOrder(worth.filter((one) => !one.stop))].slice(0, shownAtMost)
}

function Branch({ outcome }: { outcome: ForkOutcome }) {
  const { edition } = useDesk()
  const cause = causeLabel(edition, outcome.leads)
  return (
    <li>
      {outcome.lamp === undefined ? (
        <span className="fork-node" aria-hidden="true" />
      ) : (
        <TesterLamp state={outcome.lamp} />
      )}
      <span className="font-bold">{outcome.label}</span>
      <Icon name="next" />
      <span>
        {outcome.stop && <b>STOP: make it harmless first. </b>}
        {outcome.stop ? `Then ${cause} leads` : <b>{cause}</b>}{' '}
        <span className="whitespace-nowrap text-ink-3">{percent(outcome.share)} %</span>
      </span>
    </li>
  )
}

/** What each outcome of a test would make of the ranking. */
export function Fork({ outcomes }: { outcomes: readonly ForkOutcome[] }) {
  const shown = shownOf(outcomes)
  const rest = outcomes.length - shown.length
  if (shown.length === 0) return null
  return (
    <>
      <ul className="fork" aria-label="What each outcome would say">
        {shown.map((outcome) => (
          <Branch key={outcome.id} outcome={outcome} />
        ))}
      </ul>
      {rest > 0 && (
        <p className="border-t border-rule pt-2 text-note text-ink-2">
          {rest === 1 ? 'One more outcome, less likely.' : `${rest} more outcomes, less likely.`}
        </p>
      )}
    </>
  )
}
