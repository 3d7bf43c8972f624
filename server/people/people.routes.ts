import { Router } from 'express'
import type { Db } from '../database.ts'
import { Problem, notFound } from '../problem.ts'
import { readBody, readId } from '../read.ts'
import { allow, signedIn } from '../session.ts'
import { alterPerson } from './alter-person.ts'
import { makeLink } from './one-time-link.ts'
import { LinkMade, NewPerson, PeopleList, PersonChange, PersonMade, PersonRow } from './people.contract.ts'
import { addPerson, findPerson, findRow, listPeople } from './people.queries.ts'
import type { PersonColumns } from './people.queries.ts'

const rowOf = ({ made_at, left_at, password_hash, ...person }: PersonColumns): PersonRow => ({
  ...person,
  madeAt: made_at.toISOString(),
  leftAt: left_at?.toISOString() ?? null,
  hasPassword: password_hash !== null,
})

/** The people of the shop: for admins alone. */
export function peopleRoutes(db: Db): Router {
  return Router()
    .get('/people', allow('admin'), async (_req, res) => {
      const people = (await listPeople(db)).map(rowOf)
      res.set('Cache-Control', 'no-store').json(PeopleList.parse({ people }))
    })
    .post('/people', allow('admin'), async (req, res) => {
      const person = readBody(req, NewPerson)
      const admin = signedIn(req)
      const made = await db.transaction().execute(async (tx) => {
        const id = await addPerson(tx, { ...person, password_hash: null, made_by: admin.id })
        const row = id === undefined ? undefined : await findRow(tx, id)
        return row && { person: rowOf(row), link: await makeLink(tx, row.id, admin.id) }
      })
      if (made === undefined)
        throw new Problem('conflict', 'There is an account already.', {
          email: 'This e-mail address has an account. Change its role in the list.',
        })
      res.status(201).set('Cache-Control', 'no-store').json(PersonMade.parse(made))
    })
    .patch('/people/:id', allow('admin'), async (req, res) => {
      const id = readId(req, 'person')
      const row = await alterPerson(db, signedIn(req).id, id, readBody(req, PersonChange))
      if (row === undefined) throw notFound('person')
      res.set('Cache-Control', 'no-store').json(PersonRow.parse(rowOf(row)))
    })
    .post('/people/:id/link', allow('admin'), async (req, res) => {
      const admin = signedIn(req)
      const person = await findPerson(db, readId(req, 'person'))
      if (person === undefined) throw notFound('person')
      const link = await db.transaction().execute((tx) => makeLink(tx, person.id, admin.id))
      res.status(201).set('Cache-Control', 'no-store').json(LinkMade.parse(link))
    })
}
