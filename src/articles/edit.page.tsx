import { useQuery } from '@tanstack/react-query'
import { useDeferredValue, useMemo, useState } from 'react'
import { Link, useParams } from 'react-router-dom'
import { articleFaults } from '../../rules/edition/article-faults.ts'
import type { Draft, DraftText } from '../../server/articles/drafts.contract.ts'
import { dropUnsent } from '../offline/unsent-texts.ts'
import { useMe } from '../people/people.api.ts'
import { Failed } from '../ui/failed.tsx'
import { SavingState } from '../ui/offline-bar.tsx'
import { Page } from '../ui/page.tsx'
import { Waiting } from '../ui/waiting.tsx'
import { ArticleKind, ArticleText } from './article-text.tsx'
import { DraftFields } from './draft-fields.tsx'
import { articleOf, sameText, textOf } from './draft-form.ts'
import { draftQuery } from './drafts.api.ts'
import { Empty } from '../ui/empty.tsx'
import { SignInHere } from './for-qualified.tsx'
import { addressOf } from './hit-row.tsx'
import { NotYet } from './knowledge-page.tsx'
import { useKnowledge } from './knowledge.ts'
import type { Knowledge } from './knowledge.ts'
import { PutInForce, Withdrawal } from './put-in-force.tsx'
import { ReaderWords } from './reader-words.tsx'
import { refusalOf } from './refusal.ts'
import { Revisions } from './revisions.tsx'
import { Overtaken, TwoTexts } from './two-texts.tsx'
import { UnsentHere, UnsentOffer } from './unsent-offer.tsx'
import { useDraft } from './use-draft.ts'
import type { Saving } from './use-draft.ts'
import { unsentQuery } from './use-unsent.ts'
import type { Unsent } from './use-unsent.ts'
import { WritersOnly } from './writers-only.tsx'
import './articles.css'
import './editing.css'

function SavingWords({ saving, onlyHere }: { saving: Saving; onlyHere: boolean }) {
  const where = onlyHere ? 'only on this page (keep it open)' : 'on this device only'
  switch (saving.state) {
    case 'saved':
      return <SavingState state="sent">Draft saved</SavingState>
    case 'typed':
    case 'sending':
      return <SavingState state="sending">Saving</SavingState>
    case 'no network':
      return <SavingState state="here">No network: {where}. It is sent again.</SavingState>
    case 'conflict':
      return <SavingState state="here">Not sent, {where}: there are two texts</SavingState>
    case 'refused':
      return (
        <span className="flex flex-wrap items-center gap-3">
          <SavingState state="here">
            Refused, {where}: {saving.title}
          </SavingState>
          {saving.signedOut && <SignInHere />}
        </span>
      )
  }
}

function Preview({ slug, text }: { slug: string; text: DraftText }) {
  const late = useDeferredValue(text)
  const article = useMemo(() => articleOf(slug, late), [slug, late])
  return (
    <section className="draft-preview" aria-label="As readers will see it" tabIndex={0}>
      <p className="draft-preview-head">As readers will see it</p>
      <ArticleKind article={article} />
      <p className="draft-title">{article.title === '' ? 'No title yet' : article.title}</p>
      <ArticleText article={article} />
    </section>
  )
}

type EditorProps = {
  slug: string
  personId: string
  knowledge: Knowledge
  opened: Draft & { text: DraftText }
  /** A text of this device to go on with. */
  unsent: Unsent | undefined
}

function Editor({ slug, personId, knowledge, opened, unsent }: EditorProps) {
  const desk = useDraft({ slug, personId }, opened, unsent)
  const { form, saving } = desk
  const text = useMemo(() => textOf(form), [form])
  const known = useMemo(
    () => ({
      causes: new Set(knowledge.edition.causeIds),
      tests: new Set(knowledge.edition.tests.keys()),
      articles: new Set([slug, ...knowledge.articles.keys(), ...knowledge.withdrawn.keys()]),
    }),
    [knowledge, slug],
  )
  const faults = useMemo(() => articleFaults(articleOf(slug, text), known), [slug, text, known])
  const refusedFields =
    saving.state === 'refused'
      ? Object.fromEntries(
          Object.entries(saving.errors).map(([path, words]) => [
            path.replace(/^head\./, '').split('.')[0],
            words,
          ]),
        )
      : {}
  return (
    <>
      <div className="flex flex-wrap items-center justify-between gap-3">
        <h1>Change an article</h1>
        <SavingWords saving={saving} onlyHere={desk.onlyHere} />
      </div>
      <p className="mt-2 text-small">
        {desk.kept.inForce === null ? (
          'Not in force yet.'
        ) : (
          <>
            In force: <Link to={addressOf('article', slug)}>{desk.kept.inForce.text.head.title}</Link>
          </>
        )}
      </p>
      <TwoTexts desk={desk} />
      <Overtaken desk={desk} />
      <div className="draft-desk">
        <DraftFields desk={desk} knowledge={knowledge} faults={{ ...faults, ...refusedFields }} />
        <Preview slug={slug} text={text} />
        <div className="draft-rest">
          <PutInForce slug={slug} desk={desk} knowledge={knowledge} faults={faults} />
          <Withdrawal slug={slug} desk={desk} knowledge={knowledge} faults={faults} />
          <Revisions slug={slug} desk={desk} />
          <ReaderWords slug={slug} />
        </div>
      </div>
    </>
  )
}

function Opening({ slug, personId }: { slug: string; personId: string }) {
  const state = useKnowledge()
  const draft = useQuery(draftQuery(slug))
  const device = useQuery(unsentQuery(personId, slug))
  const [chosen, choose] = useState<'device' | 'server'>()
  if (state.status !== 'success') return <NotYet state={state} />
  if (draft.isPending || device.isPending) return <Waiting what="the draft" />
  const unsent = device.data ?? undefined
  if (draft.isError)
    return (
      <>
        <Failed title="Couldn’t fetch the draft." onRetry={() => void draft.refetch()}>
          {refusalOf(draft.error).title}
        </Failed>
        {unsent !== undefined && <UnsentHere unsent={unsent} />}
      </>
    )
  const { text } = draft.data
  if (text === null)
    return (
      <Empty title={`There is no article “${slug}”.`}>
        <Link to="/articles/new">Begin a new one</Link>
      </Empty>
    )
  const asked = unsent !== undefined && chosen === undefined && !sameText(unsent.text, text)
  if (asked)
    return (
      <UnsentOffer
        unsent={unsent}
        kept={text}
        onGoOn={() => choose('device')}
        onLetGo={() => {
          void dropUnsent(personId, slug).catch(() => undefined)
          choose('server')
        }}
      />
    )
  return (
    <Editor
      key={slug}
      slug={slug}
      personId={personId}
      knowledge={state.knowledge}
      opened={{ ...draft.data, text }}
      unsent={chosen === 'device' ? unsent : undefined}
    />
  )
}

// One part of the pages for both: what is named in the table of routes weighs on the first page.
export { NewArticle } from './new-article.tsx'

/** Where a senior tech changes an article and puts it in force. */
export function Component() {
  const { slug = '' } = useParams()
  const { person } = useMe()
  return (
    <Page title="Change an article" width="page">
      <WritersOnly title="Change an article">
        {person !== undefined && <Opening key={`${slug} ${person.id}`} slug={slug} personId={person.id} />}
      </WritersOnly>
    </Page>
  )
}
