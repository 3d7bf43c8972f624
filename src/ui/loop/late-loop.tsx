import { lazy, Suspense } from 'react'
import { Waiting } from '../waiting.tsx'
import type { LoopPicture } from './loop-picture.tsx'

function Missing() {
  return <p className="text-small">The loop picture could not be fetched. Load the page again.</p>
}

/** The picture brings the circuit model along, so it is fetched when a page first shows one. */
const Late = lazy<typeof LoopPicture>(() =>
  import('./loop-picture.tsx').then(
    ({ LoopPicture }) => ({ default: LoopPicture }),
    () => ({ default: Missing }),
  ),
)

/** The loop picture of a cause, once its part of the page is here. */
export function LateLoop(props: Parameters<typeof LoopPicture>[0]) {
  return (
    <Suspense fallback={<Waiting what="the loop picture" />}>
      <Late {...props} />
    </Suspense>
  )
}
