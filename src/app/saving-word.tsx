import { useOnline } from '../offline/network.ts'
import { useSheetCount } from '../offline/sheet-count.ts'
import { SavingState } from '../ui/offline-bar.tsx'

/** Where what was typed lies. Nothing is sent yet, so whatever there is lies on this device only. */
export function SavingWord() {
  const online = useOnline()
  const count = useSheetCount() ?? 0
  if (online && count === 0) return null
  return (
    <SavingState state="here">
      {!online && 'No network. '}
      {count > 0 && <>On this device only:&nbsp;{count}</>}
    </SavingState>
  )
}
