import { useEffect, useState } from 'react'
import { getSetting, setSetting } from '../offline/settings.ts'
import { Keypad } from '../ui/keypad.tsx'
import { pressPadKey } from '../ui/pad-text.ts'
import type { PadKey } from '../ui/pad-text.ts'
import { useDesk } from './desk.ts'
import { readingOf } from './sheet-content.ts'

function usePadSide(): ['left' | 'right', (side: 'left' | 'right') => void] {
  const [side, setSide] = useState<'left' | 'right'>('right')
  useEffect(() => {
    getSetting('padSide').then(
      (kept) => setSide(kept ?? 'right'),
      () => undefined,
    )
  }, [])
  return [
    side,
    (next) => {
      setSide(next)
      void setSetting('padSide', next).catch(() => undefined)
    },
  ]
}

/** Keeps the field that is typed into above the pad. */
function useRoomForPad(up: boolean, field: string): void {
  useEffect(() => {
    if (!up) return
    const page = document.documentElement
    page.style.scrollPaddingBottom = '400px'
    document.activeElement?.scrollIntoView({ block: 'nearest' })
    return () => {
      page.style.removeProperty('scroll-padding-bottom')
    }
  }, [up, field])
}

/** Our own pad, up while a reading is typed on a device for fingers. */
export function NumberPad() {
  const { edition, typed, dispatch, chosen, typing, ownPad, goOn, after, focus } = useDesk()
  const [side, setSide] = usePadSide()
  const reading = edition.readings.get(chosen?.id ?? '')
  useRoomForPad(ownPad && typing && reading !== undefined, `${chosen?.id ?? ''} ${chosen?.which ?? ''}`)
  if (!ownPad || !typing || chosen === undefined || reading === undefined) return null
  const { id, label } = reading
  const { mode } = typed
  const entry = readingOf(typed, mode, id)
  const text = (chosen.which === 'upper' ? entry?.upper : entry?.text) ?? ''
  const press = (key: PadKey) =>
    dispatch({ do: 'type', mode, id, text: pressPadKey(text, key), which: chosen.which, of: label })
  const next = after(id)
  return (
    <div className="pad-dock">
      <Keypad
        label={label}
        onKey={press}
        unsteady={{
          on: entry?.upper !== undefined,
          onPress: () => {
            const part = { upper: entry?.upper === undefined ? '' : undefined }
            dispatch({ do: 'set', mode, id, part, of: `${label}, unsteady` })
            focus({ id, which: part.upper === undefined || text === '' ? 'lower' : 'upper' })
          },
        }}
        onCantReach={() => {
          dispatch({ do: 'set', mode, id, part: { unreachable: true }, of: `${label}, can’t be reached` })
          goOn(id)
        }}
        doneWord={next === 'side' ? 'Next side' : next === 'reading' ? 'Next' : 'Done'}
        onDone={() => goOn(id)}
        side={side}
        onSide={setSide}
      />
    </div>
  )
}
