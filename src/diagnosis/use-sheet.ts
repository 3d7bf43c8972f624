import { useCallback, useEffect, useRef, useState } from 'react'
import { loadSheet, onSheetsChanged, saveSheet } from '../offline/sheets.ts'
import type { SheetDoc } from '../offline/sheets.ts'
import type { Received } from '../offline/outbox.ts'
import { sentSheet } from './sent-sheet.ts'
import type { Came } from './sent-sheet.ts'
import { SheetContent } from './sheet-content.ts'
import { reduce } from './sheet-state.ts'
import { takeOver } from './take-over.ts'
import type { Action } from './sheet-state.ts'

export type OpenSheet = {
  id: string
  /** Hash of the edition it was begun with. */
  edition: string | undefined
  /** As typed, a moment ahead of the disk: what fields show. */
  typed: SheetContent
  /** As it lies on the device: what is drawn and ranked. */
  stored: SheetContent
  dispatch: (action: Action) => void
  /** Takes over what others wrote on the same sheet. False while something is being written: try again. */
  receive: (came: readonly Came[]) => boolean
  /** Why what was typed does not lie on the device. */
  unkept: string | undefined
  keepAgain: () => void
}
type Loaded = { status: 'pending' | 'missing' | 'unreadable' } | { status: 'open'; sheet: OpenSheet }
type Read = 'pending' | 'missing' | 'unreadable' | SheetContent

const isFull = (problem: unknown) => problem instanceof DOMException && problem.name === 'QuotaExceededError'
const wordsFor = (problem: unknown): string =>
  isFull(problem)
    ? 'This device is full. What was typed since is on the screen alone: make room, then try again.'
    : 'This device keeps nothing for this page. What was typed is on the screen alone.'

function contentOf(doc: SheetDoc | undefined): Read {
  if (doc === undefined) return 'missing'
  const read = SheetContent.safeParse(doc.content)
  return read.success ? read.data : 'unreadable'
}

/**
 * A findings sheet from this device. Each change is written to the disk before it is drawn or ranked; only the field
 * itself shows its key at once. Writes queue up, and of several waiting only the last is made.
 */
export function useSheet(id: string): Loaded {
  const [typed, setTyped] = useState<Read>('pending')
  const [stored, setStored] = useState<SheetContent>()
  const [edition, setEdition] = useState<string>()
  const [unkept, setUnkept] = useState<string>()
  const now = useRef<SheetContent | undefined>(undefined)
  const writing = useRef(false)
  const writtenAt = useRef('')
  /** What others wrote, from when it is taken over until it is on the disk. */
  const arrived = useRef<Received[]>([])

  const take = useCallback((doc: SheetDoc | undefined) => {
    const content = contentOf(doc)
    setTyped(content)
    if (typeof content === 'string') return
    now.current = content
    writtenAt.current = doc?.changedAt ?? ''
    setStored(content)
    setEdition(doc?.edition)
  }, [])

  useEffect(() => {
    let wanted = true
    const read = () =>
      void loadSheet(id).then(
        (doc) => {
          // Our own writes, and older ones, are no news.
          if (wanted && !writing.current && (doc?.changedAt ?? '') > writtenAt.current) take(doc)
        },
        () => undefined,
      )
    loadSheet(id).then(
      (doc) => wanted && take(doc),
      () => wanted && setTyped('missing'),
    )
    const stop = onSheetsChanged(read)
    return () => {
      wanted = false
      stop()
    }
  }, [id, take])

  const keep = useCallback(async () => {
    if (writing.current) return
    writing.current = true
    try {
      let written: SheetContent | undefined
      while (now.current !== undefined && now.current !== written) {
        written = now.current
        const changedAt = new Date().toISOString()
        writtenAt.current = changedAt
        const received = arrived.current.splice(0)
        const doc = { id, kind: 'diagnosis', title: written.title, edition, changedAt } as const
        try {
          await saveSheet({ ...doc, content: written, sends: sentSheet(written) }, received)
        } catch (problem) {
          arrived.current.unshift(...received)
          throw problem
        }
        setStored(written)
      }
      setUnkept(undefined)
    } catch (problem) {
      // Work goes on with what is on the screen; the page says that it isn't kept.
      setUnkept(wordsFor(problem))
      if (now.current !== undefined) setStored(now.current)
    } finally {
      writing.current = false
    }
  }, [id, edition])

  const dispatch = useCallback(
    (action: Action) => {
      if (now.current === undefined) return
      const next = reduce(now.current, action)
      if (next === now.current) return
      now.current = next
      setTyped(next)
      void keep()
    },
    [keep],
  )

  const receive = useCallback(
    (came: readonly Came[]): boolean => {
      // What was typed a moment ago is not in the outbox yet, where it would be seen.
      if (now.current === undefined || writing.current) return false
      if (came.length === 0) return true
      arrived.current.push(...came.map(({ mode, finding, ids, sent }) => ({ mode, finding, ids, sent })))
      now.current = takeOver(now.current, came)
      setTyped(now.current)
      void keep()
      return true
    },
    [keep],
  )

  if (typeof typed === 'string') return { status: typed }
  if (stored === undefined) return { status: 'pending' }
  return {
    status: 'open',
    sheet: { id, edition, typed, stored, dispatch, receive, unkept, keepAgain: () => void keep() },
  }
}
