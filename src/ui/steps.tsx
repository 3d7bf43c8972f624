import type { ReactNode } from 'react'

/** Numbered steps, each number in a circle; what to do first stands first. */
export function Steps({ steps, className = '' }: { steps: readonly ReactNode[]; className?: string }) {
  return (
    <ol className={`steps ${className}`}>
      {steps.map((step, index) => (
        <li key={index}>{step}</li>
      ))}
    </ol>
  )
}
