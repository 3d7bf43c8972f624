import { useId } from 'react'
import type { ReactNode } from 'react'

type RailProps = {
  title: ReactNode
  /** The section's one action, or a short note, at the right of its title. */
  action?: ReactNode
  /** Heading level; 2 unless it stands inside another section. */
  level?: 2 | 3
  id?: string
  className?: string
  children?: ReactNode
}

/** A section that hangs from its rail: a line with a hollow end left and a solid end right, then title and content. */
export function Rail({ title, action, level = 2, id, className = '', children }: RailProps) {
  const heading = useId()
  const Heading = level === 2 ? 'h2' : 'h3'
  return (
    <section className={`rail ${className}`} id={id} aria-labelledby={heading}>
      <div className="rail-head">
        <Heading id={heading} className="text-lead leading-[1.22]">
          {title}
        </Heading>
        {action}
      </div>
      {children}
    </section>
  )
}
