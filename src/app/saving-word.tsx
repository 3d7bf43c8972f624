import { lazy, Suspense } from 'react'
import { SavingState } from '../ui/offline-bar.tsx'

const Gone = () => <SavingState state="here">No network.</SavingState>
// It looks into all sheets of the device: the first page does not wait for it.
const SavedWhere = lazy(() =>
  import('./saved-where.tsx').then(
    ({ SavedWhere }) => ({ default: SavedWhere }),
    () => ({ default: Gone }),
  ),
)

/** Where what was typed lies. */
export function SavingWord() {
  return (
    <Suspense fallback={null}>
      <SavedWhere />
    </Suspense>
  )
}
