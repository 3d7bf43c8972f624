import { Router } from 'express'
import type { CookieOptions, Request, Response } from 'express'
import type { Db } from '../database.ts'
import { Problem, notFound } from '../problem.ts'
import { readBody } from '../read.ts'
import { allow, beginSession, endSession, lookAfterSession, personOf, signedIn } from '../session.ts'
import { tokenHash } from '../token.ts'
import { changePassword } from './change-password.ts'
import { cookieOf } from './cookie-of.ts'
import { hashPassword } from './passwords.ts'
import { Me } from './me.contract.ts'
import { ChangePassword, LinkOpened, SetPassword, SignIn, SignUp } from './people.contract.ts'
import { addPerson, endSessions, findLink, findPerson, saySessionEnded } from './people.queries.ts'
import type { Known } from './people.queries.ts'
import { setPasswordByLink } from './set-password.ts'
import { whoSignsIn } from './sign-in.ts'
import type { Throttle } from './throttle.ts'

const deviceCookie = 'tracelamp-device'
const yearMs = 365 * 24 * 60 * 60 * 1000

const answer = (res: Response, person: Me['person'] | undefined) =>
  res.set('Cache-Control', 'no-store').json(Me.parse({ person: person ?? null }))

/** Signing in and out, and what a person does with their own account. */
export function accountRoutes(db: Db, throttle: Throttle): Router {
  /** Begins a session, and marks the device as one that this person has used. */
  const comeIn = async (req: Request, res: Response, person: Known | undefined) => {
    if (person === undefined) throw new Problem('unauthorized')
    await beginSession(req, person)
    const options: CookieOptions = {
      httpOnly: true,
      sameSite: 'lax',
      secure: req.secure,
      maxAge: yearMs,
      path: '/api',
    }
    res.cookie(deviceCookie, throttle.markDevice(person.email), options)
    answer(res, person)
  }

  return Router()
    .get('/me', (req, res) => {
      lookAfterSession(req, res)
      answer(res, personOf(req))
    })
    .post('/sign-in', async (req, res) => {
      const { email, password } = readBody(req, SignIn)
      const mark = cookieOf(req, deviceCookie)
      // As read together with the hash: a password changed meanwhile has ended what begins here.
      await comeIn(req, res, await whoSignsIn(db, throttle, { email, password, address: req.ip, mark }))
    })
    .post('/sign-out', async (req, res) => {
      const person = personOf(req)
      await endSession(req, res)
      if (person !== undefined) await saySessionEnded(db, person.id)
      answer(res, null)
    })
    .post('/sign-out-everywhere', allow('person'), async (req, res) => {
      const { id } = signedIn(req)
      await db.transaction().execute((tx) => endSessions(tx, id))
      await endSession(req, res)
      answer(res, null)
    })
    .post('/sign-up', async (req, res) => {
      const { email, name, password } = readBody(req, SignUp)
      await throttle.signUp(req.ip)
      const hash = await hashPassword(password)
      const id = await addPerson(db, { email, name, role: 'helper', password_hash: hash, made_by: null })
      if (id === undefined)
        throw new Problem('conflict', 'There is an account already.', {
          email: 'This e-mail address has an account. Sign in, or ask the shop for a new link.',
        })
      await comeIn(req, res, await findPerson(db, id))
    })
    .post('/account/password', allow('person'), async (req, res) => {
      const { id } = signedIn(req)
      await changePassword(db, throttle, id, readBody(req, ChangePassword))
      await comeIn(req, res, await findPerson(db, id))
    })
    .get('/links/:token', async (req, res) => {
      const link = await findLink(db, tokenHash(req.params.token))
      if (link === undefined) throw notFound('link any more')
      const { name, email, expires_at } = link
      res.set('Cache-Control', 'no-store')
      res.json(LinkOpened.parse({ name, email, expiresAt: expires_at.toISOString() }))
    })
    .post('/links/:token', async (req, res) => {
      const { password } = readBody(req, SetPassword)
      const id = await setPasswordByLink(db, tokenHash(req.params.token), password)
      if (id === undefined) throw notFound('link any more')
      await comeIn(req, res, await findPerson(db, id))
    })
}
