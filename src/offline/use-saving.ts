import { useEffect, useState } from 'react'
import { keptPerson } from './person.ts'
import { onSheetsChanged } from './sheets.ts'
import { listSheets } from './sheets-here.ts'
import { listSendings, listUnsent } from './unsent.ts'
import { idOf } from './whose.ts'

/** Where what was typed lies, in sheets. */
export type Saving = {
  /** Sheets of which something lies on this device only. */
  here: number
  /** Sheets the server has whole. */
  sent: number
  /** Sheets of which the server refused something, or failed at it ten times. */
  refused: number
  /** Sheets of which something waits to be sent. */
  waiting: number
  /** What waits to be sent, entry by entry. */
  entries: number
  sending: boolean
}

const manyFailures = 10

let busy = false
const listeners = new Set<() => void>()
/** Says whether something is on its way to the server. */
export function saySending(now: boolean): void {
  busy = now
  for (const listener of listeners) listener()
}

async function look(): Promise<Saving> {
  const [sheets, all, sendings] = await Promise.all([listSheets(), listUnsent(), listSendings()])
  const seen = new Set(sheets.map(({ id }) => id))
  // What somebody else has yet to send is theirs to know.
  const who = idOf(await keptPerson())
  const letters = all.filter(({ by }) => by === null || by === who)
  const going = new Set(sendings.map(({ sheet }) => sheet))
  const waiting = new Set(letters.map((letter) => letter.sheet))
  const here = new Set([...waiting, ...[...seen].filter((id) => !going.has(id))])
  const refused = letters.filter((one) => one.refused !== undefined || one.failures >= manyFailures)
  return {
    here: here.size,
    sent: sheets.filter(({ id }) => !here.has(id)).length,
    refused: new Set(refused.map((letter) => letter.sheet)).size,
    waiting: waiting.size,
    entries: letters.length,
    sending: busy && waiting.size > 0,
  }
}

/** Where what was typed lies; undefined until it was looked at, or where the device keeps nothing. */
export function useSaving(): Saving | undefined {
  const [saving, setSaving] = useState<Saving>()
  useEffect(() => {
    let wanted = true
    let last = 0
    const read = () => {
      const mine = ++last
      void look().then(
        (found) => wanted && mine === last && setSaving(found),
        () => wanted && setSaving(undefined),
      )
    }
    read()
    const stop = onSheetsChanged(read)
    listeners.add(read)
    return () => {
      wanted = false
      stop()
      listeners.delete(read)
    }
  }, [])
  return saving
}
