import type { ReactNode } from 'react'

/** The next step, at the bottom of the screen and of the page; put it last, after the main content. */
export function Dock({ label = 'Next step', children }: { label?: string; children: ReactNode }) {
  return (
    <section className="dock" aria-label={label}>
      <div className="dock-in">{children}</div>
    </section>
  )
}
