import { useEffect, useState } from 'react'
import { Link } from 'react-router-dom'
import { newId } from '../offline/new-id.ts'
import { onSheetsChanged, removeSheet, saveSheet } from '../offline/sheets.ts'
import { listSheets } from '../offline/sheets-here.ts'
import type { SheetDoc } from '../offline/sheets.ts'
import { Button } from '../ui/button.tsx'
import { Empty } from '../ui/empty.tsx'
import { Failed } from '../ui/failed.tsx'
import { useToast } from '../ui/toast.tsx'
import { Waiting } from '../ui/waiting.tsx'
import { GroundGlyph } from '../ui/where-ground-sits/ground-glyph.tsx'
import { HowLongKept } from './how-long-kept.tsx'
import { numberIn } from './raw-sheet.ts'
import { sentSheet } from './sent-sheet.ts'
import { isTaken, readingOf, SheetContent } from './sheet-content.ts'

type Listed = { sheets: readonly SheetDoc[] } | 'pending' | 'failed'

function useSheets(): [Listed, () => void] {
  const [listed, setListed] = useState<Listed>('pending')
  const [asked, setAsked] = useState(0)
  useEffect(() => {
    let wanted = true
    const read = () =>
      void listSheets('diagnosis').then(
        (sheets) => wanted && setListed({ sheets }),
        () => wanted && setListed('failed'),
      )
    read()
    const stop = onSheetsChanged(read)
    return () => {
      wanted = false
      stop()
    }
  }, [asked])
  return [listed, () => setAsked(asked + 1)]
}

const changed = (at: string) =>
  new Intl.DateTimeFormat('en-US', { dateStyle: 'medium', timeStyle: 'short' }).format(new Date(at))

/** The triangle of the receptacle in the mode in view, for the list. */
function Glyph({ content }: { content: SheetContent }) {
  const volts = (pair: string) =>
    numberIn(readingOf(content, content.mode, `receptacle.${pair}.volts`)?.text ?? '')
  const nominal = content.context.system === '230' ? 230 : 120
  return <GroundGlyph readings={{ hn: volts('hn'), ng: volts('ng'), hg: volts('hg'), nominal }} />
}

function Row({ doc }: { doc: SheetDoc }) {
  const say = useToast()
  const read = SheetContent.safeParse(doc.content)
  const copy = async () => {
    const changedAt = new Date().toISOString()
    const title = `${doc.title}, copy`
    const content = read.success ? { ...read.data, title, past: [] } : doc.content
    const { sends: _, ...rest } = doc
    const sends = read.success && { sends: sentSheet({ ...read.data, title }) }
    await saveSheet({ ...rest, id: newId(), title, changedAt, content, ...sends })
  }
  const remove = async () => {
    await removeSheet(doc.id)
    say({ text: 'Sheet removed', action: { word: 'Undo', onPress: () => void saveSheet(doc) } })
  }
  const taken = read.success
    ? Object.values(read.data.entries).flatMap((here) => Object.values(here).filter(isTaken)).length
    : 0
  return (
    <li className="sheet-row">
      {read.success && <Glyph content={read.data} />}
      <div className="min-w-0 flex-1">
        <Link className="link-alone text-body" to={`/diagnosis?sheet=${doc.id}`}>
          {doc.title}
        </Link>
        <p className="text-note text-ink-2">
          {read.success
            ? `${taken === 1 ? '1 finding' : `${taken} findings`}, `
            : 'Can’t be read by this version, '}
          changed {changed(doc.changedAt)}
        </p>
      </div>
      <Button size="small" look="plain" label={`Copy ${doc.title}`} onPress={() => void copy()}>
        Copy
      </Button>
      <Button size="small" look="plain" label={`Remove ${doc.title}`} onPress={() => void remove()}>
        Remove
      </Button>
    </li>
  )
}

/** The findings sheets on this device, the last changed first. */
export function SheetsList({ onNew }: { onNew: () => void }) {
  const [listed, again] = useSheets()
  if (listed === 'pending') return <Waiting what="the sheets on this device" />
  if (listed === 'failed')
    return (
      <Failed title="Couldn’t read this device." onRetry={again}>
        The window may be private, or its storage is shut.
      </Failed>
    )
  if (listed.sheets.length === 0)
    return (
      <Empty title="No findings sheets on this device yet.">
        <button type="button" className="link-alone text-glow underline" onClick={onNew}>
          Begin the first
        </button>
      </Empty>
    )
  return (
    <>
      <ul aria-label="Sheets on this device">
        {listed.sheets.map((doc) => (
          <Row key={doc.id} doc={doc} />
        ))}
      </ul>
      <HowLongKept />
    </>
  )
}
