import type { ReactNode } from 'react'

/** A question that opens to its answer. */
export function Help({ summary, children }: { summary: ReactNode; children: ReactNode }) {
  return (
    <details className="help border-t border-rule">
      <summary>{summary}</summary>
      <div className="pb-4 text-small">{children}</div>
    </details>
  )
}
