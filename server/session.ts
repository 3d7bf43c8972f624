import pgStore from 'connect-pg-simple'
import type { Request, RequestHandler, Response } from 'express'
import session from 'express-session'
import type { SessionData } from 'express-session'
import { poolOf } from './database.ts'
import type { Db } from './database.ts'
import type { Log } from './log.ts'
import { Problem } from './problem.ts'
import { cookieOf } from './people/cookie-of.ts'
import { findPerson } from './people/people.queries.ts'
import type { Known } from './people/people.queries.ts'
import { isQualified, reaches } from './people/roles.contract.ts'
import type { Role } from './people/roles.contract.ts'

declare module 'express-session' {
  interface SessionData {
    person: string
    /** The person's `session_epoch` when it was begun. */
    epoch: number
    /** The day it was last prolonged, UTC. */
    day: string
  }
}

const cookieName = 'tracelamp'
/** So that a tech is not signed out in the middle of a week. */
const monthMs = 30 * 24 * 60 * 60 * 1000
const today = () => new Date().toISOString().slice(0, 10)

const people = new WeakMap<Request, Known>()

/** Who is signed in. */
export const personOf = (req: Request): Known | undefined => people.get(req)

/** Whether the asker may read what is for qualified people. */
export const mayReadQualified = (req: Request): boolean => isQualified(personOf(req)?.role)

/**
 * Lets pass who is signed in with this role, or one above it. `person`: whoever is signed in.
 * @throws Problem 401 when nobody is, 403 when the role does not reach
 */
export const allow =
  (least: Role | 'person'): RequestHandler =>
  (req, _res, next) => {
    const person = personOf(req)
    if (person === undefined) throw new Problem('unauthorized')
    if (least !== 'person' && !reaches(person.role, least)) throw new Problem('forbidden')
    next()
  }

/** Who is signed in, behind `allow`. */
export function signedIn(req: Request): Known {
  const person = personOf(req)
  if (person === undefined) throw new Problem('unauthorized')
  return person
}

type Parts = { db: Db; log: Log; secret: string }

/** Sessions in PostgreSQL. `close` ends what clears away the old ones. */
export function sessions({ db, log, secret }: Parts): { handlers: RequestHandler[]; close: () => void } {
  const Store = pgStore(session)
  const store = new Store({
    // It asks of its pool for `query` alone.
    pool: poolOf(db) as never,
    createTableIfMissing: false,
    // A touch would be a write for every request; ours is one a day.
    disableTouch: true,
    errorLog: (message: unknown, error?: unknown) => log.warn({ err: error }, String(message)),
  })
  const read = session({
    name: cookieName,
    secret,
    store,
    resave: false,
    saveUninitialized: false,
    cookie: { httpOnly: true, sameSite: 'lax', secure: 'auto', maxAge: monthMs, path: '/' },
  })
  return { handlers: [read, identify(db)], close: () => void store.close() }
}

/** Finds out who asks, anew at each request: a changed role counts at once, and an ended session is none. */
const identify =
  (db: Db): RequestHandler =>
  async (req, res, next) => {
    // What is answered depends on who asks; what does not says so itself.
    res.set('Cache-Control', 'private, no-cache').vary('Cookie')
    const { person: id, epoch } = req.session
    if (id === undefined) return next()
    const person = await findPerson(db, id)
    if (person === undefined || person.epoch !== epoch) {
      // Another one takes its place, unsaved, so that whoever signs in next finds one.
      await done((end) => req.session.regenerate(end))
      return next()
    }
    people.set(req, person)
    next()
  }

/**
 * Prolongs the session once a day, and has the cookie of an ended one forgotten. Only where the page asks who is
 * signed in: a cookie has no place in an answer that others may be handed from a cache.
 */
export function lookAfterSession(req: Request, res: Response): void {
  if (personOf(req) === undefined) {
    // Nobody's cookie is left alone: this answer may be overtaken by a sign-in, and would take the new one away.
    if (cookieOf(req, cookieName) !== undefined) res.clearCookie(cookieName)
  } else if (req.session.day !== today()) req.session.day = today()
}

const done = (run: (end: (problem?: unknown) => void) => void) =>
  new Promise<void>((resolve, reject) =>
    run((problem) =>
      problem ? reject(problem instanceof Error ? problem : new Error('session')) : resolve(),
    ),
  )

/**
 * The way to ask again whether who asked is still signed in, for what stays open longer than a request. Always so for
 * whoever was not.
 */
export function stillSignedIn(db: Db, req: Request): () => Promise<boolean> {
  const person = personOf(req)
  const { sessionStore, sessionID } = req
  return async () => {
    if (person === undefined) return true
    const session = await new Promise<SessionData | null | undefined>((resolve, reject) =>
      sessionStore.get(sessionID, (problem: unknown, found) =>
        problem ? reject(problem instanceof Error ? problem : new Error('session')) : resolve(found),
      ),
    )
    return session?.person === person.id && (await findPerson(db, person.id))?.epoch === person.epoch
  }
}

/** Begins a session under a new id: one that somebody else has planted beforehand is worth nothing. */
export async function beginSession(req: Request, person: Known): Promise<void> {
  await done((end) => req.session.regenerate(end))
  Object.assign(req.session, { person: person.id, epoch: person.epoch, day: today() })
  await done((end) => req.session.save(end))
  people.set(req, person)
}

/** Ends this session, and has its cookie forgotten. */
export async function endSession(req: Request, res: Response): Promise<void> {
  people.delete(req)
  await done((end) => req.session.destroy(end))
  res.clearCookie(cookieName)
}
