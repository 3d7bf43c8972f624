import { lazy, Suspense } from 'react'
import type { ShareProps } from './share.tsx'

// Without a network on a device that keeps no pages there is no link to make either.
const Share = lazy(() =>
  import('./share.tsx').then(
    ({ Share }) => ({ default: Share }),
    () => ({ default: () => null }),
  ),
)

/** The link for a professional, once the page stands: none of it may weigh on what stops. */
export function LateShare(props: ShareProps) {
  return (
    <Suspense fallback={null}>
      <Share {...props} />
    </Suspense>
  )
}
