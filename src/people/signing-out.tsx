import { useEffect, useState } from 'react'
import { useSaving } from '../offline/use-saving.ts'
import { sendWaiting } from '../sheets/sheets.api.ts'
import { Button } from '../ui/button.tsx'
import { Failed } from '../ui/failed.tsx'
import { Rail } from '../ui/rail.tsx'
import { SignalPanel } from '../ui/signal-panel.tsx'
import { signOut } from './requests.ts'
import { useSending } from './use-sending.ts'

/** The way out, with what becomes of what lies on this device. */
export function SigningOut({ expired }: { expired: boolean }) {
  const { sending, refusal, run } = useSending()
  const [where, setWhere] = useState<'here' | 'everywhere'>()
  const { entries = 0 } = useSaving() ?? {}
  useEffect(() => {
    // What can go out does so before anybody leaves.
    if (!expired) void sendWaiting()
  }, [expired])
  const out = (from: 'here' | 'everywhere') => {
    setWhere(from)
    void run(() => signOut(from))
  }
  return (
    <Rail title="Sign out" className="mt-7">
      <p className="mb-4 mt-2 text-small text-ink-2">
        Findings sheets that were sent leave this device; they are in your account. What is for qualified
        people leaves it too.
      </p>
      {entries > 0 && (
        <SignalPanel word="notice" className="mb-4">
          <p>
            <b>{entries === 1 ? '1 entry is' : `${entries} entries are`} on this device only.</b> If you sign
            out now, {entries === 1 ? 'it stays' : 'they stay'} here for you alone, and{' '}
            {entries === 1 ? 'goes' : 'go'} out when you sign in on this device again. Nobody else sees or
            sends {entries === 1 ? 'it' : 'them'}.
          </p>
        </SignalPanel>
      )}
      {refusal !== undefined && (
        <div className="mb-4">
          <Failed title={refusal.title} />
        </div>
      )}
      <div className="flex flex-wrap gap-3">
        <Button look="main" onPress={() => out('here')}>
          {sending && where === 'here' ? 'Signing out …' : 'Sign out on this device'}
        </Button>
        {!expired && (
          <Button onPress={() => out('everywhere')}>
            {sending && where === 'everywhere' ? 'Signing out …' : 'Sign out everywhere'}
          </Button>
        )}
      </div>
    </Rail>
  )
}
