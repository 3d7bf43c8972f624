import { createContext, useCallback, useContext, useEffect, useMemo, useRef, useState } from 'react'
import type { ReactNode } from 'react'

export type ToastMessage = { text: string; action?: { word: string; onPress: () => void } }
type Shown = ToastMessage & { id: number }

const Say = createContext<(message: ToastMessage) => void>(() => {})
const shownMs = 8000

/**
 * Says what was just done, with at most one way back: `say({ text: 'Reading removed', action: { word: 'Undo', … } })`.
 * Never for errors, never for safety.
 */
export const useToast = (): ((message: ToastMessage) => void) => useContext(Say)

function Toast({ message, onGone }: { message: Shown; onGone: (id: number) => void }) {
  const [held, setHeld] = useState(false)
  useEffect(() => {
    if (held) return
    const timer = setTimeout(() => onGone(message.id), shownMs)
    return () => clearTimeout(timer)
  }, [held, message.id, onGone])
  const { action } = message
  return (
    <div
      className="toast"
      onFocus={() => setHeld(true)}
      onBlur={() => setHeld(false)}
      onPointerEnter={() => setHeld(true)}
      onPointerLeave={() => setHeld(false)}
    >
      <span>{message.text}</span>
      {action && (
        <button
          type="button"
          onClick={() => {
            action.onPress()
            onGone(message.id)
          }}
        >
          {action.word}
        </button>
      )}
      <button type="button" onClick={() => onGone(message.id)}>
        Dismiss
      </button>
    </div>
  )
}

/** Holds the toasts of the pages below it, at the bottom left. The newest replaces the one before. */
export function Toasts({ children }: { children: ReactNode }) {
  const [shown, setShown] = useState<Shown | undefined>()
  const next = useRef(0)
  const say = useCallback((message: ToastMessage) => setShown({ ...message, id: next.current++ }), [])
  const gone = useCallback((id: number) => setShown((now) => (now?.id === id ? undefined : now)), [])
  const value = useMemo(() => say, [say])
  return (
    <Say value={value}>
      {children}
      <div className="toasts" role="status">
        {shown && <Toast key={shown.id} message={shown} onGone={gone} />}
      </div>
    </Say>
  )
}
