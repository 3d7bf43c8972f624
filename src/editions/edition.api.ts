import { useQuery, useQueryClient } from '@tanstack/react-query'
import type { QueryClient } from '@tanstack/react-query'
import { useEffect, useMemo } from 'react'
import type { EditionInForce, FileName } from '../../server/editions/editions.contract.ts'
import type { Edition } from '../../rules/edition/open.ts'
import type { Article, CauseProcedure, ProceduresFile, TestProcedure } from '../../rules/edition/schema.ts'
import { listenForEditions } from './announcements.ts'
import { fileOf } from './edition-file.ts'
import {
  articlesQuery,
  earlierQuery,
  inForceQuery,
  openedQuery,
  proceduresQuery,
  usedQuery,
} from './edition-queries.ts'
import { mergeCauses } from './merge-causes.ts'

type Status = 'pending' | 'error' | 'success'
type Shown = { status: Status; error: Error | undefined; retry: () => void }
type Asked = { status: Status; error: Error | null; refetch: () => unknown }

/** One state for several things asked: failed when one failed, there when all are there. */
function together(...asked: readonly (Asked | undefined)[]): Shown {
  const all = asked.filter((one) => one !== undefined)
  const failed = all.filter((one) => one.status === 'error')
  return {
    status:
      failed.length > 0 ? 'error' : all.every((one) => one.status === 'success') ? 'success' : 'pending',
    error: failed[0]?.error ?? undefined,
    retry: () => {
      for (const one of failed) void one.refetch()
    },
  }
}

/** Thrown into `error` when neither this device nor the server has a sheet's own edition. */
export class EditionNotHere extends Error {
  override name = 'EditionNotHere'
}
const notHere = new EditionNotHere('The edition this was begun with is not on the server any more.')

/** Whether there is more for qualified people. What lies on the device may stem from before they signed in. */
const hasMore = (info: EditionInForce | undefined, name: FileName): boolean =>
  info === undefined || fileOf(info, name) !== undefined

function useUsed() {
  const client = useQueryClient()
  return useQuery(usedQuery(client))
}

/**
 * The edition this page works with, opened. With a hash, that edition, from this device or from the server: a sheet
 * stays on the edition it was begun with.
 */
export function useEdition(
  hash?: string,
): Shown & { edition: Edition | undefined; info: EditionInForce | undefined } {
  const used = useUsed()
  const wantsEarlier = hash !== undefined && used.data !== undefined && used.data.hash !== hash
  const earlier = useQuery({ ...earlierQuery(hash ?? ''), enabled: wantsEarlier })
  const info = wantsEarlier ? (earlier.data ?? undefined) : used.data
  const opened = useQuery(openedQuery(info))
  const state = together(used, wantsEarlier ? earlier : undefined, info && opened)
  if (wantsEarlier && earlier.data === null)
    return { ...state, status: 'error', error: notHere, edition: undefined, info: undefined }
  const status = state.status === 'success' && opened.data === undefined ? 'pending' : state.status
  return { ...state, status, edition: opened.data, info }
}

/**
 * How tests are done and what is to be known of causes, by id.
 * @param qualified with what is for qualified people
 */
export function useProcedures(qualified: boolean): Shown & {
  tests: ReadonlyMap<string, TestProcedure>
  causes: ReadonlyMap<string, CauseProcedure>
} & {
  files: readonly ProceduresFile[]
} {
  const used = useUsed()
  const info = used.data
  const open = useQuery(proceduresQuery(info, 'everyone'))
  const wanted = qualified && hasMore(info, 'procedures-qualified')
  const more = useQuery(proceduresQuery(wanted ? info : undefined, 'qualified'))
  const state = together(used, open, wanted ? more : undefined)
  const [first, second] = [open.data, wanted ? more.data : undefined]
  return useMemo(() => {
    const files = [first, second].filter((file) => file !== undefined)
    const tests = new Map(files.flatMap((file) => file.tests).map((test) => [test.test, test]))
    return { ...state, files, tests, causes: mergeCauses(files.flatMap((file) => file.causes)) }
    // `retry` is new each time and reads nothing that goes stale.
  }, [state.status, state.error, first, second])
}

/**
 * Articles by slug.
 * @param qualified with those for qualified people
 */
export function useArticles(qualified: boolean): Shown & {
  articles: ReadonlyMap<string, Article>
  /** Those that hold no more: for whoever has their link, and for nothing else. */
  withdrawn: ReadonlyMap<string, Article>
} {
  const used = useUsed()
  const info = used.data
  const open = useQuery(articlesQuery(info, 'everyone'))
  const wanted = qualified && hasMore(info, 'articles-qualified')
  const more = useQuery(articlesQuery(wanted ? info : undefined, 'qualified'))
  const state = together(used, open, wanted ? more : undefined)
  const [first, second] = [open.data, wanted ? more.data : undefined]
  return useMemo(() => {
    const all = [first, second].flatMap((file) => file?.articles ?? [])
    const named = (some: Article[]) => new Map(some.map((article) => [article.slug, article]))
    return {
      ...state,
      articles: named(all.filter((article) => article.withdrawn === undefined)),
      withdrawn: named(all.filter((article) => article.withdrawn !== undefined)),
    }
  }, [state.status, state.error, first, second])
}

/** Asks what is in force once more, and keeps what this device's person may read of it. */
export const keepAgain = (client: QueryClient): Promise<void> =>
  client.invalidateQueries({ queryKey: inForceQuery.queryKey })

/** Moves this tab to the edition in force, once that has been brought whole. */
async function takeNewEdition(client: QueryClient): Promise<void> {
  const info = await client.fetchQuery({ ...inForceQuery, staleTime: 0 })
  await client.ensureQueryData(openedQuery(info))
  client.setQueryData(usedQuery(client).queryKey, info)
}

/**
 * Number of the edition in force where it is another than the one this tab works with, and the way to move to it.
 * Listens to the server while it is in use; one place on the page is enough.
 */
export function useNewEdition(): {
  announced: number | undefined
  /** Number of the edition this tab works with. */
  current: number | undefined
  load: () => void
} {
  const client = useQueryClient()
  const used = useUsed()
  const inForce = useQuery(inForceQuery)
  useEffect(
    () => listenForEditions(() => void client.invalidateQueries({ queryKey: inForceQuery.queryKey })),
    [client],
  )
  // The same edition with more or fewer files: somebody else is signed in now.
  const other =
    inForce.data?.hash === used.data?.hash && inForce.data?.files.length !== used.data?.files.length
  useEffect(() => {
    if (other) client.setQueryData(usedQuery(client).queryKey, inForce.data)
  }, [client, other, inForce.data])
  const differs =
    used.data !== undefined && inForce.data !== undefined && used.data.hash !== inForce.data.hash
  return {
    announced: differs ? inForce.data.number : undefined,
    current: used.data?.number,
    // Where it can't be brought now, the bar stays and the button with it.
    load: () => void takeNewEdition(client).catch(() => undefined),
  }
}
