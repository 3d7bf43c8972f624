import { Link } from 'react-router-dom'
import { useOnline } from '../offline/network.ts'
import { useSaving } from '../offline/use-saving.ts'
import { SavingState } from '../ui/offline-bar.tsx'

/** Where what was typed lies: with the server, on its way, or on this device only. */
export function SavingWord() {
  const online = useOnline()
  const { here = 0, sent = 0, refused = 0, sending = false } = useSaving() ?? {}
  if (online && here + sent === 0) return null
  if (refused > 0)
    return (
      <SavingState state="here">
        <Link to="/not-sent" className="underline">
          Refused: see why
        </Link>
      </SavingState>
    )
  if (sending) return <SavingState state="sending">Sending</SavingState>
  if (online && here === 0) return <SavingState state="sent">All sent</SavingState>
  return (
    <SavingState state="here">
      {!online && 'No network. '}
      {here > 0 && <>On this device only:&nbsp;{here}</>}
    </SavingState>
  )
}
