import { useQueryClient } from '@tanstack/react-query'
import { useCallback, useEffect, useRef, useState } from 'react'
import type { Draft, DraftText, SaveDraft } from '../../server/articles/drafts.contract.ts'
import { NoNetwork } from '../api.ts'
import { draftQuery, revisionsQuery, saveDraft, theirsOf } from './drafts.api.ts'
import { formOf, textOf } from './draft-form.ts'
import type { DraftForm } from './draft-form.ts'
import { refusalOf } from './refusal.ts'

const quietMs = 1200
const againMs = 5000

export type Saving =
  | { state: 'saved' | 'typed' | 'sending' | 'no network' | 'conflict' }
  | { state: 'refused'; title: string; errors: Readonly<Record<string, string>> }

export type DraftDesk = {
  form: DraftForm
  /** What the server keeps. */
  kept: Draft
  saving: Saving
  /** What somebody else saved meanwhile. Nothing is saved until the writer has chosen. */
  theirs: Draft | undefined
  change: (part: Partial<DraftForm>) => void
  /** Saves what is typed, if anything is. Undefined: it did not go through. */
  flush: () => Promise<Draft | undefined>
  /** Saves this text in place of what is kept, which stays as a revision. */
  replaceWith: (text: DraftText, how?: Pick<SaveDraft, 'restores' | 'onto'>) => Promise<void>
  /** Goes on with one of two texts; the other stays as a revision. */
  choose: (which: 'mine' | 'theirs') => Promise<void>
  /** Takes over what the server answered to something else. */
  adopt: (draft: Draft, text?: DraftText) => void
  /** Looks at what another one has put between. True where that was it. */
  meet: (problem: unknown) => boolean
}

/** An article being written: every pause in typing saves it. One save at a time, each begun from the one before. */
export function useDraft(slug: string, opened: Draft & { text: DraftText }): DraftDesk {
  const [form, setForm] = useState(() => formOf(opened.text))
  const [kept, setKept] = useState<Draft>(opened)
  const [saving, setSaving] = useState<Saving>({ state: 'saved' })
  const [theirs, setTheirs] = useState<Draft>()
  const client = useQueryClient()
  const now = useRef({ form, kept, dirty: false, theirs: undefined as Draft | undefined })
  const running = useRef<Promise<Draft | undefined>>(undefined)

  const adopt = useCallback(
    (draft: Draft, text?: DraftText) => {
      now.current.kept = draft
      setKept(draft)
      client.setQueryData(draftQuery(slug).queryKey, draft)
      void client.invalidateQueries({ queryKey: revisionsQuery(slug).queryKey })
      if (text === undefined) return
      now.current.form = formOf(text)
      now.current.dirty = false
      setForm(now.current.form)
      setSaving({ state: 'saved' })
    },
    [client, slug],
  )
  const meet = useCallback((problem: unknown) => {
    const other = theirsOf(problem)
    if (other === undefined) return false
    now.current.theirs = other
    setTheirs(other)
    setSaving({ state: 'conflict' })
    return true
  }, [])

  const flush = useCallback(async (): Promise<Draft | undefined> => {
    await running.current
    const { dirty, theirs: other } = now.current
    if (other !== undefined) return undefined
    if (!dirty) return now.current.kept
    const work = (async () => {
      now.current.dirty = false
      setSaving({ state: 'sending' })
      try {
        const draft = await saveDraft(slug, {
          version: now.current.kept.version,
          ...textOf(now.current.form),
        })
        adopt(draft)
        setSaving({ state: now.current.dirty ? 'typed' : 'saved' })
        return draft
      } catch (problem) {
        now.current.dirty = true
        if (problem instanceof NoNetwork) setSaving({ state: 'no network' })
        else if (!meet(problem)) setSaving({ state: 'refused', ...refusalOf(problem) })
        return undefined
      }
    })()
    running.current = work
    try {
      return await work
    } finally {
      running.current = undefined
    }
  }, [adopt, meet, slug])

  const change = useCallback((part: Partial<DraftForm>) => {
    now.current.form = { ...now.current.form, ...part }
    now.current.dirty = true
    setForm(now.current.form)
    if (now.current.theirs === undefined) setSaving({ state: 'typed' })
  }, [])

  useEffect(() => {
    if (saving.state !== 'typed' && saving.state !== 'no network') return
    const timer = setTimeout(() => void flush(), saving.state === 'typed' ? quietMs : againMs)
    return () => clearTimeout(timer)
  }, [saving, form, flush])
  // Leaving within the application sends what is typed; closing the tab asks first.
  useEffect(() => () => void flush(), [flush])
  useEffect(() => {
    const ask = (event: BeforeUnloadEvent) => {
      if (now.current.dirty || running.current !== undefined) event.preventDefault()
    }
    window.addEventListener('beforeunload', ask)
    return () => window.removeEventListener('beforeunload', ask)
  }, [])

  const replaceWith = async (text: DraftText, how: Pick<SaveDraft, 'restores' | 'onto'> = {}) => {
    if ((await flush()) === undefined) return
    try {
      adopt(await saveDraft(slug, { version: now.current.kept.version, apart: true, ...text, ...how }), text)
    } catch (problem) {
      if (!meet(problem)) setSaving({ state: 'refused', ...refusalOf(problem) })
    }
  }

  const choose = async (which: 'mine' | 'theirs') => {
    const other = now.current.theirs
    if (other === undefined) return
    const mine = textOf(now.current.form)
    now.current.dirty = false
    setSaving({ state: 'sending' })
    try {
      // Mine is saved either way, so that whichever is not gone on with is among the revisions.
      let draft = await saveDraft(slug, { version: other.version, apart: true, ...mine })
      const text = which === 'theirs' && other.text !== null ? other.text : mine
      if (which === 'theirs') draft = await saveDraft(slug, { version: draft.version, apart: true, ...text })
      now.current.theirs = undefined
      setTheirs(undefined)
      if (which === 'theirs') return adopt(draft, text)
      adopt(draft)
      // What was typed since goes on from there.
      setSaving({ state: now.current.dirty ? 'typed' : 'saved' })
    } catch (problem) {
      now.current.dirty = true
      if (!meet(problem)) setSaving({ state: 'refused', ...refusalOf(problem) })
    }
  }

  return { form, kept, saving, theirs, change, flush, replaceWith, choose, adopt, meet }
}
