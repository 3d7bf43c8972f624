import type { ReactNode } from 'react'

/** Done, failed (crossed box) or still to do. A pass is a black tick, never a green one; its words stand beside it. */
export function Tick({ state }: { state: 'yes' | 'no' | 'open' }) {
  return (
    <span
      className={`tick ${state === 'no' ? 'tick-no' : state === 'open' ? 'tick-open' : ''}`}
      aria-hidden="true"
    >
      {state !== 'open' && (
        <svg viewBox="0 0 24 24" focusable="false">
          <path d={state === 'yes' ? 'M4 12.5l5 5L20 6.5' : 'M6 6l12 12M18 6L6 18'} />
        </svg>
      )}
    </span>
  )
}

type CheckRowProps = { checked: boolean; onChange: (checked: boolean) => void; children: ReactNode }

/**
 * A statement to tick, as wide as the column so that a glove hits it. Not a native box: that one shows its new
 * state before it was kept on the device.
 */
export function CheckRow({ checked, onChange, children }: CheckRowProps) {
  return (
    <button
      type="button"
      role="checkbox"
      aria-checked={checked}
      className="check-row"
      onClick={() => onChange(!checked)}
    >
      <Tick state={checked ? 'yes' : 'open'} />
      <span>{children}</span>
    </button>
  )
}
