import { useState } from 'react'
import type { LinkMade } from '../../server/people/people.contract.ts'
import { Button } from '../ui/button.tsx'

const until = (moment: string) =>
  new Intl.DateTimeFormat('en-US', { dateStyle: 'medium', timeStyle: 'short' }).format(new Date(moment))

/** A one-time link, to be handed on. It is shown here and nowhere else. */
export function OneTimeLink({ name, link, onDone }: { name: string; link: LinkMade; onDone: () => void }) {
  const [copied, setCopied] = useState<boolean>()
  const address = `${window.location.origin}/set-password#${link.token}`
  const copy = async () => {
    // On plain HTTP there is no clipboard; the link can be selected with one press.
    const done = await Promise.resolve(navigator.clipboard?.writeText(address)).then(
      () => navigator.clipboard !== undefined,
      () => false,
    )
    setCopied(done)
  }
  return (
    <div className="plate-dashed mt-4" role="status">
      <p className="font-bold">One-time link for {name}</p>
      <p className="mb-3 mt-1 text-small">
        Hand it to {name} alone: whoever has it sets the password. It works once, until{' '}
        {until(link.expiresAt)}, and is shown only now.
      </p>
      <code className="one-time-link">{address}</code>
      <div className="mt-3 flex flex-wrap items-center gap-3">
        <Button size="small" onPress={() => void copy()}>
          Copy
        </Button>
        <Button size="small" look="plain" onPress={onDone}>
          Done
        </Button>
        {copied !== undefined && (
          <span className="text-small">
            {copied ? 'Copied.' : 'Couldn’t copy. Select it and copy it yourself.'}
          </span>
        )}
      </div>
    </div>
  )
}
