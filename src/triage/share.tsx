import { useEffect, useState } from 'react'
import type { Edition } from '../../rules/edition/open.ts'
import { ApiProblem } from '../api.ts'
import { getSending } from '../offline/unsent.ts'
import { onSheetsChanged } from '../offline/sheets.ts'
import { useMe } from '../people/people.api.ts'
import { makeSheetLink, takeBackSheetLink } from '../sheets/sheets.api.ts'
import { Button } from '../ui/button.tsx'
import { Failed } from '../ui/failed.tsx'
import { Rail } from '../ui/rail.tsx'
import { TheirFindings } from './their-findings.tsx'
import { useTriage } from './triage-store.tsx'

/** The link made for this check; null when none holds, undefined until that was read. */
function useGiven(sheet: string | undefined): string | null | undefined {
  const [given, setGiven] = useState<string | null>()
  useEffect(() => {
    if (sheet === undefined) return setGiven(undefined)
    let wanted = true
    const read = () =>
      void getSending(sheet).then(
        (sending) => wanted && setGiven(sending?.given ?? null),
        () => undefined,
      )
    read()
    const stop = onSheetsChanged(read)
    return () => {
      wanted = false
      stop()
    }
  }, [sheet])
  return given
}

export type ShareProps = {
  edition: Edition | undefined
  /** Told what stops, by what stands on the sheet with the professional's findings. */
  onStops: (stops: readonly string[]) => void
}

/** A private link with which a professional opens these answers, and the way to take it back. */
export function Share({ edition, onStops }: ShareProps) {
  const { sheetId } = useTriage()
  const sheet = sheetId()
  const { person } = useMe()
  const given = useGiven(sheet)
  const [busy, setBusy] = useState(false)
  const [failed, setFailed] = useState<string>()
  const [copied, setCopied] = useState<boolean>()
  useEffect(() => {
    if (given === null) onStops([])
  }, [given, onStops])
  if (sheet === undefined || given === undefined) return null
  const run = async (work: () => Promise<unknown>) => {
    if (busy) return
    setBusy(true)
    setFailed(undefined)
    await work().catch((problem: unknown) =>
      setFailed(
        problem instanceof ApiProblem
          ? problem.title
          : 'There is no network, or the server does not answer. Your answers are still on this device.',
      ),
    )
    setBusy(false)
  }
  const address = `${window.location.origin}/sheets/${given ?? ''}`
  const copy = async () =>
    setCopied(
      await Promise.resolve(navigator.clipboard?.writeText(address)).then(
        () => navigator.clipboard !== undefined,
        () => false,
      ),
    )
  return (
    <Rail title="For your professional" className="screen-only">
      {given === null ? (
        <>
          <p className="mb-3 mt-2">
            A private link shows them your answers, and shows you what they find. Making it sends your answers
            to our server. You can take it back.
          </p>
          <Button onPress={() => void run(() => makeSheetLink(sheet, person?.id ?? null))}>
            {busy ? 'Making it …' : 'Make a link for your professional'}
          </Button>
        </>
      ) : (
        <>
          <p className="mb-2 mt-2">
            Send this link to your professional and nobody else. Whoever has it can read your answers. You can
            take it back; what they saw or entered until then stays with them.
          </p>
          <code className="block break-all">{address}</code>
          <div className="mt-3 flex flex-wrap items-center gap-3">
            <Button onPress={() => void copy()}>Copy</Button>
            <Button look="plain" onPress={() => void run(() => takeBackSheetLink(sheet, person?.id ?? null))}>
              {busy ? 'Taking it back …' : 'Take the link back'}
            </Button>
            {copied !== undefined && (
              <span className="text-small" role="status">
                {copied ? 'Copied.' : 'Couldn’t copy. Select it and copy it yourself.'}
              </span>
            )}
          </div>
          {edition !== undefined && (
            <TheirFindings given={given} edition={edition} me={person?.id} onStops={onStops} />
          )}
        </>
      )}
      {failed !== undefined && <Failed title="That did not work.">{failed}</Failed>}
    </Rail>
  )
}
