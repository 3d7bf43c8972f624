import type { ErrorRequestHandler, RequestHandler } from 'express'
import { isDatabaseDown } from './database.ts'
import type { Log } from './log.ts'

const words = {
  'bad-request': [400, 'The request could not be read.'],
  unauthorized: [401, 'Sign in first.'],
  forbidden: [403, 'Your account may not do this.'],
  'not-found': [404, 'There is nothing at this address.'],
  conflict: [409, 'Something else was changed meanwhile.'],
  'too-large': [413, 'The request is too large.'],
  'not-json': [415, 'The request must be JSON.'],
  'too-many': [429, 'Too many tries. Wait, then try again.'],
  unavailable: [503, 'The server is not ready. Try again in a moment.'],
  internal: [500, 'The server failed. It was not your doing.'],
} as const

export type ProblemType = keyof typeof words

/** An answer other than success, thrown anywhere and written in one place. */
export class Problem extends Error {
  override name = 'Problem'
  readonly type: ProblemType
  readonly status: number
  /** Field path → sentence. */
  readonly errors: Readonly<Record<string, string>> | undefined
  /** Seconds after which it is worth trying again. */
  readonly retryAfter: number | undefined
  /** What the page needs to go on, written beside the title. */
  readonly also: Readonly<Record<string, unknown>> | undefined
  constructor(
    type: ProblemType,
    title: string = words[type][1],
    errors?: Record<string, string>,
    retryAfter: number | undefined = type === 'unavailable' ? 2 : undefined,
    also?: Record<string, unknown>,
  ) {
    super(title)
    this.type = type
    this.status = words[type][0]
    this.errors = errors
    this.retryAfter = retryAfter
    this.also = also
  }
}

/** "There is no such article." and its like. */
export const notFound = (what: string) => new Problem('not-found', `There is no such ${what}.`)

/** Unknown errors keep their words to themselves: they may hold data. */
function asProblem(error: unknown): Problem {
  if (error instanceof Problem) return error
  if (isDatabaseDown(error)) return new Problem('unavailable')
  const status = error instanceof Error ? (error as { status?: unknown }).status : undefined
  if (status === 413) return new Problem('too-large')
  if (typeof status === 'number' && status >= 400 && status < 500) return new Problem('bad-request')
  return new Problem('internal')
}

/** Every address under /api that no route took. */
export const noSuchRoute: RequestHandler = () => {
  throw new Problem('not-found')
}

/** Writes what was thrown as application/problem+json (RFC 9457). Only our own faults reach the log. */
export const problems =
  (log: Log): ErrorRequestHandler =>
  (error: unknown, _req, res, next) => {
    if (res.headersSent) return next(error)
    const { type, status, message: title, errors, retryAfter, also } = asProblem(error)
    if (type === 'internal') log.error({ err: error }, 'a request failed')
    if (retryAfter !== undefined) res.set('Retry-After', String(retryAfter))
    res
      .status(status)
      .set('Cache-Control', 'no-store')
      .type('application/problem+json')
      .send(JSON.stringify({ ...also, type: `/problems/${type}`, title, status, ...(errors && { errors }) }))
  }
