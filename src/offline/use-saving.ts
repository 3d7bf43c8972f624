import { useEffect, useState } from 'react'
import { listUnsent } from './outbox.ts'
import { database } from './database.ts'
import { listSheets, onSheetsChanged } from './sheets.ts'

/** Where what was typed lies, in sheets. */
export type Saving = {
  /** Sheets of which something lies on this device only. */
  here: number
  /** Sheets the server has whole. */
  sent: number
  /** Sheets of which the server refused something, or failed at it ten times. */
  refused: number
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
  const [sheets, letters] = await Promise.all([listSheets(), listUnsent()])
  const going = new Set(await (await database()).getAllKeys('sendings'))
  const waiting = new Set(letters.map((letter) => letter.sheet))
  const here = new Set(sheets.map(({ id }) => id).filter((id) => !going.has(id)))
  for (const id of waiting) here.add(id)
  const refused = letters.filter((one) => one.refused !== undefined || one.failures >= manyFailures)
  return {
    here: here.size,
    sent: sheets.filter(({ id }) => !here.has(id)).length,
    refused: new Set(refused.map((letter) => letter.sheet)).size,
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
