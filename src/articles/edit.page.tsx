import { useQuery } from '@tanstack/react-query'
import { useDeferredValue, useMemo } from 'react'
import { Link, useParams } from 'react-router-dom'
import { articleFaults } from '../../rules/edition/article-faults.ts'
import type { Draft, DraftText } from '../../server/articles/drafts.contract.ts'
import { Failed } from '../ui/failed.tsx'
import { SavingState } from '../ui/offline-bar.tsx'
import { Page } from '../ui/page.tsx'
import { Waiting } from '../ui/waiting.tsx'
import { ArticleKind, ArticleText } from './article-text.tsx'
import { DraftFields } from './draft-fields.tsx'
import { articleOf, textOf } from './draft-form.ts'
import { draftQuery } from './drafts.api.ts'
import { Empty } from '../ui/empty.tsx'
import { addressOf } from './hit-row.tsx'
import { NotYet } from './knowledge-page.tsx'
import { useKnowledge } from './knowledge.ts'
import type { Knowledge } from './knowledge.ts'
import { PutInForce, Withdrawal } from './put-in-force.tsx'
import { ReaderWords } from './reader-words.tsx'
import { refusalOf } from './refusal.ts'
import { Revisions } from './revisions.tsx'
import { Overtaken, TwoTexts } from './two-texts.tsx'
import { useDraft } from './use-draft.ts'
import type { Saving } from './use-draft.ts'
import { WritersOnly } from './writers-only.tsx'
import './articles.css'
import './editing.css'

function SavingWords({ saving }: { saving: Saving }) {
  switch (saving.state) {
    case 'saved':
      return <SavingState state="sent">Draft saved</SavingState>
    case 'typed':
    case 'sending':
      return <SavingState state="sending">Saving</SavingState>
    case 'no network':
      return (
        <SavingState state="here">No network: only on this page. Keep it open; it is sent again.</SavingState>
      )
    case 'conflict':
      return <SavingState state="here">Not saved: there are two texts</SavingState>
    case 'refused':
      return <SavingState state="here">Refused: {saving.title}</SavingState>
  }
}

function Preview({ slug, text }: { slug: string; text: DraftText }) {
  const late = useDeferredValue(text)
  const article = useMemo(() => articleOf(slug, late), [slug, late])
  return (
    <section className="draft-preview" aria-label="As readers will see it">
      <p className="draft-preview-head">As readers will see it</p>
      <ArticleKind article={article} />
      <p className="draft-title">{article.title === '' ? 'No title yet' : article.title}</p>
      <ArticleText article={article} />
    </section>
  )
}

type EditorProps = { slug: string; knowledge: Knowledge; opened: Draft & { text: DraftText } }

function Editor({ slug, knowledge, opened }: EditorProps) {
  const desk = useDraft(slug, opened)
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
        <SavingWords saving={saving} />
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
        <div>
          <DraftFields desk={desk} knowledge={knowledge} faults={{ ...faults, ...refusedFields }} />
          <PutInForce slug={slug} desk={desk} knowledge={knowledge} faults={faults} />
          <Withdrawal slug={slug} desk={desk} knowledge={knowledge} faults={faults} />
          <Revisions slug={slug} desk={desk} />
          <ReaderWords slug={slug} />
        </div>
        <Preview slug={slug} text={text} />
      </div>
    </>
  )
}

function Opening({ slug }: { slug: string }) {
  const state = useKnowledge()
  const draft = useQuery(draftQuery(slug))
  if (state.status !== 'success') return <NotYet state={state} />
  if (draft.isPending) return <Waiting what="the draft" />
  if (draft.isError)
    return (
      <Failed title="Couldn’t fetch the draft." onRetry={() => void draft.refetch()}>
        {refusalOf(draft.error).title}
      </Failed>
    )
  const { text } = draft.data
  if (text === null)
    return (
      <Empty title={`There is no article “${slug}”.`}>
        <Link to="/articles/new">Begin a new one</Link>
      </Empty>
    )
  return <Editor key={slug} slug={slug} knowledge={state.knowledge} opened={{ ...draft.data, text }} />
}

/** Where a senior tech changes an article and puts it in force. */
export function Component() {
  const { slug = '' } = useParams()
  return (
    <Page title="Change an article" width="page">
      <WritersOnly title="Change an article">
        <Opening slug={slug} />
      </WritersOnly>
    </Page>
  )
}
