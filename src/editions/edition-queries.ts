import { queryOptions, skipToken } from '@tanstack/react-query'
import type { QueryClient } from '@tanstack/react-query'
import { EditionInForce } from '../../server/editions/editions.contract.ts'
import type { FileName } from '../../server/editions/editions.contract.ts'
import type { Audience } from '../../rules/edition/audience.ts'
import { Person } from '../../server/people/me.contract.ts'
import { isQualified } from '../../server/people/roles.contract.ts'
import { ApiProblem, get } from '../api.ts'
import { keptPerson } from '../offline/person.ts'
import { bringFile, fileOf, readJson } from './edition-file.ts'
import type { FileOf } from './edition-file.ts'
import { keepEarlier, keepEdition, readKept } from './kept-editions.ts'

/** A file never changes under its hash, so it is read once and stays. Maps must not be compared piece by piece. */
const forGood = { staleTime: Infinity, gcTime: Infinity, structuralSharing: false } as const
/** How long a page waits for the server before it opens with what lies on the device. */
const patienceMs = 1500

const bringReaders = () => import('./read-files.ts')
type Readers = Awaited<ReturnType<typeof bringReaders>>

const whenIdle = (run: () => void) =>
  'requestIdleCallback' in window ? window.requestIdleCallback(run) : setTimeout(run, 1500)

/** What the server says is in force. */
export const inForceQuery = queryOptions({
  queryKey: ['edition', 'in-force'] as const,
  queryFn: async ({ signal }) => {
    const info = await get('/edition', EditionInForce, signal)
    // What can't be kept now is kept at the next contact.
    whenIdle(() => void keepEdition(info).catch(() => undefined))
    return info
  },
  staleTime: 60_000,
})

/** Whether what lies on the device is all that its person may have: who has just signed in may have more. */
async function isEnough(info: EditionInForce): Promise<boolean> {
  const person = Person.safeParse(await keptPerson().catch(() => undefined)).data
  return !isQualified(person?.role) || fileOf(info, 'articles-qualified') !== undefined
}

async function chooseEdition(client: QueryClient): Promise<EditionInForce> {
  const asked = client.fetchQuery(inForceQuery)
  const kept = await readKept()
  if (kept === undefined) return asked
  if (!(await isEnough(kept.inForce))) return asked.catch(() => kept.inForce)
  const tired = new Promise<undefined>((resolve) => setTimeout(() => resolve(undefined), patienceMs))
  return (await Promise.race([asked.catch(() => undefined), tired])) ?? kept.inForce
}

/**
 * The edition this tab works with. Chosen once: an edition put in force meanwhile is offered, never slipped under
 * someone's hands.
 */
export const usedQuery = (client: QueryClient) =>
  queryOptions({
    queryKey: ['edition', 'used'] as const,
    queryFn: () => chooseEdition(client),
    staleTime: Infinity,
    gcTime: Infinity,
  })

/**
 * An edition that was in force earlier: from this device, else from the server, and then kept, so that a sheet begun
 * with it opens with no network from then on.
 */
export const earlierQuery = (hash: string) =>
  queryOptions({
    queryKey: ['edition', 'earlier', hash] as const,
    queryFn: async ({ signal }) => {
      const kept = await readKept()
      const here = [kept?.inForce, ...(kept?.earlier ?? [])].find((one) => one?.hash === hash)
      if (here !== undefined) return here
      const info = await get(`/editions/${hash}`, EditionInForce, signal).catch((problem: unknown) => {
        if (problem instanceof ApiProblem && problem.status === 404) return null
        throw problem
      })
      if (info !== null) whenIdle(() => void keepEarlier(info).catch(() => undefined))
      return info
    },
    staleTime: 0,
  })

function fileQuery<Content>(
  info: EditionInForce | undefined,
  name: FileName,
  read: (readers: Readers, file: unknown) => Content,
) {
  const file = info && fileOf(info, name)
  return queryOptions({
    ...forGood,
    queryKey: ['edition-file', name, file?.hash] as const,
    queryFn: file === undefined ? skipToken : () => readFile(file, read),
  })
}

async function readFile<Content>(file: FileOf, read: (readers: Readers, file: unknown) => Content) {
  const [readers, bytes] = await Promise.all([bringReaders(), bringFile(file)])
  return read(readers, readJson(bytes))
}

/** What diagnosis needs, opened. Like the other files it waits where no edition is chosen yet. */
export const openedQuery = (info: EditionInForce | undefined) =>
  fileQuery(info, 'diagnosis', ({ openEdition }, file) => openEdition(file))
export const proceduresQuery = (info: EditionInForce | undefined, audience: Audience) =>
  fileQuery(info, `procedures-${audience}`, ({ readProcedures }, file) => readProcedures(file))
export const articlesQuery = (info: EditionInForce | undefined, audience: Audience) =>
  fileQuery(info, `articles-${audience}`, ({ readArticles }, file) => readArticles(file))
