import { useEffect, useRef } from 'react'
import { seat } from '../../rules/triangle/seat.ts'
import { sideOrder } from '../../rules/triangle/sides.ts'
import type { Readings, Side } from '../../rules/triangle/sides.ts'
import { verdictOf } from '../../rules/triangle/verdict.ts'
import { meterWeight, ohmsInWords } from '../../rules/triangle/weight.ts'
import { WhereGroundSits } from '../ui/where-ground-sits/where-ground-sits.tsx'
import { useDesk } from './desk.ts'
import { EntryField } from './entry-field.tsx'
import type { Seats } from './places.ts'
import { numberIn } from './raw-sheet.ts'
import { readingOf } from './sheet-content.ts'
import type { ReadingEntry } from './sheet-content.ts'
import { useSettled } from './use-settled.ts'

/** Volts of an entry: of an unsteady one the middle; nothing while it is no number. */
function voltsOf(entry: ReadingEntry | undefined): number | undefined {
  if (entry === undefined || entry.unreachable === true) return undefined
  const value = numberIn(entry.text)
  const other = numberIn(entry.upper ?? '')
  return value !== undefined && other !== undefined ? (value + other) / 2 : value
}

type Drawn = {
  readings: Readings
  ohms: number
  behind: { ng: number; hg: number; label: string } | undefined
}

function drawnOf(
  seats: Seats,
  entry: (id: string) => ReadingEntry | undefined,
  nominal: number,
  sheetOhms: number,
): Drawn {
  const entries = { hn: entry(seats.hn.id), ng: entry(seats.ng.id), hg: entry(seats.hg.id) }
  const [ng, hg] = [entries.ng?.earlier, entries.hg?.earlier]
  const [ngBefore, hgBefore] = [numberIn(ng?.text ?? ''), numberIn(hg?.text ?? '')]
  return {
    readings: { hn: voltsOf(entries.hn), ng: voltsOf(entries.ng), hg: voltsOf(entries.hg), nominal },
    // Nothing is firmer than what the lightest of the meters says.
    ohms: Math.max(entries.ng?.meterOhms ?? sheetOhms, entries.hg?.meterOhms ?? sheetOhms),
    behind:
      ng !== undefined && ngBefore !== undefined && hgBefore !== undefined
        ? { ng: ngBefore, hg: hgBefore, label: ohmsInWords(ng.meterOhms) }
        : undefined,
  }
}

/** One short buzz for landed, two for a gap, where the device can. */
function useBuzz(kind: string, wanted: boolean): void {
  const last = useRef(kind)
  useEffect(() => {
    if (last.current === kind) return
    last.current = kind
    if (!wanted || !('vibrate' in navigator)) return
    if (kind === 'closed') navigator.vibrate(30)
    if (kind === 'gap') navigator.vibrate([30, 70, 30])
  }, [kind, wanted])
}

/** Where ground sits at one place: three fields that keep their seats, the drawing between them, and what it says. */
export function SeatsOfGround({ seats }: { seats: Seats }) {
  const desk = useDesk()
  const { stored, chosen, typing } = desk
  const entry = (id: string) => readingOf(stored, stored.mode, id)
  const now = `${stored.mode} ${seats.hn.id} ${chosen?.id ?? ''} ${typing}`
  const { readings, ohms, behind } = useSettled(drawnOf(seats, entry, desk.nominal, desk.meterOhms), now)
  const weight = meterWeight(ohms)
  const where = seat(readings)
  const verdict = verdictOf(where, readings, weight)
  const side: Side | undefined = typing ? sideOrder.find((one) => seats[one].id === chosen?.id) : undefined
  useBuzz(where.kind, desk.ownPad)
  return (
    <>
      <div className="seats">
        <EntryField reading={seats.hn} seat className="seat-hn" />
        <div className="seat-picture">
          <WhereGroundSits
            readings={readings}
            weight={{ ...weight, label: `meter, ${weight.label}` }}
            behind={behind}
            chosen={side}
            onSide={(tapped) => desk.go([seats[tapped].id])}
          />
        </div>
        <EntryField reading={seats.ng} seat />
        <EntryField reading={seats.hg} seat />
      </div>
      <p className="verdict" aria-live="polite">
        <b>{verdict.lead}</b> {verdict.say} {verdict.open}
      </p>
    </>
  )
}
