import { goOnAlone } from './go-on-alone.ts'
import { alterSending, alterUnsent, getSending, listUnsent } from './unsent.ts'
import type { Sending, Unsent } from './unsent.ts'

/** What came of one sending: the ids the server named, its refusal, its failure, or nobody who answered. */
export type Answer =
  | { kind: 'taken'; ids: readonly string[] }
  | { kind: 'refused'; reason: string }
  /** The link by which the sheet came was taken back. */
  | { kind: 'gone' }
  | { kind: 'failed' }
  | { kind: 'wait' }
  | { kind: 'silence' }

/** The way to the server. */
export type Post = {
  /** Who the server says is signed in: null for nobody, undefined when it does not answer. */
  who: () => Promise<string | null | undefined>
  send: (sending: Sending, letters: readonly Unsent[]) => Promise<Answer>
}

const most = 50

const idOf = (letter: Unsent, sending: Sending) =>
  letter.what === 'entry' ? letter.entry.id : sending.remote

/** The next letters that go out together: one head, or entries of one writer. */
function nextOf(letters: readonly Unsent[], atOnce: number): Unsent[] {
  const [first] = letters
  if (first === undefined || first.what === 'head') return letters.slice(0, 1)
  const end = letters.findIndex((letter) => letter.what === 'head' || letter.by !== first.by)
  return letters.slice(0, Math.min(atOnce, end < 0 ? letters.length : end))
}

/** Sends one sheet's letters in order. Says whether it is worth going on with other sheets. */
async function flushSheet(sheet: string, post: Post, who: string | null): Promise<boolean> {
  let atOnce = most
  for (;;) {
    const sending = await getSending(sheet)
    const letters = (await listUnsent()).filter((letter) => letter.sheet === sheet)
    const batch = nextOf(letters, atOnce)
    const [first] = batch
    if (sending === undefined || first === undefined) return true
    // What was refused holds back the rest of its sheet; what somebody else wrote waits for them.
    if (first.refused !== undefined || (first.by !== null && first.by !== who)) return true
    const ns = batch.flatMap(({ n }) => n ?? [])
    await alterUnsent(ns, (letter) => ({ ...letter, tried: true }))
    const answer = await post.send(sending, batch)
    switch (answer.kind) {
      case 'taken': {
        const named = batch.filter((letter) => answer.ids.includes(idOf(letter, sending)))
        await alterUnsent(
          named.flatMap(({ n }) => n ?? []),
          () => undefined,
        )
        if (first.what === 'head' && named.length > 0) await alterSending(sheet, { there: true })
        // An answer that names nothing of it came from somewhere else.
        if (named.length < batch.length) return false
        break
      }
      case 'refused':
        // One of them is at fault: which one shows when each goes alone.
        if (batch.length > 1) {
          atOnce = 1
          break
        }
        await alterUnsent(ns.slice(0, 1), (letter) => ({ ...letter, refused: answer.reason }))
        return true
      case 'gone':
        await goOnAlone(sheet)
        break
      case 'failed':
        await alterUnsent(ns, (letter) => ({ ...letter, failures: letter.failures + 1 }))
        return true
      case 'wait':
        return true
      case 'silence':
        return false
    }
  }
}

const alone = async (work: () => Promise<void>): Promise<void> => {
  // Two tabs share the outbox. On plain HTTP there are no locks; the server takes what comes twice once.
  if (navigator.locks === undefined) return work()
  await navigator.locks.request('tracelamp-outbox', work)
}

/** Sends what waits. A letter leaves only when the server has named its id. */
export function flush(post: Post): Promise<void> {
  return alone(async () => {
    const sheets = new Set((await listUnsent()).map((letter) => letter.sheet))
    if (sheets.size === 0) return
    const who = await post.who()
    if (who === undefined) return
    for (const sheet of sheets) if (!(await flushSheet(sheet, post, who))) return
  })
}
