import { useMemo } from 'react'
import { Link } from 'react-router-dom'
import type { Edition } from '../../rules/edition/open.ts'
import type { Test } from '../../rules/edition/schema.ts'
import { TesterLamp } from '../ui/tester-lamp.tsx'
import { strengthOf } from './evidence-words.ts'
import { addressOf } from './hit-row.tsx'
import type { Knowledge } from './knowledge.ts'
import { outcomesSay } from './outcomes-say.ts'
import type { OutcomeSays, Weighed } from './outcomes-say.ts'

function Causes({ edition, weighed }: { edition: Edition; weighed: readonly Weighed[] }) {
  return weighed.map(({ cause, bits }, index) => (
    <span key={cause}>
      {index > 0 && ', '}
      <Link to={addressOf('cause', cause)}>{edition.causes.get(cause)?.label ?? cause}</Link> (
      {strengthOf(bits)})
    </span>
  ))
}

function Says({ edition, says }: { edition: Edition; says: OutcomeSays }) {
  if (says.for.length > 0)
    return (
      <>
        Speaks for <Causes edition={edition} weighed={says.for} />
      </>
    )
  if (says.alike === 0 && says.against.length === 0) return <>Says nothing of any cause by itself.</>
  return (
    <>
      {says.alike > 0 && `Speaks for ${says.alike} causes alike. `}
      {says.against.length > 0 && (
        <>
          Speaks against <Causes edition={edition} weighed={says.against} />
        </>
      )}
    </>
  )
}

/** Each way a test can end, and what the rules make of it by itself. */
export function TestOutcomes({ knowledge, test }: { knowledge: Knowledge; test: Test }) {
  const { edition } = knowledge
  const outcomes = useMemo(() => outcomesSay(edition, test), [edition, test])
  return (
    <ul className="rows">
      {outcomes.map((says) => (
        <li key={says.outcome.id} className="outcome">
          <span className="outcome-label">
            {says.outcome.lamp !== undefined && <TesterLamp state={says.outcome.lamp} />}
            <b>{says.outcome.label}</b>
          </span>
          <span>
            {says.stops.map((title) => (
              <b key={title} className="block">
                {title}
              </b>
            ))}
            <span className="text-small">
              <Says edition={edition} says={says} />
            </span>
          </span>
        </li>
      ))}
    </ul>
  )
}
