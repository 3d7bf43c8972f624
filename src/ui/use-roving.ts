import { useRef } from 'react'
import type { KeyboardEvent } from 'react'

const steps: Record<string, number> = { ArrowRight: 1, ArrowDown: 1, ArrowLeft: -1, ArrowUp: -1 }

/**
 * One stop of the Tab key for a whole radio group: arrows, Home and End move the focus, space or Enter chooses
 * (the button's own click). Moving does not choose, because a choice here can change what is computed.
 */
export function useRoving(count: number, chosen: number) {
  const buttons = useRef<(HTMLButtonElement | null)[]>([])
  const stop = chosen >= 0 ? chosen : 0
  return {
    /** Spread on each button. */
    item: (index: number) => ({
      ref: (button: HTMLButtonElement | null) => {
        buttons.current[index] = button
      },
      tabIndex: index === stop ? 0 : -1,
      onKeyDown: (event: KeyboardEvent) => {
        if (event.altKey || event.ctrlKey || event.metaKey) return
        const step = steps[event.key]
        const to =
          step !== undefined
            ? (index + step + count) % count
            : event.key === 'Home'
              ? 0
              : event.key === 'End'
                ? count - 1
                : undefined
        if (to === undefined) return
        event.preventDefault()
        buttons.current[to]?.focus()
      },
    }),
  }
}
