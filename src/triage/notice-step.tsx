import { useState } from 'react'
import type { ComponentProps } from 'react'
import { useNavigate } from 'react-router-dom'
import { TextField } from '../ui/field.tsx'
import { SignalPanel } from '../ui/signal-panel.tsx'
import { OptionList, Ways } from '../ui/ways.tsx'
import { answerDanger } from './danger-step.tsx'
import { noticesToAsk, someVeryBright } from './notices.ts'
import { StepFrame } from './step-frame.tsx'
import { useTriage } from './triage-store.tsx'
import { useSkip } from './use-skip.ts'
import { stoppedBySaying } from './said-stops.ts'

/** Three short answers side by side. */
function ShortWays(props: ComponentProps<typeof Ways<string>>) {
  return <Ways {...props} size="glove" />
}

/** Step 3: what can be seen and heard. Each answer may be left out; a second press takes it back. */
export function NoticeStep() {
  const { triage, change } = useTriage()
  const navigate = useNavigate()
  const skip = useSkip()
  const [where, setWhere] = useState(triage.where)
  const stopped = stoppedBySaying(triage)
  const { notices, have } = triage

  const choose = (finding: string) => async (value: string) => {
    if (value === someVeryBright) {
      await change(answerDanger('lights', 'yes'))
      await navigate('/check/stop')
      return
    }
    await change((from) => {
      const next = { ...from.notices }
      if (next[finding] === value) delete next[finding]
      else next[finding] = value
      return { ...from, notices: next }
    })
  }
  const after = stopped ? '/check/stop' : have === 'senses' ? '/check/result' : '/check/4'
  const words = stopped
    ? 'Back to what to do now'
    : have === 'senses'
      ? 'Next: what it may be'
      : 'Next: tester lamps'
  return (
    <StepFrame
      step={3}
      title="What do you notice?"
      back="/check/2"
      next={{ words, onPress: () => void navigate(after) }}
      onSkip={() => {
        setWhere('')
        skip(Object.keys(notices).length > 0 || triage.where !== '', { notices: {}, where: '' }, after)
      }}
    >
      <p className="mt-[6px] text-small text-ink-2">
        Answer what you know. Leave the rest. Switch nothing on or off to find out.
      </p>
      <TextField
        className="mt-4"
        label="Which outlet (receptacle)?"
        help="In your words, for the phone: “kitchen, left of the sink”."
        value={where}
        onText={(text) => {
          setWhere(text)
          void change((from) => ({ ...from, where: text }))
        }}
        autoComplete="off"
      />
      {noticesToAsk(notices).map(({ finding, question, help, ways }) => {
        const Group = ways.length > 3 || ways.some((way) => way.label.length > 18) ? OptionList : ShortWays
        return (
          <section key={finding}>
            <h2 className="step-question" id={`notice-${finding}`}>
              {question}
            </h2>
            {help !== undefined && <p className="-mt-1 mb-2 text-note text-ink-2">{help}</p>}
            <Group
              labelledBy={`notice-${finding}`}
              ways={ways}
              value={notices[finding]}
              onChoose={(value) => void choose(finding)(value)}
            />
          </section>
        )
      })}
      <SignalPanel word="caution" slim className="mt-6">
        <b>If it smells, buzzes or gets warm, stop here.</b> Go back to the first step and answer yes.
      </SignalPanel>
    </StepFrame>
  )
}
