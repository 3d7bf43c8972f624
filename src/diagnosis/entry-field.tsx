import type { KeyboardEvent, MouseEvent } from 'react'
import type { Reading } from '../../rules/edition/schema.ts'
import { ohmsInWords } from '../../rules/triangle/weight.ts'
import { isPair, pairWords } from '../ui/pair-discs.tsx'
import { ReadingField } from '../ui/reading-field.tsx'
import { useToast } from '../ui/toast.tsx'
import { useDesk } from './desk.ts'
import { ExpectedBand } from './expected-band.tsx'
import { meantBy } from './meant.ts'
import { errorAt } from './raw-sheet.ts'
import { readingOf } from './sheet-content.ts'
import type { ReadingEntry } from './sheet-content.ts'
import { capital } from './words.ts'

/** The line beneath the number: instrument and condition it was taken under. */
function conditionOf(reading: Reading, entry: ReadingEntry | undefined): string {
  if (entry?.unreachable === true) return 'can’t be reached'
  const taken = entry !== undefined && entry.text !== ''
  const unloaded = reading.unit === 'V' && reading.pair !== undefined && !reading.id.includes('bulb.')
  const condition =
    reading.dead === true
      ? taken
        ? 'proved dead'
        : 'proved dead first'
      : !taken
        ? ''
        : reading.loaded === true
          ? 'load on'
          : unloaded
            ? 'no load'
            : ''
  const parts = [
    entry?.upper === undefined ? '' : 'wanders',
    condition,
    entry?.meterOhms === undefined ? '' : `${ohmsInWords(entry.meterOhms)} meter`,
    entry?.note ?? '',
  ].filter((part) => part !== '')
  return parts.join(' · ')
}

type EntryFieldProps = {
  reading: Reading
  /** A side of the triangle: named by its pair alone, in a seat that never moves. */
  seat?: boolean
  className?: string
}

/** One reading of the mode in view, as it is typed. */
export function EntryField({ reading, seat = false, className = '' }: EntryFieldProps) {
  const desk = useDesk()
  const say = useToast()
  const { typed, dispatch, chosen } = desk
  const { id, pair } = reading
  const { mode } = typed
  const entry = readingOf(typed, mode, id)
  const name = seat && isPair(pair) ? pairWords(pair) : reading.label
  const sentence = errorAt(desk.errors, typed, mode, id)
  // Said here too: the plate that says why may lie out of sight.
  const unkept = desk.unkept && chosen?.id === id ? 'Not kept on this device yet.' : undefined
  const meant = meantBy(entry?.text ?? '', reading, desk.nominal)
  const type = (text: string, which: 'lower' | 'upper' = 'lower') =>
    dispatch({ do: 'type', mode, id, text, which, of: name })

  const remove = () => {
    dispatch({ do: 'remove', mode, id, of: name })
    say({
      text: `${capital(name)} removed`,
      action: { word: 'Undo', onPress: () => dispatch({ do: 'undo' }) },
    })
  }
  const onKeyDown = (event: KeyboardEvent<HTMLInputElement>) => {
    if (event.key === 'Enter') {
      event.preventDefault()
      desk.goOn(id)
    }
    const blank = event.currentTarget.value === ''
    if (event.key === 'Backspace' && blank && entry !== undefined && !event.repeat) {
      event.preventDefault()
      if (entry.upper !== undefined)
        dispatch({ do: 'set', mode, id, part: { upper: undefined }, of: `${name} steady` })
      else remove()
    }
  }
  // A long press chooses the field and so brings its strip; a mouse keeps its own menu.
  const onLongPress = (event: MouseEvent) => {
    if (!desk.ownPad) return
    event.preventDefault()
    desk.choose({ id, which: 'lower' })
  }
  return (
    <div className={className} onContextMenu={onLongPress}>
      <ReadingField
        pair={isPair(pair) ? pair : undefined}
        label={name}
        unit={reading.unit}
        text={entry?.text ?? ''}
        onText={(text) => type(text)}
        upper={entry?.upper}
        onUpper={(text) => type(text, 'upper')}
        with={
          <>
            {conditionOf(reading, entry)}
            <span className="band-slot">
              <ExpectedBand reading={reading} entry={entry} />
            </span>
          </>
        }
        error={sentence === undefined ? unkept : `${capital(name)} ${sentence}.`}
        question={
          meant && {
            text: meant.says,
            answer: `Meant ${meant.text}?`,
            onTake: () => dispatch({ do: 'set', mode, id, part: { text: meant.text }, of: name }),
          }
        }
        chosen={chosen?.id === id && desk.typing}
        ownPad={desk.ownPad}
        onFocus={(which) => desk.choose({ id, which })}
        onLeave={desk.leave}
        onKeyDown={onKeyDown}
        ref={desk.register(id, 'lower')}
        upperRef={desk.register(id, 'upper')}
      />
    </div>
  )
}
