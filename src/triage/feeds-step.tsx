import { useNavigate } from 'react-router-dom'
import { OptionList } from '../ui/ways.tsx'
import { asksMode, modes, sources, twoForty, wirings } from './feeds.ts'
import { StepFrame } from './step-frame.tsx'
import { useTriage } from './triage-store.tsx'
import { useSkip } from './use-skip.ts'

/** Step 2: what feeds it, in plain words. "Not sure" is an answer everywhere. */
export function FeedsStep() {
  const { triage, change } = useTriage()
  const navigate = useNavigate()
  const skip = useSkip()
  const { feeds } = triage
  const set = (part: keyof typeof feeds) => (value: string) =>
    void change((from) => ({ ...from, feeds: { ...from.feeds, [part]: value } }))
  const on = () => void navigate('/check/3')
  return (
    <StepFrame
      step={2}
      title="What feeds it?"
      back="/check/1"
      next={{ words: 'Next: what you notice', onPress: on }}
      onSkip={() => skip(Object.keys(feeds).length > 0, { feeds: {} }, '/check/3')}
    >
      <p className="mt-[6px] text-small text-ink-2">
        Where does the power come from that has the trouble? Look only. Open nothing.
      </p>
      <div className="mt-4">
        <OptionList label="What feeds it?" ways={sources} value={feeds.source} onChoose={set('source')} />
      </div>
      {asksMode(feeds.source) && (
        <>
          <h2 className="step-question" id="mode">
            How was it running when you saw it?
          </h2>
          <OptionList
            labelledBy="mode"

            ways={modes}

            value={feeds.mode}
            onChoose={set('mode')}
          />
        </>
      )}
      <h2 className="step-question" id="wiring">
        How does the power get to the outlet (receptacle)?
      </h2>
      <OptionList
        labelledBy="wiring"

        ways={wirings}

        value={feeds.wiring}
        onChoose={set('wiring')}
      />
      <h2 className="step-question" id="volts">
        Is there 240 V?
      </h2>
      <OptionList
        labelledBy="volts"

        ways={twoForty}

        value={feeds.twoForty}
        onChoose={set('twoForty')}
      />
    </StepFrame>
  )
}
