/** What the pages of this folder ask of the server. Apart from `people.api.ts`, which every page carries. */
import { queryOptions } from '@tanstack/react-query'
import { Me } from '../../server/people/me.contract.ts'
import {
  LinkMade,
  LinkOpened,
  PeopleList,
  PersonMade,
  PersonRow,
} from '../../server/people/people.contract.ts'
import type { NewPerson } from '../../server/people/people.contract.ts'
import { isQualified } from '../../server/people/roles.contract.ts'
import type { Role } from '../../server/people/roles.contract.ts'
import { get, send } from '../api.ts'
import { claimSheets } from '../offline/claim.ts'
import { forgetPerson, rememberPerson } from './device-person.ts'

/**
 * Remembers who came in, and opens a page whole: what this tab held was for who was here before.
 * @param to an address of ours; from the front page techs go on to Diagnosis
 */
async function comeIn({ person }: Me, to: string, isNew = false): Promise<void> {
  if (person !== null) await rememberPerson(person)
  // Whoever makes an account made the check on this device just before. Who signs in may be somebody else, and is asked.
  if (person !== null && isNew) await claimSheets(person.id).catch(() => undefined)
  window.location.assign(to === '/' && isQualified(person?.role) ? '/diagnosis' : to)
}

export const signIn = async (email: string, password: string, to: string) =>
  comeIn(await send('POST', '/sign-in', { email, password }, Me), to)

export const signUp = async (account: { email: string; name: string; password: string }, to: string) =>
  comeIn(await send('POST', '/sign-up', account, Me), to, true)

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
