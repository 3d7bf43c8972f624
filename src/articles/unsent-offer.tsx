import { useState } from 'react'
import type { DraftText } from '../../server/articles/drafts.contract.ts'
import { Button } from '../ui/button.tsx'
import { Difference } from './difference.tsx'
import { wholeOf } from './draft-form.ts'
import { momentInWords } from './day.ts'
import type { Unsent } from './use-unsent.ts'

/** What this device holds while the server can't be asked. */
export function UnsentHere({ unsent }: { unsent: Unsent }) {
  return (
    <section className="plate-dashed my-5" aria-label="Text from this device">
      <p className="font-bold">Text from this device, not sent yet: {momentInWords(unsent.typedAt)}</p>
      <p className="mt-2 text-small">Once the server answers, you can go on with it here.</p>
      <details className="more mt-3 text-small">
        <summary>The whole text</summary>
        <pre className="difference" tabIndex={0} aria-label="The whole text">
          {wholeOf(unsent.text)}
        </pre>
      </details>
    </section>
  )
}

type UnsentOfferProps = {
  unsent: Unsent
  /** What the server keeps. */
  kept: DraftText
  onGoOn: () => void
  onLetGo: () => void
}

/** Offers what was typed here and never sent, before anything else can be typed over it. */
export function UnsentOffer({ unsent, kept, onGoOn, onLetGo }: UnsentOfferProps) {
  const [sure, setSure] = useState(false)
  return (
    <>
      <h1>Change an article</h1>
      <section className="plate-dashed my-5" aria-label="Text from this device">
        <p className="font-bold">Text from this device, not sent yet: {momentInWords(unsent.typedAt)}</p>
        <p className="mt-2 text-small">
          It was typed here, and the server has not got it. Go on with it, and what the server keeps stays
          among the revisions.
        </p>
        <h2 className="mt-4 text-body">From what the server keeps to this text</h2>
        <Difference
          former={wholeOf(kept)}
          now={wholeOf(unsent.text)}
          label="Difference from what the server keeps"
        />
        <div className="mt-4 flex flex-wrap gap-3">
          <Button look="main" onPress={onGoOn}>
            Go on with this text
          </Button>
          {sure ? (
            <Button onPress={onLetGo}>Take it off this device for good</Button>
          ) : (
            <Button look="plain" onPress={() => setSure(true)}>
              Let it go
            </Button>
          )}
        </div>
        <p className="mt-2 text-small" role="status">
          {sure && 'It lies nowhere else. Once let go, it can’t be brought back.'}
        </p>
      </section>
    </>
  )
}
