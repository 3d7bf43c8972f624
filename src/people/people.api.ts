import { queryOptions, useQuery } from '@tanstack/react-query'
import { useEffect } from 'react'
import { Me } from '../../server/people/me.contract.ts'
import type { Person } from '../../server/people/me.contract.ts'
import { isQualified } from '../../server/people/roles.contract.ts'
import { get } from '../api.ts'
import { keepAgain } from '../editions/edition.api.ts'
import { onPersonChanged, readPerson, settlePerson } from './device-person.ts'

const keptQuery = queryOptions({
  queryKey: ['me', 'kept'] as const,
  queryFn: async () => (await readPerson()) ?? null,
  staleTime: Infinity,
  retry: false,
})
const askedQuery = queryOptions({
  queryKey: ['me', 'asked'] as const,
  queryFn: async ({ signal, client }) => {
    const { person } = await get('/me', Me, signal)
    const before = await readPerson()
    const settled = await settlePerson(person)
    // What came before this device knew who is here was not kept.
    if (isQualified(settled.person?.role) && !isQualified(before?.role)) void keepAgain(client)
    return settled
  },
  staleTime: 60_000,
})

/** All that is kept about who is signed in: ask anew when the server says that nobody is. */
export const meKey = ['me', 'asked'] as const

export type SignedIn = {
  /** False until the device or the server has said who is here. */
  known: boolean
  /** Who is signed in; where the server can't be asked, who last was. */
  person: Person | undefined
  /** The session has ended with time. Work on the device goes on; sending waits. */
  expired: boolean
}

/** Who is signed in on this device. */
export function useMe(): SignedIn {
  const kept = useQuery(keptQuery)
  const asked = useQuery(askedQuery)
  if (asked.data !== undefined) return { known: true, ...asked.data }
  const person = kept.data ?? undefined
  // Once it couldn't be asked that stays so while it is asked again: a part of the page that asks anew when it is drawn
  // would otherwise take away the very page that drew it.
  const known = person !== undefined || (asked.isFetched && !kept.isPending)
  return { known, person, expired: false }
}

/** Whether whoever is signed in is a qualified person; undefined until that is known. */
export function useQualified(): boolean | undefined {
  const { known, person } = useMe()
  return known ? isQualified(person?.role) : undefined
}

/** Draws the page anew when somebody signs in or out in another tab. One place on the page is enough. */
export function useFollowPerson(): void {
  useEffect(() => onPersonChanged(() => window.location.reload()), [])
}
