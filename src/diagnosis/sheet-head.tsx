import { Link } from 'react-router-dom'
import type { EditionInForce } from '../../server/editions/editions.contract.ts'
import { ohmsInWords } from '../../rules/triangle/weight.ts'
import { useEdition } from '../editions/edition.api.ts'
import { Stamp } from '../ui/stamp.tsx'
import { useDesk } from './desk.ts'
import { ChangeContext } from './change-context.tsx'
import { KeysList } from './keys-list.tsx'
import { capital } from './words.ts'

export type HeadOpen = 'context' | 'keys' | undefined
type SheetHeadProps = {
  info: EditionInForce
  open: HeadOpen
  onOpen: (open: HeadOpen) => void
  letters: boolean
  onLetters: (on: boolean) => void
}

/** Title of the sheet, what feeds it, and the edition it stays on. */
export function SheetHead({ info, open, onOpen, letters, onLetters }: SheetHeadProps) {
  const { edition, typed, meterOhms } = useDesk()
  const { source, system, wiring } = typed.context
  const kind = edition.sources.get(source)?.kind ?? source
  const how = wiring === 'direct' ? 'loads plugged straight in' : 'through a panel'
  const since = new Intl.DateTimeFormat('en-US', { day: 'numeric', month: 'short' }).format(
    new Date(info.inForceSince),
  )
  const { info: used } = useEdition()
  const line =
    used === undefined || used.hash === info.hash
      ? `in force since ${since}`
      : `an earlier edition, put in force ${since}`
  const turn = (what: HeadOpen) => onOpen(open === what ? undefined : what)
  return (
    <header className="desk-head">
      <div className="min-w-0">
        <p className="text-small">
          <Link className="link-alone" to="/diagnosis">
            All sheets on this device
          </Link>
        </p>
        <h1>{typed.title}</h1>
        <p className="flex flex-wrap items-center gap-x-2 text-small text-ink-2">
          {capital(kind)}, {system} V, {how}; meter {ohmsInWords(meterOhms)}.
          <button
            type="button"
            className="link-alone text-glow underline"
            aria-expanded={open === 'context'}
            onClick={() => turn('context')}
          >
            Change
          </button>
          <button
            type="button"
            className="link-alone desk-keys text-glow underline"
            aria-expanded={open === 'keys'}
            onClick={() => turn('keys')}
          >
            Keys
          </button>
        </p>
      </div>
      <Stamp hash={info.hash} number={info.number} line={line} />
      {open === 'context' && (
        <div className="desk-wide">
          <ChangeContext onClose={() => onOpen(undefined)} />
        </div>
      )}
      {open === 'keys' && (
        <div className="desk-wide">
          <KeysList letters={letters} onLetters={onLetters} />
        </div>
      )}
    </header>
  )
}
