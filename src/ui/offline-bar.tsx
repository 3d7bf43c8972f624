import type { ReactNode } from 'react'
import { Icon } from './icon.tsx'

/** Said once, when there is no network; it never blocks. */
export function OfflineBar({ children }: { children: ReactNode }) {
  return (
    <p className="offline-bar" role="status">
      <Icon name="device" />
      <span>{children}</span>
    </p>
  )
}

/** Where what was typed lies, as a word and a dot: solid, half, dashed. */
export function SavingState({
  state,
  children,
}: {
  state: 'sent' | 'sending' | 'here'
  children: ReactNode
}) {
  return (
    <span
      className={`sync ${state === 'here' ? 'sync-here' : state === 'sending' ? 'sync-sending' : ''}`}
      role="status"
    >
      <i aria-hidden="true" />
      <span>{children}</span>
    </span>
  )
}
