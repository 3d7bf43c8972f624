import type { ReactNode } from 'react'
import { Link, useParams } from 'react-router-dom'
import type { Cause, CauseProcedure } from '../../rules/edition/schema.ts'
import { HazardMark } from '../ui/hazard-mark.tsx'
import { typicalContext } from '../../rules/loop/known-context.ts'
import { LateLoop } from '../ui/loop/late-loop.tsx'
import { SignalPanel } from '../ui/signal-panel.tsx'
import { Steps } from '../ui/steps.tsx'
import { typicalOf } from './cause-glyph.ts'
import { LookAlikes, Proof, Remedies } from './cause-repair.tsx'
import { rulesOn } from './evidence-words.ts'
import { ForQualified } from './for-qualified.tsx'
import { GuideLine } from './guide-line.tsx'
import { addressOf } from './hit-row.tsx'
import type { Knowledge } from './knowledge.ts'
import { KnowledgePage } from './knowledge-page.tsx'
import type { Shown } from './knowledge-page.tsx'
import { Side } from './side.tsx'
import { SpeaksList } from './speaks.tsx'
import { TypicalFigure } from './typical-figure.tsx'
import { articlesOnCause, causesLike } from './used-in.ts'

function Section({ title, children }: { title: string; children: ReactNode }) {
  return (
    <section className="mt-6">
      <h2>{title}</h2>
      {children}
    </section>
  )
}

/**
 * Tests with nothing opened that an article on this cause uses: what a visitor may do towards being sure. Not where
 * metal may be live or something may burn: there a visitor measures nothing.
 */
function OpenTests({ knowledge, cause }: { knowledge: Knowledge; cause: string }) {
  const ids = new Set(
    [...knowledge.articles.values()].filter((one) => one.causes.includes(cause)).flatMap((one) => one.tests),
  )
  const tests = [...ids].flatMap((id) => knowledge.edition.tests.get(id) ?? [])
  const open = tests.filter((test) => test.who === 'anyone' && test.hazard === 'closed')
  if (open.length === 0) return null
  return (
    <Section title="What may be tested, with nothing opened">
      <ul className="rows">
        {open.map((test) => (
          <li key={test.id} className="flex flex-wrap items-center justify-between gap-x-4">
            <Link to={addressOf('test', test.id)}>{test.title}</Link>
            <HazardMark hazard={test.hazard} />
          </li>
        ))}
      </ul>
    </Section>
  )
}

function Qualified({ knowledge, said }: { knowledge: Knowledge; said: CauseProcedure }) {
  return (
    <>
      {(said.lookAlikes ?? []).length > 0 && (
        <Section title="How to be sure: what looks like it">
          <LookAlikes knowledge={knowledge} cause={said} />
        </Section>
      )}
      <Section title="Putting it right">
        <Remedies remedies={said.remedies} />
      </Section>
      {(said.proof ?? []).length > 0 && (
        <Section title="Proving the repair">
          <Proof knowledge={knowledge} cause={said} />
        </Section>
      )}
    </>
  )
}

function ForVisitors({
  knowledge,
  said,
  cause,
}: {
  knowledge: Knowledge
  said: CauseProcedure | undefined
  cause: string
}) {
  const open = (said?.remedies ?? []).filter((one) => one.who === 'anyone' && one.hazard === 'closed')
  return (
    <>
      {said?.danger?.level !== 'danger' && <OpenTests knowledge={knowledge} cause={cause} />}
      {open.length > 0 && (
        <Section title="Putting it right, with nothing opened">
          <Remedies remedies={open} />
        </Section>
      )}
      <ForQualified>
        What parts this cause from its look-alikes, how it is put right and how the repair is proved.
      </ForQualified>
    </>
  )
}

function Content({ knowledge, cause }: { knowledge: Knowledge; cause: Cause }) {
  const said = knowledge.causes.get(cause.id)
  const readings = typicalOf(cause.id)
  const rules = rulesOn(knowledge.edition, cause.id)
  const doNow = said?.homeowner?.doNow ?? []
  return (
    <>
      <header>
        <p className="knowledge-kind">
          <span>Cause</span>
          <span>{cause.label}</span>
        </p>
        <h1>{cause.title}</h1>
      </header>
      {said?.means !== undefined && <p className="prose-lead mt-4">{said.means}</p>}
      {said?.danger !== undefined && (
        <SignalPanel word={said.danger.level} className="mt-5">
          <p>{said.danger.text}</p>
        </SignalPanel>
      )}
      {readings !== undefined && <TypicalFigure readings={readings} />}
      <Section title="Where current goes">
        <LateLoop key={cause.id} context={typicalContext(cause.id)} cause={cause.id} />
      </Section>
      {doNow.length > 0 && (
        <Section title="What to do now, with nothing opened">
          <Steps className="mt-3" steps={doNow} />
        </Section>
      )}
      {knowledge.qualified && said !== undefined ? (
        <Qualified knowledge={knowledge} said={said} />
      ) : (
        <ForVisitors knowledge={knowledge} said={said} cause={cause.id} />
      )}
      {rules.some((one) => one.bits > 0) && (
        <Section title="What speaks for it">
          <SpeaksList rules={rules.filter((one) => one.bits > 0)} />
        </Section>
      )}
      {rules.some((one) => one.bits < 0) && (
        <Section title="What speaks against it">
          <SpeaksList rules={rules.filter((one) => one.bits < 0)} />
        </Section>
      )}
      <GuideLine />
    </>
  )
}

function showCause(knowledge: Knowledge, id: string): Shown | undefined {
  const cause = knowledge.edition.causes.get(id)
  if (cause === undefined) return undefined
  return {
    title: cause.title,
    content: <Content knowledge={knowledge} cause={cause} />,
    side: (
      <Side
        knowledge={knowledge}
        facts={[['Rules', String(rulesOn(knowledge.edition, id).length)]]}
        usedIn={[...articlesOnCause(knowledge, id), ...causesLike(knowledge, id)]}
      />
    ),
  }
}

/** One cause: what it is, how it reads, what parts it from others, how it is put right and proved. */
export function Component() {
  const { id = '' } = useParams()
  return <KnowledgePage kind="cause" id={id} show={(knowledge) => showCause(knowledge, id)} />
}
