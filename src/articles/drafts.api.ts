import { queryOptions } from '@tanstack/react-query'
import * as z from 'zod/mini'
import {
  ArticleInForce,
  Draft,
  DraftList,
  Revision,
  RevisionList,
} from '../../server/articles/drafts.contract.ts'
import type { SaveDraft } from '../../server/articles/drafts.contract.ts'
import { Feedback, HelpedKept } from '../../server/articles/feedback.contract.ts'
import { ApiProblem, get, send } from '../api.ts'

const at = (slug: string, rest = '') => `/article-drafts/${encodeURIComponent(slug)}${rest}`

export const draftListQuery = queryOptions({
  queryKey: ['article-drafts'] as const,
  queryFn: ({ signal }) => get('/article-drafts', DraftList, signal),
})
/** Read once when the editor opens: from then on the editor holds the text. */
export const draftQuery = (slug: string) =>
  queryOptions({
    queryKey: ['article-drafts', slug, 'draft'] as const,
    queryFn: ({ signal }) => get(at(slug), Draft, signal),
    staleTime: Infinity,
    gcTime: 0,
  })
export const revisionsQuery = (slug: string) =>
  queryOptions({
    queryKey: ['article-drafts', slug, 'revisions'] as const,
    queryFn: ({ signal }) => get(at(slug, '/revisions'), RevisionList, signal),
  })
export const revisionQuery = (slug: string, number: number) =>
  queryOptions({
    queryKey: ['article-drafts', slug, 'revision', number] as const,
    queryFn: ({ signal }) => get(at(slug, `/revisions/${number}`), Revision, signal),
    staleTime: Infinity,
  })
export const feedbackQuery = (slug: string) =>
  queryOptions({
    queryKey: ['article-drafts', slug, 'feedback'] as const,
    queryFn: ({ signal }) => get(at(slug, '/feedback'), Feedback, signal),
  })

export const saveDraft = (slug: string, save: SaveDraft) => send('PUT', at(slug), save, Draft)
export const letGo = (slug: string, version: string) => send('POST', at(slug, '/let-go'), { version }, Draft)
export const putArticleInForce = (slug: string, version: string, reason: string) =>
  send('PUT', at(slug, '/in-force'), { version, reason }, ArticleInForce)
export const withdraw = (slug: string, wanted: { withdrawn: boolean; reason: string; replacedBy?: string }) =>
  send('PUT', at(slug, '/withdrawn'), wanted, ArticleInForce)
export const sayHelped = (slug: string, said: { edition: number; helped: boolean; why: string }) =>
  send('POST', `/articles/${encodeURIComponent(slug)}/feedback`, said, HelpedKept)

const Conflict = z.object({ theirs: Draft })

/** The text that somebody else saved meanwhile, where that is why something was refused. */
export function theirsOf(problem: unknown): Draft | undefined {
  if (!(problem instanceof ApiProblem) || problem.status !== 409) return undefined
  return Conflict.safeParse(problem.also).data?.theirs
}
