import { useQueryClient } from '@tanstack/react-query'
import { useCallback, useEffect, useRef, useState } from 'react'
import type { Draft, DraftText, SaveDraft } from '../../server/articles/drafts.contract.ts'
import { NoNetwork } from '../api.ts'
import { draftQuery, revisionsQuery, saveDraft, theirsOf } from './drafts.api.ts'
import { formOf, sameText, textOf } from './draft-form.ts'
import type { DraftForm } from './draft-form.ts'
import { misfitOf, refusalOf } from './refusal.ts'
import type { Refusal } from './refusal.ts'
import { useUnsentKeeper } from './use-unsent.ts'
import type { Unsent } from './use-unsent.ts'

const quietMs = 1200
const againMs = 5000

export type Saving =
  { state: 'saved' | 'typed' | 'sending' | 'no network' | 'conflict' } | ({ state: 'refused' } & Refusal)

type Instead = { draft: Draft; text?: DraftText | undefined }

export type DraftDesk = {
  form: DraftForm
  /** What the server keeps. */
  kept: Draft
  saving: Saving
  /** The device keeps nothing, so what is not saved lies on this page alone. */
  onlyHere: boolean
  /** Another text that stands beside the typed one. Nothing is saved until the writer has chosen. */
  theirs: Draft | undefined
  change: (part: Partial<DraftForm>) => void
  /**
   * Saves what is typed, then does something else with what is kept, before anything is saved again. Does nothing when
   * the saving did not go through. A text in the answer takes the place of the typed one.
   */
  afterSaving: (work: (kept: Draft) => Promise<Instead>) => Promise<boolean>
  /** Saves this text in place of what is kept, which stays as a revision. */
  replaceWith: (text: DraftText, how?: Pick<SaveDraft, 'restores' | 'onto'>) => Promise<void>
  /** Goes on with one of two texts; the other stays as a revision. */
  choose: (which: 'mine' | 'theirs') => Promise<void>
  /** Looks at what another one has put between. True where that was it. */
  meet: (problem: unknown) => boolean
}

/**
 * An article being written: every pause in typing saves it, and until the server has answered with it the device keeps
 * it. One request at a time, each begun from the answer before; what is typed meanwhile is never overwritten.
 * @param unsent a text of this device to go on with
 */
export function useDraft(
  { slug, personId }: { slug: string; personId: string },
  opened: Draft & { text: DraftText },
  unsent?: Unsent,
): DraftDesk {
  const begun: Draft = unsent === undefined ? opened : { ...opened, version: unsent.version }
  const [form, setForm] = useState(() => formOf(unsent?.text ?? opened.text))
  const [kept, setKept] = useState<Draft>(begun)
  const [saving, setSaving] = useState<Saving>({ state: unsent === undefined ? 'saved' : 'typed' })
  const [theirs, setTheirs] = useState<Draft>()
  const client = useQueryClient()
  const device = useUnsentKeeper(personId, slug)
  const { keep: keepOnDevice, isKept } = device
  const now = useRef({
    form,
    kept: begun,
    dirty: unsent !== undefined,
    // What the device brought is a revision of its own: it may be of another day.
    apart: unsent !== undefined,
    theirs: undefined as Draft | undefined,
    tried: undefined as DraftText | undefined,
  })
  const turn = useRef<Promise<unknown>>(Promise.resolve())
  const inTurn = useCallback(<Done>(work: () => Promise<Done>): Promise<Done> => {
    const mine = turn.current.then(work, work)
    turn.current = mine.catch(() => undefined)
    return mine
  }, [])

  const setOther = useCallback((other: Draft | undefined) => {
    now.current.theirs = other
    setTheirs(other)
    if (other !== undefined) setSaving({ state: 'conflict' })
  }, [])
  /** Takes over what the server answered; a text instead of the typed one only if nothing was typed since. */
  const take = useCallback(
    ({ draft, text }: Instead, typed: DraftForm) => {
      const desk = now.current
      desk.kept = draft
      setKept(draft)
      client.setQueryData(draftQuery(slug).queryKey, draft)
      void client.invalidateQueries({ queryKey: revisionsQuery(slug).queryKey })
      const moved = desk.form !== typed
      if (text !== undefined && !moved) {
        desk.form = formOf(text)
        setForm(desk.form)
      }
      desk.dirty = moved
      keepOnDevice(moved ? { text: textOf(desk.form), version: draft.version } : null)
      if (text !== undefined && moved) setOther(draft)
      else setSaving({ state: moved ? 'typed' : 'saved' })
    },
    [client, keepOnDevice, setOther, slug],
  )
  const meet = useCallback(
    (problem: unknown) => {
      const other = theirsOf(problem)
      if (other === undefined) return false
      setOther(other)
      return true
    },
    [setOther],
  )
  const send = useCallback(
    (text: DraftText, how: Partial<SaveDraft> = {}) => {
      now.current.tried = text
      return saveDraft(slug, { version: now.current.kept.version, ...text, ...how })
    },
    [slug],
  )
  const fail = useCallback(
    (problem: unknown) => {
      if (problem instanceof NoNetwork) setSaving({ state: 'no network' })
      else if (!meet(problem)) setSaving({ state: 'refused', ...refusalOf(problem) })
    },
    [meet],
  )

  const saveTyped = useCallback(async (): Promise<Draft | undefined> => {
    const desk = now.current
    if (desk.theirs !== undefined) return undefined
    if (!desk.dirty) return desk.kept
    const typed = desk.form
    const text = textOf(typed)
    const misfit = misfitOf(text)
    if (misfit !== undefined) {
      setSaving({ state: 'refused', ...misfit })
      return undefined
    }
    setSaving({ state: 'sending' })
    const before = desk.tried
    try {
      const draft = await send(text, desk.apart ? { apart: true } : {})
      desk.apart = false
      take({ draft }, typed)
      return draft
    } catch (problem) {
      // An earlier try went through and only its answer was lost: then the other text is one's own.
      const other = theirsOf(problem)
      const own = [before, text].some((tried) => tried && other?.text && sameText(tried, other.text))
      if (other === undefined || !own) fail(problem)
      else {
        desk.kept = other
        desk.tried = undefined
        return saveTyped()
      }
      return undefined
    }
  }, [fail, send, take])
  const flush = useCallback(() => inTurn(saveTyped), [inTurn, saveTyped])

  const change = useCallback(
    (part: Partial<DraftForm>) => {
      const desk = now.current
      desk.form = { ...desk.form, ...part }
      desk.dirty = true
      setForm(desk.form)
      keepOnDevice({ text: textOf(desk.form), version: desk.kept.version })
      if (desk.theirs === undefined) setSaving({ state: 'typed' })
    },
    [keepOnDevice],
  )

  useEffect(() => {
    if (saving.state !== 'typed' && saving.state !== 'no network') return
    const timer = setTimeout(() => void flush(), saving.state === 'typed' ? quietMs : againMs)
    return () => clearTimeout(timer)
  }, [saving, form, flush])
  // Leaving within the application sends what is typed; closing the tab asks only where the device has not kept it.
  useEffect(() => () => void flush(), [flush])
  useEffect(() => {
    const ask = (event: BeforeUnloadEvent) => {
      if (now.current.dirty && !isKept()) event.preventDefault()
    }
    window.addEventListener('beforeunload', ask)
    return () => window.removeEventListener('beforeunload', ask)
  }, [isKept])

  const afterSaving = (work: (kept: Draft) => Promise<Instead>) =>
    inTurn(async () => {
      const draft = await saveTyped()
      if (draft === undefined) return false
      const typed = now.current.form
      take(await work(draft), typed)
      return true
    })

  const replaceWith = async (text: DraftText, how: Pick<SaveDraft, 'restores' | 'onto'> = {}) => {
    try {
      await afterSaving(async () => ({ draft: await send(text, { apart: true, ...how }), text }))
    } catch (problem) {
      fail(problem)
    }
  }

  const choose = (which: 'mine' | 'theirs') =>
    inTurn(async () => {
      const other = now.current.theirs
      if (other === undefined) return
      const typed = now.current.form
      const mine = textOf(typed)
      setSaving({ state: 'sending' })
      try {
        // Mine is saved either way, so that whichever is not gone on with is among the revisions.
        let draft = await send(mine, { version: other.version, apart: true })
        const text = which === 'theirs' && other.text !== null ? other.text : undefined
        if (text !== undefined) draft = await send(text, { version: draft.version, apart: true })
        setOther(undefined)
        take({ draft, text }, typed)
      } catch (problem) {
        fail(problem)
      }
    })

  const onlyHere = device.fails
  return { form, kept, saving, onlyHere, theirs, change, afterSaving, replaceWith, choose, meet }
}
