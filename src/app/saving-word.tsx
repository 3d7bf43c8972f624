import { useOnline } from '../offline/network.ts'
import { usePagesKept } from '../offline/pages-kept.ts'
import { useSheetCount } from '../offline/sheet-count.ts'
import { SavingState } from '../ui/offline-bar.tsx'

/**
 * Where what was typed lies. Nothing is sent yet, so whatever there is lies on this device only. Where the device
 * can't keep the pages themselves it says so, with what to do about it when the network goes.
 */
export function SavingWord() {
  const online = useOnline()
  const pagesKept = usePagesKept()
  const count = useSheetCount() ?? 0
  if (online && pagesKept && count === 0) return null
  return (
    <SavingState state="here">
      {!online && 'No network. '}
      {!pagesKept && (online ? 'Works only with a network. ' : 'Keep this page open. ')}
      {count > 0 && <>On this device only:&nbsp;{count}</>}
    </SavingState>
  )
}
