import { queryOptions } from '@tanstack/react-query'
import { useCallback, useMemo, useRef, useState } from 'react'
import * as z from 'zod/mini'
import { Audience } from '../../rules/edition/audience.ts'
import type { DraftText } from '../../server/articles/drafts.contract.ts'
import { dropUnsent, keepUnsent, readUnsent } from '../offline/unsent-texts.ts'

// What is typed may be longer than what can be sent, and must come back all the same.
const lines = z.array(z.string())
const Typed = z.object({
  head: z.object({
    title: z.string(),
    audience: Audience,
    causes: lines,
    tests: lines,
    words: lines,
    sources: lines,
    reviewed: z.string(),
    dueForReview: z.string(),
  }),
  body: z.string(),
})

/** A text that this device has and the server has not answered with. */
export type Unsent = { text: DraftText; version: string; typedAt: string }

/** Null where there is none. A private window keeps none. */
export const unsentQuery = (personId: string, slug: string) =>
  queryOptions({
    queryKey: ['unsent-text', personId, slug] as const,
    queryFn: async (): Promise<Unsent | null> => {
      const kept = await readUnsent(personId, slug).catch(() => undefined)
      const text = Typed.safeParse(kept?.text).data
      return kept === undefined || text === undefined
        ? null
        : { text, version: kept.version, typedAt: kept.typedAt }
    },
    staleTime: Infinity,
    gcTime: 0,
  })

export type UnsentKeeper = {
  /** Keeps this text in place of the one before; null once the server has it. */
  keep: (unsent: Omit<Unsent, 'typedAt'> | null) => void
  /** Whether all that was handed over lies on the disk by now. */
  isKept: () => boolean
  /** The device keeps nothing: full, or a private window. */
  fails: boolean
}

/** Writes the newest text to the device, one write at a time, so that fast typing waits for no disk. */
export function useUnsentKeeper(personId: string, slug: string): UnsentKeeper {
  const [fails, setFails] = useState(false)
  const now = useRef({
    next: undefined as Omit<Unsent, 'typedAt'> | null | undefined,
    writing: false,
    failed: false,
  })
  const keep = useCallback(
    (unsent: Omit<Unsent, 'typedAt'> | null) => {
      now.current.next = unsent
      if (now.current.writing) return
      const write = async () => {
        now.current.writing = true
        while (now.current.next !== undefined) {
          const { next } = now.current
          now.current.next = undefined
          const done =
            next === null
              ? dropUnsent(personId, slug)
              : keepUnsent({ ...next, personId, slug, typedAt: new Date().toISOString() })
          now.current.failed = await done.then(
            () => false,
            () => true,
          )
          setFails(now.current.failed)
        }
        now.current.writing = false
      }
      void write()
    },
    [personId, slug],
  )
  const isKept = useCallback(() => !now.current.writing && !now.current.failed, [])
  return useMemo(() => ({ keep, isKept, fails }), [keep, isKept, fails])
}
