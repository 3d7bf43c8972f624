import { useEffect, useRef, useState } from 'react'
import { standing } from '../../rules/findings/standing.ts'
import type { Standing } from '../../rules/findings/standing.ts'
import type { SheetEntry } from '../../server/sheets/sheets.contract.ts'
import { keyOf } from '../offline/outbox.ts'
import { getSending, listUnsent } from '../offline/unsent.ts'
import type { Sending } from '../offline/unsent.ts'
import { goOnAlone } from '../offline/go-on-alone.ts'
import { onSheetsChanged, sayChanged } from '../offline/sheets.ts'
import { followSheet } from '../sheets/follow.api.ts'
import { openOwn, openShared } from '../sheets/sheets.api.ts'
import { whatStands } from './sent-sheet.ts'
import type { Came } from './sent-sheet.ts'
import type { OpenSheet } from './use-sheet.ts'

const againMs = 300

/** Which of what stands on the server this device has yet to take over. */
async function newTo(sheet: string, entries: readonly SheetEntry[]): Promise<Came[]> {
  const letters = (await listUnsent()).filter((letter) => letter.sheet === sheet)
  const sending = await getSending(sheet)
  if (sending === undefined) return []
  const known = new Set(entries.map((entry) => entry.id))
  const ours = new Set(letters.flatMap((letter) => (letter.what === 'entry' ? [keyOf(letter.entry)] : [])))
  return whatStands(entries).filter((one) => {
    const last = sending.last[keyOf(one)]?.ids ?? []
    // An answer from before our own entry arrived there says nothing about it; nor may it take its place.
    const older = last.some((id) => !known.has(id))
    const same = one.ids.length === last.length && one.ids.every((id) => last.includes(id))
    return !ours.has(keyOf(one)) && !older && !same
  })
}

/** The way a sheet is followed; undefined while the server does not have it. */
const pathOf = (sending: Sending | undefined): string | undefined =>
  sending === undefined || !sending.there
    ? undefined
    : sending.link === undefined
      ? `/sheets/${sending.remote}`
      : `/shared/${sending.link}`

export type Others = {
  /** Findings of which two readings contradict each other. */
  against: readonly Standing<SheetEntry>[]
  /** Somebody else gave the link it came by. */
  shared: boolean
  /** The link it came by was taken back; it goes on as a sheet of one's own. */
  ended: boolean
}

/** Takes over what others write on the open sheet, as they write it. */
export function useOthers({ id, receive }: Pick<OpenSheet, 'id' | 'receive'>): Others {
  const [path, setPath] = useState<string>()
  const [against, setAgainst] = useState<Others['against']>([])
  const [ended, setEnded] = useState(false)
  const take = useRef(receive)
  useEffect(() => {
    take.current = receive
  })
  useEffect(() => {
    let wanted = true
    const read = () =>
      void getSending(id).then(
        (sending) => {
          if (!wanted) return
          setPath(pathOf(sending))
          setEnded(sending?.ended === true)
        },
        () => undefined,
      )
    read()
    const stop = onSheetsChanged(read)
    return () => {
      wanted = false
      stop()
    }
  }, [id])
  useEffect(() => {
    if (path === undefined) return
    let wanted = true
    let timer: ReturnType<typeof setTimeout> | undefined
    const [, , token = ''] = path.split('/')
    const news = async () => {
      const opened = path.startsWith('/shared/') ? await openShared(token) : await openOwn(token)
      if (!wanted) return
      setAgainst(standing(opened.entries).filter((one) => one.against.length > 0))
      const came = await newTo(id, opened.entries)
      if (wanted && !take.current(came)) timer = setTimeout(ask, againMs)
    }
    // Without a network there is no news; the line says when there is again.
    const ask = () => void news().catch(() => undefined)
    const stop = followSheet(path, ask, () => {
      if (!path.startsWith('/shared/')) return
      void goOnAlone(id).then(sayChanged, () => undefined)
    })
    return () => {
      wanted = false
      clearTimeout(timer)
      stop()
    }
  }, [id, path])
  return { against, shared: path?.startsWith('/shared/') === true, ended }
}
