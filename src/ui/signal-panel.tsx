import type { ReactNode } from 'react'

export type SignalWord = 'danger' | 'warning' | 'caution' | 'notice'

/** The safety alert triangle. Its ink is the word panel's, its mark the panel's color. */
function AlertSymbol({ word }: { word: SignalWord }) {
  const body = word === 'danger' ? 'var(--z-on-danger)' : 'var(--z-on-warning)'
  const mark = `var(--z-${word})`
  return (
    <svg viewBox="0 0 28 26" aria-hidden="true" focusable="false">
      <path d="M14 1.5L27 24.5H1z" fill={body} stroke={body} strokeWidth="2" strokeLinejoin="round" />
      <path d="M12.4 9h3.2l-.7 8.2h-1.8z" fill={mark} />
      <circle cx="14" cy="20.6" r="1.8" fill={mark} />
    </svg>
  )
}

type SignalPanelProps = {
  word: SignalWord
  /** Word at the left instead of on top; for one or two sentences. */
  slim?: boolean
  /** Say it at once and aloud (`role=alert`): for a danger that has just been found. */
  live?: boolean
  /** Name for readers where the panel has no heading of its own. */
  label?: string
  className?: string
  children: ReactNode
}

/**
 * A safety message in the order and colors of ANSI Z535. At most one danger and one other on a screen, danger first.
 */
export function SignalPanel({
  word,
  slim = false,
  live = false,
  label,
  className = '',
  children,
}: SignalPanelProps) {
  return (
    <div
      className={`z z-${word} ${slim ? 'z-slim' : ''} ${className}`}
      role={live ? 'alert' : 'note'}
      aria-label={label ?? `${word[0]?.toUpperCase()}${word.slice(1)}`}
    >
      <header>
        {word !== 'notice' && <AlertSymbol word={word} />}
        {word.toUpperCase()}
      </header>
      <div className="z-say">{children}</div>
    </div>
  )
}
