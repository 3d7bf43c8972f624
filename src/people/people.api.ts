import { queryOptions, useQuery } from '@tanstack/react-query'
import { useEffect } from 'react'
import {
  LinkMade,
  LinkOpened,
  Me,
  PeopleList,
  PersonMade,
  PersonRow,
} from '../../server/people/people.contract.ts'
import type { NewPerson, Person } from '../../server/people/people.contract.ts'
import { isQualified } from '../../server/people/roles.contract.ts'
import type { Role } from '../../server/people/roles.contract.ts'
import { get, send } from '../api.ts'
import { onPersonChanged, forgetPerson, readPerson, rememberPerson, settlePerson } from './device-person.ts'

const keptQuery = queryOptions({
  queryKey: ['me', 'kept'] as const,
  queryFn: async () => (await readPerson()) ?? null,
  staleTime: Infinity,
  retry: false,
})
const askedQuery = queryOptions({
  queryKey: ['me', 'asked'] as const,
  queryFn: async ({ signal }) => settlePerson((await get('/me', Me, signal)).person),
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
  const known = person !== undefined || (asked.isError && !kept.isPending)
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

/**
 * Remembers who came in, and opens a page whole: what this tab held was for who was here before.
 * @param to an address of ours; from the front page techs go on to Diagnosis
 */
async function comeIn({ person }: Me, to: string): Promise<void> {
  if (person !== null) await rememberPerson(person)
  window.location.assign(to === '/' && isQualified(person?.role) ? '/diagnosis' : to)
}

export const signIn = async (email: string, password: string, to: string) =>
  comeIn(await send('POST', '/sign-in', { email, password }, Me), to)

export const signUp = async (account: { email: string; name: string; password: string }, to: string) =>
  comeIn(await send('POST', '/sign-up', account, Me), to)

export const setPassword = async (token: string, password: string, to: string) =>
  comeIn(await send('POST', `/links/${encodeURIComponent(token)}`, { password }, Me), to)

/** Ends the session, here or everywhere; what is for qualified people leaves the device. */
export async function signOut(where: 'here' | 'everywhere'): Promise<void> {
  await send('POST', where === 'here' ? '/sign-out' : '/sign-out-everywhere', {}, Me)
  await forgetPerson()
  window.location.assign('/')
}

export const changePassword = (current: string, password: string) =>
  send('POST', '/account/password', { current, password }, Me)

export const linkQuery = (token: string) =>
  queryOptions({
    queryKey: ['link', token] as const,
    queryFn: ({ signal }) => get(`/links/${encodeURIComponent(token)}`, LinkOpened, signal),
    staleTime: Infinity,
  })

export const peopleQuery = queryOptions({
  queryKey: ['people'] as const,
  queryFn: ({ signal }) => get('/people', PeopleList, signal),
})

export const addPerson = (person: NewPerson) => send('POST', '/people', person, PersonMade)

export const changePerson = (id: string, change: { role: Role } | { left: boolean }) =>
  send('PATCH', `/people/${id}`, change, PersonRow)

export const makeLink = (id: string) => send('POST', `/people/${id}/link`, {}, LinkMade)
