import { Me } from '../../server/people/me.contract.ts'
import { SheetNamed, Taken } from '../../server/sheets/sheets.contract.ts'
import { ApiProblem, get, send } from '../api.ts'
import type { Along } from '../api.ts'
import type { Answer, Post } from '../offline/flush.ts'
import type { Sending, Unsent } from '../offline/unsent.ts'

/** With the key of this device; without the session of somebody else who is signed in. */
export const along = ({ key }: Pick<Sending, 'key'>, by: string | null): Along => ({
  headers: { 'Sheet-Key': key },
  credentials: by === null ? 'omit' : 'same-origin',
})

/** Worth sending again later, without anybody's doing. */
const passes = new Set([401, 408, 425, 429])

function answerOf(problem: unknown, { link }: Sending): Answer {
  if (!(problem instanceof ApiProblem)) return { kind: 'silence' }
  if (problem.status === 404 && link !== undefined) return { kind: 'gone' }
  if (problem.status >= 500) return { kind: 'failed' }
  if (problem.status < 400 || passes.has(problem.status)) return { kind: 'wait' }
  const [field] = Object.entries(problem.errors)
  return {
    kind: 'refused',
    reason: field === undefined ? problem.title : `${problem.title} ${field[0]}: ${field[1]}`,
  }
}

async function sendLetters(sending: Sending, letters: readonly Unsent[]): Promise<Answer> {
  const [first] = letters
  if (first === undefined) return { kind: 'taken', ids: [] }
  const how = along(sending, first.by)
  if (first.what === 'head') {
    const { id } = await send('PUT', `/sheets/${sending.remote}`, first.head, SheetNamed, how)
    return { kind: 'taken', ids: [id] }
  }
  const entries = letters.flatMap((letter) => (letter.what === 'entry' ? [letter.entry] : []))
  const path = sending.link === undefined ? `/sheets/${sending.remote}` : `/shared/${sending.link}`
  const { ids } = await send('POST', `${path}/entries`, { entries }, Taken, how)
  return { kind: 'taken', ids }
}

/** The outbox's way to the server. */
export const post: Post = {
  who: async () => {
    try {
      return (await get('/me', Me)).person?.id ?? null
    } catch {
      return undefined
    }
  },
  send: (sending, letters) =>
    sendLetters(sending, letters).catch((problem: unknown) => answerOf(problem, sending)),
}
