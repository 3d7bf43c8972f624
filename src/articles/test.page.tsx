import { useParams } from 'react-router-dom'
import type { Test, TestProcedure } from '../../rules/edition/schema.ts'
import { HazardMark } from '../ui/hazard-mark.tsx'
import { SignalPanel } from '../ui/signal-panel.tsx'
import { Steps } from '../ui/steps.tsx'
import { ForQualified } from './for-qualified.tsx'
import { GuideLine } from './guide-line.tsx'
import type { Knowledge } from './knowledge.ts'
import { KnowledgePage } from './knowledge-page.tsx'
import type { Shown } from './knowledge-page.tsx'
import { Side } from './side.tsx'
import { TestOutcomes } from './test-outcomes.tsx'
import { articlesOnTest, causesOfTest } from './used-in.ts'

function Before({ test, procedure }: { test: Test; procedure: TestProcedure }) {
  if (procedure.before.length === 0) return null
  const list = (
    <ul className="before">
      {procedure.before.map((line) => (
        <li key={line}>{line}</li>
      ))}
    </ul>
  )
  return (
    <section className="mt-6">
      <h2>Before you start</h2>
      {test.hazard === 'closed' ? (
        list
      ) : (
        <SignalPanel word="warning" className="mt-3">
          {list}
        </SignalPanel>
      )}
    </section>
  )
}

function Procedure({
  knowledge,
  test,
  procedure,
}: {
  knowledge: Knowledge
  test: Test
  procedure: TestProcedure
}) {
  return (
    <>
      <Before test={test} procedure={procedure} />
      {procedure.instruments.length > 0 && (
        <section className="mt-6">
          <h2>Instruments</h2>
          <ul className="before">
            {procedure.instruments.map((one) => (
              <li key={one}>{one}</li>
            ))}
          </ul>
        </section>
      )}
      <section className="mt-6">
        <h2>Steps</h2>
        <Steps className="mt-3" steps={procedure.steps} />
      </section>
      <section className="mt-6">
        <h2>How it can end, and what that says</h2>
        <p className="mt-1 text-small text-ink-2">
          Each outcome by itself, with nothing else found. On a findings sheet the other readings weigh in.
        </p>
        <TestOutcomes knowledge={knowledge} test={test} />
      </section>
      <section className="mt-6">
        <h2>What it shows, and what it can’t</h2>
        <p className="mt-3">
          <b>Shows.</b> {procedure.shows}
        </p>
        <p className="mt-3">
          <b>Can’t show.</b> {procedure.cannotShow}
        </p>
        <p className="mt-3 text-small text-ink-2">Reference: {procedure.source}</p>
      </section>
    </>
  )
}

function showTest(knowledge: Knowledge, id: string): Shown | undefined {
  const test = knowledge.edition.tests.get(id)
  if (test === undefined) return undefined
  const procedure = knowledge.tests.get(id)
  const opens = procedure !== undefined && (test.who === 'anyone' || knowledge.qualified)
  return {
    title: test.title,
    content: (
      <>
        <header>
          <p className="knowledge-kind">
            <span>Test</span>
            <span>{test.minutes} min</span>
          </p>
          <h1>{test.title}</h1>
          <p className="mt-4 flex flex-wrap gap-x-5 gap-y-2">
            <HazardMark hazard={test.hazard} />
            {test.hazardDirect !== undefined && (
              <span className="text-note">
                Loads plugged straight into the source: <HazardMark hazard={test.hazardDirect} />
              </span>
            )}
          </p>
        </header>
        {opens ? (
          <Procedure knowledge={knowledge} test={test} procedure={procedure} />
        ) : (
          <ForQualified>
            {test.who === 'anyone'
              ? 'How this is done is written for qualified people.'
              : 'This test is not for everyone: done wrong, it can hurt. It is named here so that you know what a professional may do.'}
          </ForQualified>
        )}
        <GuideLine />
      </>
    ),
    side: (
      <Side
        knowledge={knowledge}
        facts={[
          ['Who', test.who === 'anyone' ? 'anyone' : 'qualified people'],
          ['Takes', `${test.minutes} min`],
          ['Modes', test.eachMode ? 'worth repeating in each' : 'once'],
        ]}
        usedIn={[...articlesOnTest(knowledge, id), ...causesOfTest(knowledge, id)]}
      />
    ),
  }
}

/** One test: who may do it, how, and what each of its outcomes says. */
export function Component() {
  const { id = '' } = useParams()
  return <KnowledgePage kind="test" id={id} show={(knowledge) => showTest(knowledge, id)} />
}
