import type { Edition } from '../../rules/edition/open.ts'
import type { Standing } from '../../rules/findings/standing.ts'
import type { SheetEntry } from '../../server/sheets/sheets.contract.ts'
import { Button } from '../ui/button.tsx'
import { entryFrom } from './sent-sheet.ts'
import type { OpenSheet } from './use-sheet.ts'
import type { useOthers } from './use-others.ts'
import { findingLabel, modeLabel } from './words.ts'

const when = (moment: string) =>
  new Intl.DateTimeFormat('en-US', { dateStyle: 'medium', timeStyle: 'medium' }).format(new Date(moment))

/** "57.2 V", "no", "removed". */
function saidBy(edition: Edition, entry: SheetEntry): string {
  const own = entryFrom(entry)
  if (own === undefined) return 'removed'
  if (own.kind === 'observation') {
    const values = edition.observations.get(entry.finding)?.values
    return values?.find((value) => value.id === own.value)?.label ?? own.value
  }
  if (own.unreachable === true) return 'can’t be reached'
  const unit = edition.readings.get(entry.finding)?.unit ?? ''
  const upper = own.upper === undefined || own.upper === '' ? '' : ` to ${own.upper}`
  return own.text === '' ? 'nothing' : `${own.text}${upper} ${unit}`
}

type DisagreeProps = {
  edition: Edition
  one: Standing<SheetEntry>
  onKeep: (entry: SheetEntry) => void
}

/** Two readings of one finding that contradict each other: both, with who and when. */
function Disagree({ edition, one, onKeep }: DisagreeProps) {
  const label = findingLabel(edition, one.finding)
  return (
    <li className="mt-3">
      <b>{label}</b>, {modeLabel(edition, one.mode)}
      <ul>
        {[one.entry, ...one.against].map((entry) => (
          <li key={entry.id} className="flex flex-wrap items-center justify-between gap-x-4 gap-y-1 py-1">
            <span className="min-w-[12rem] flex-1">
              <b>{saidBy(edition, entry)}</b>: {entry.by?.name ?? 'somebody without an account'},{' '}
              {when(entry.deviceAt)}
            </span>
            <Button
              size="small"
              label={`Keep this one: ${saidBy(edition, entry)}, ${label}`}
              onPress={() => onKeep(entry)}
            >
              Keep this one
            </Button>
          </li>
        ))}
      </ul>
    </li>
  )
}

type OthersProps = { sheet: OpenSheet; edition: Edition; others: ReturnType<typeof useOthers> }

/** Whether somebody else writes on the open sheet. Nothing while it is one person's. */
export function OthersLine({ others: { shared, ended } }: Pick<OthersProps, 'others'>) {
  if (!shared && !ended) return null
  return (
    <p className="desk-wide text-small text-ink-2" role="status">
      {ended
        ? 'The link was taken back. This sheet goes on as your own, with all that is on it; the homeowner sees nothing more of it.'
        : 'This sheet came by a link. What either of you enters shows for both within seconds.'}
    </p>
  )
}

/** Readings of the open sheet that contradict each other. What stops stands above them. */
export function Contradictions({ sheet, edition, others: { against } }: OthersProps) {
  const keep = (one: Standing<SheetEntry>) => (entry: SheetEntry) => {
    const ids = [one.entry, ...one.against].map(({ id }) => id)
    const { mode, finding } = one
    // Taken over as if nobody had decided, so that what is kept goes out as this person's own word on all of them.
    sheet.receive([
      { mode, finding, ids, entry: entryFrom(entry), sent: { value: null, kept: 'not decided' } },
    ])
  }
  if (against.length === 0) return null
  return (
    <section className="plate contradict" aria-label="Readings that contradict each other">
      <p role="status">
        <b>Two people entered different readings.</b> The last one is ranked. Take it again, or keep the one
        you trust; until then go by the worse.
      </p>
      <ul>
        {against.map((one) => (
          <Disagree key={`${one.mode} ${one.finding}`} edition={edition} one={one} onKeep={keep(one)} />
        ))}
      </ul>
    </section>
  )
}
