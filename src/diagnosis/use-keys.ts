import { useEffect, useRef, useState } from 'react'
import { getSetting, setSetting } from '../offline/settings.ts'

/** Whether single letters act as keys; remembered on the device. */
export function useLetterKeys(): [boolean, (on: boolean) => void] {
  const [on, setOn] = useState(true)
  useEffect(() => {
    getSetting('letterKeys').then(
      (kept) => setOn(kept ?? true),
      () => undefined,
    )
  }, [])
  return [
    on,
    (next) => {
      setOn(next)
      void setSetting('letterKeys', next).catch(() => undefined)
    },
  ]
}

/** What each key does; `undo` is Ctrl+Z. */
export type KeyActions = Readonly<Record<string, () => void>>

const takesText = (target: EventTarget | null): target is HTMLElement =>
  target instanceof HTMLElement &&
  target.matches('input:not([type=checkbox]), textarea, select, [contenteditable]')
/** A field whose numbers the sheet's own Undo brings back; others keep the browser's. */
const isReading = (target: HTMLElement) => target.closest('.reading') !== null

/** The page's keys: letters only while no field has the cursor, Ctrl+Z everywhere but in a text of its own. */
export function useKeys(letters: boolean, actions: KeyActions): void {
  const latest = useRef({ letters, actions })
  useEffect(() => {
    latest.current = { letters, actions }
  })
  useEffect(() => {
    const onKey = (event: KeyboardEvent) => {
      if (event.defaultPrevented || event.isComposing) return
      const { letters: on, actions: does } = latest.current
      const inText = takesText(event.target)
      const run = (action: (() => void) | undefined) => {
        if (action === undefined) return
        event.preventDefault()
        action()
      }
      if (
        (event.ctrlKey || event.metaKey) &&
        !event.shiftKey &&
        !event.altKey &&
        event.key.toLowerCase() === 'z'
      ) {
        if (!inText || isReading(event.target as HTMLElement)) run(does['undo'])
        return
      }
      if (event.ctrlKey || event.metaKey || event.altKey || inText || !on) return
      run(does[event.key])
    }
    window.addEventListener('keydown', onKey)
    return () => window.removeEventListener('keydown', onKey)
  }, [])
}
