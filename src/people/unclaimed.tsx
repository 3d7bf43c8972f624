import { useEffect, useState } from 'react'
import { claimSheets, countUnclaimed } from '../offline/claim.ts'
import { onSheetsChanged, sayChanged } from '../offline/sheets.ts'
import { Button } from '../ui/button.tsx'
import { Rail } from '../ui/rail.tsx'
import { useToast } from '../ui/toast.tsx'

/** Checks begun on this device while nobody was signed in: whoever signs in says whether they are theirs. */
export function Unclaimed({ who }: { who: string }) {
  const [count, setCount] = useState(0)
  const say = useToast()
  useEffect(() => {
    let wanted = true
    const read = () =>
      void countUnclaimed().then(
        (found) => wanted && setCount(found),
        () => undefined,
      )
    read()
    const stop = onSheetsChanged(read)
    return () => {
      wanted = false
      stop()
    }
  }, [])
  if (count === 0) return null
  const them = count === 1 ? 'it' : 'them'
  const claim = async () => {
    await claimSheets(who)
    sayChanged()
    say({ text: count === 1 ? 'The check is in your account.' : 'The checks are in your account.' })
  }
  return (
    <Rail title="On this device, in nobody’s account" className="mt-7">
      <p className="mb-4 mt-2 text-small text-ink-2">
        {count === 1 ? 'A check was' : `${count} checks were`} made here while nobody was signed in. If{' '}
        {count === 1 ? 'it is' : 'they are'} yours, keep {them} in your account; then our server has {them}{' '}
        too.
      </p>
      <Button onPress={() => void claim()}>Keep {them} in my account</Button>
    </Rail>
  )
}
