import { lazy, Suspense } from 'react'

// Missing without a network on a device that keeps no pages: then there is nothing newer to offer either.
const VersionBar = lazy(() => import('./version-bar.tsx').catch(() => ({ default: () => null })))

/** What the shell shows once the page stands: none of it may weigh on the first one. */
export function LatePart() {
  return (
    <Suspense fallback={null}>
      <VersionBar />
    </Suspense>
  )
}
