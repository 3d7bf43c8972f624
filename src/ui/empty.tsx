import type { ReactNode } from 'react'

/** Nothing here yet: an empty rail, one sentence and one way on. */
export function Empty({ title, children }: { title: ReactNode; children?: ReactNode }) {
  return (
    <div className="empty">
      <svg
        className="mx-auto mb-2"
        width="44"
        height="14"
        viewBox="0 0 44 14"
        aria-hidden="true"
        focusable="false"
      >
        <path d="M5 7H39" stroke="var(--edge)" strokeWidth="3" strokeDasharray="3 6" />
        <circle cx="5" cy="7" r="3.5" fill="var(--enamel)" stroke="var(--ink)" strokeWidth="2" />
        <circle cx="39" cy="7" r="4" fill="var(--ink)" />
      </svg>
      <p className="font-bold">{title}</p>
      {children !== undefined && <div className="mt-1 text-small">{children}</div>}
    </div>
  )
}
