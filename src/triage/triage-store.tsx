import { createContext, useCallback, useContext, useEffect, useMemo, useRef, useState } from 'react'
import type { ReactNode } from 'react'
import { newId } from '../offline/new-id.ts'
import { getSetting, setSetting } from '../offline/settings.ts'
import { loadSheet, removeSheet, saveSheet } from '../offline/sheets.ts'
import { sentFindings } from './sent-findings.ts'
import { blank, Triage } from './triage-state.ts'

type Change = (from: Triage) => Triage
export type TriageStore = {
  triage: Triage
  /** The sheet the answers lie in on this device; undefined before the first. */
  sheetId: () => string | undefined
  /** Keeps the change on the device, then draws it. Resolves once drawn. */
  change: (how: Change) => Promise<void>
  /** Forgets all answers and begins anew; gives the way back. */
  startAgain: () => Promise<() => Promise<void>>
  /** The device keeps nothing: answers live until the page is left. */
  keepsNothing: boolean
}

const Store = createContext<TriageStore | undefined>(undefined)

/** The answers of the check that is open on this device. */
export function useTriage(): TriageStore {
  const store = useContext(Store)
  if (store === undefined) throw new Error('useTriage stands outside TriageProvider')
  return store
}

const patienceMs = 3000

/** What a promise brings, or a rejection when it takes too long. */
const within = <T,>(ms: number, promise: Promise<T>): Promise<T> =>
  Promise.race([
    promise,
    new Promise<never>((_, reject) => setTimeout(() => reject(new Error('took too long')), ms)),
  ])

const titleOf = (triage: Triage): string =>
  triage.where.trim() === '' ? 'Check my power' : triage.where.trim()

/**
 * Opens the check that lies on this device, or a blank one. Draws nothing until it knows.
 * @param edition hash of the edition that answers now; kept with the answers
 */
export function TriageProvider({ edition, children }: { edition: string | undefined; children: ReactNode }) {
  const [drawn, setDrawn] = useState<Triage>()
  const [keepsNothing, setKeepsNothing] = useState(false)
  const latest = useRef<Triage>(blank)
  const id = useRef<string | undefined>(undefined)
  const hash = useRef(edition)
  useEffect(() => {
    hash.current = edition
  }, [edition])
  /** The last write failed, or never ended. */
  const broken = useRef(false)
  /** Writes go one after another, so that an older answer never lands on a newer one. */
  const queue = useRef<Promise<void>>(Promise.resolve())

  useEffect(() => {
    let wanted = true
    const start = (triage: Triage) => {
      if (!wanted) return
      wanted = false
      latest.current = triage
      setDrawn(triage)
    }
    const open = async () => {
      const kept = await getSetting('openTriage')
      const doc = kept === undefined ? undefined : await loadSheet(kept)
      const read = Triage.safeParse(doc?.content)
      if (doc === undefined || !read.success) return start(blank)
      if (wanted) id.current = doc.id
      start(read.data)
    }
    const withoutStore = () => {
      if (wanted) setKeepsNothing((broken.current = true))
      start(blank)
    }
    void open().catch(withoutStore)
    // A store that never answers must not keep back what to do in danger.
    const impatient = setTimeout(withoutStore, patienceMs)
    return () => {
      clearTimeout(impatient)
      wanted = false
    }
  }, [])

  const keep = useCallback(async (triage: Triage) => {
    const first = id.current === undefined
    id.current ??= newId()
    await saveSheet({
      id: id.current,
      kind: 'triage',
      title: titleOf(triage),
      edition: hash.current,
      changedAt: new Date().toISOString(),
      content: triage,
      sends: sentFindings(triage),
    })
    if (first) await setSetting('openTriage', id.current)
  }, [])

  const change = useCallback(
    (how: Change) => {
      const next = how(latest.current)
      latest.current = next
      const written = queue.current
        .then(() => within(patienceMs, keep(next)))
        .then(
          () => setKeepsNothing((broken.current = false)),
          () => setKeepsNothing((broken.current = true)),
        )
      queue.current = written
      const draw = () => setDrawn(latest.current)
      // Where nothing is kept, waiting for it would only keep back the answer.
      if (broken.current) draw()
      return written.then(draw)
    },
    [keep],
  )

  const startAgain = useCallback(async () => {
    const [before, beforeId] = [latest.current, id.current]
    await queue.current
    if (beforeId !== undefined) {
      await removeSheet(beforeId).catch(() => undefined)
      await setSetting('openTriage', undefined).catch(() => undefined)
    }
    id.current = undefined
    latest.current = blank
    setDrawn(blank)
    return async () => {
      if (id.current === undefined) id.current = beforeId
      await setSetting('openTriage', beforeId).catch(() => undefined)
      await change(() => before)
    }
  }, [change])

  const store = useMemo(
    () => drawn && { triage: drawn, sheetId: () => id.current, change, startAgain, keepsNothing },
    [drawn, change, startAgain, keepsNothing],
  )
  return store === undefined ? null : <Store value={store}>{children}</Store>
}
