import { useState } from 'react'
import { Button } from '../ui/button.tsx'
import { Failed } from '../ui/failed.tsx'
import { Rail } from '../ui/rail.tsx'
import { sayHelped } from './drafts.api.ts'
import { refusalOf } from './refusal.ts'
import { TextArea } from './text-area.tsx'

/** Readers say whether an article helped; where it did not, what was wrong with it. */
export function Helped({ slug, edition }: { slug: string; edition: number }) {
  const [step, setStep] = useState<'ask' | 'why' | 'sending' | 'kept'>('ask')
  const [why, setWhy] = useState('')
  const [refusal, setRefusal] = useState<string>()
  const say = async (helped: boolean) => {
    const before = step
    setStep('sending')
    setRefusal(undefined)
    try {
      await sayHelped(slug, { edition, helped, why: helped ? '' : why })
      setStep('kept')
    } catch (problem) {
      setRefusal(refusalOf(problem).title)
      setStep(before)
    }
  }
  return (
    <Rail title="Did this help?" className="screen-only mt-6">
      <div className="mt-3" role="status">
        {step === 'kept' && <p>Kept, for whoever looks after this article.</p>}
      </div>
      {refusal !== undefined && <Failed title={refusal} />}
      {(step === 'ask' || (step === 'sending' && why === '')) && (
        <div className="mt-3 flex gap-3">
          <Button onPress={() => void say(true)}>Yes</Button>
          <Button onPress={() => setStep('why')}>No, because …</Button>
        </div>
      )}
      {step === 'why' && (
        <form
          className="mt-3 grid gap-3"
          onSubmit={(event) => {
            event.preventDefault()
            void say(false)
          }}
        >
          <TextArea
            label="What was missing or wrong?"
            help="500 characters or fewer. Name nobody."
            rows={4}
            most={500}
            value={why}
            onText={setWhy}
          />
          <div className="flex flex-wrap gap-3">
            <Button type="submit" look="main">
              Send
            </Button>
            <Button look="plain" onPress={() => setStep('ask')}>
              Cancel
            </Button>
          </div>
        </form>
      )}
    </Rail>
  )
}
