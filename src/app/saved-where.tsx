import { Link } from 'react-router-dom'
import { useOnline } from '../offline/network.ts'
import { usePagesKept } from '../offline/pages-kept.ts'
import { useSaving } from '../offline/use-saving.ts'
import { SavingState } from '../ui/offline-bar.tsx'

/**
 * Where what was typed lies: with the server, on its way, or on this device only. Where the device can't keep the pages
 * themselves it says so, with what to do about it when the network goes.
 */
export function SavedWhere() {
  const online = useOnline()
  const pagesKept = usePagesKept()
  const { here = 0, sent = 0, refused = 0, waiting = 0, sending = false } = useSaving() ?? {}
  const state = here > 0 || refused > 0 ? (sending && refused === 0 ? 'sending' : 'here') : 'sent'
  if (online && pagesKept && here + sent + refused === 0) return null
  const words =
    refused > 0 ? (
      'Refused: see why'
    ) : state === 'sending' ? (
      'Sending'
    ) : here > 0 ? (
      <>On this device only:&nbsp;{here}</>
    ) : (
      sent > 0 && 'All sent'
    )
  return (
    <SavingState state={online && pagesKept ? state : 'here'}>
      {!online && 'No network. '}
      {/* On a phone there is room for one of the two, and what lies here alone weighs more. */}
      {!pagesKept &&
        (online ? (
          <span className={here > 0 ? 'hidden desk:inline' : ''}>Works only with a network. </span>
        ) : (
          'Keep this page open. '
        ))}
      {refused + waiting > 0 && state === 'here' ? (
        <Link to="/not-sent" className="underline">
          {words}
        </Link>
      ) : (
        words
      )}
    </SavingState>
  )
}
