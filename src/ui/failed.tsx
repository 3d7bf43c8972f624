import type { ReactNode } from 'react'
import { Button } from './button.tsx'

type FailedProps = {
  /** "Couldn’t fetch the articles." */
  title: string
  /** What happened, and how old what is shown is. */
  children?: ReactNode
  onRetry?: () => void
}

/** Something could not be fetched or kept: what, why, and the way to try again. Typed text stays. */
export function Failed({ title, children, onRetry }: FailedProps) {
  return (
    <div className="failed" role="alert">
      <b>{title}</b> <span className="text-small">{children}</span>
      {onRetry && (
        <div className="mt-3">
          <Button size="small" onPress={onRetry}>
            Try again
          </Button>
        </div>
      )}
    </div>
  )
}
