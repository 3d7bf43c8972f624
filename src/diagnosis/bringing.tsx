import { useEffect, useRef } from 'react'
import { useNavigate } from 'react-router-dom'
import { NoNetwork } from '../api.ts'
import { useEdition } from '../editions/edition.api.ts'
import { openOwn } from '../sheets/sheets.api.ts'
import { Waiting } from '../ui/waiting.tsx'
import { bringSheet } from './bring-sheet.ts'

type BringingProps = {
  id: string
  title: string
  /** Hash of the edition it was begun with. */
  edition: string
  onFailed: (why: string) => void
}

/** Brings one of one's own sheets, and the edition it was begun with, to this device, and opens it. */
export function Bringing({ id, title, edition: hash, onFailed }: BringingProps) {
  const { edition, status, error } = useEdition(hash)
  const navigate = useNavigate()
  const failed = useRef(onFailed)
  useEffect(() => {
    failed.current = onFailed
  })
  useEffect(() => {
    if (status === 'error')
      failed.current(`The edition “${title}” was begun with did not come. ${error?.message ?? ''}`)
  }, [status, error, title])
  useEffect(() => {
    if (edition === undefined) return
    let wanted = true
    const bring = async () => {
      const opened = await openOwn(id)
      // Left meanwhile: then nothing is laid on this device either.
      return wanted ? bringSheet(edition, opened, undefined) : undefined
    }
    bring().then(
      (here) => void (here !== undefined && wanted && navigate(`/diagnosis?sheet=${here}`)),
      (problem: unknown) => {
        if (wanted)
          failed.current(problem instanceof NoNetwork ? 'No network.' : `“${title}” can’t be opened now.`)
      },
    )
    return () => {
      wanted = false
    }
  }, [edition, id, navigate, title])
  return <Waiting what="the sheet" />
}
