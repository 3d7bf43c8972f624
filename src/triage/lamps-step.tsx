import { useId } from 'react'
import { useNavigate } from 'react-router-dom'
import { Help } from '../ui/help.tsx'
import { PairDiscs } from '../ui/pair-discs.tsx'
import { SignalPanel } from '../ui/signal-panel.tsx'
import { lampWords, TesterLamp } from '../ui/tester-lamp.tsx'
import type { LampState } from '../ui/tester-lamp.tsx'
import { Ways } from '../ui/ways.tsx'
import { ReceptacleFace } from './receptacle-face.tsx'
import { StepFrame } from './step-frame.tsx'
import type { LampPair } from './triage-state.ts'
import { useTriage } from './triage-store.tsx'
import { useSkip } from './use-skip.ts'

const states = ['lit', 'dim', 'dark'] as const
const pairs: readonly [LampPair, string, string][] = [
  ['hn', 'hot', 'neutral'],
  ['ng', 'neutral', 'ground'],
  ['hg', 'hot', 'ground'],
]

function LampHelp() {
  return (
    <div className="mt-5 border-b border-rule">
      <Help summary="Which tester lamp is which?">
        <p>
          The paper that came with the tester says between which two slots each lamp sits. Go by that, not by
          the words or colors on its face.
        </p>
        <p className="mt-2">
          No paper? Where the wiring is known to be right, two lamps are lit and one is dark. The dark one
          sits across neutral and ground. The other two can’t be told apart that way: leave them open.
        </p>
      </Help>
      <Help summary="My tester has only two lamps, or a screen">
        <p>
          <b>Two lamps:</b> its paper names two pairs. Answer those two and leave the third open.
        </p>
        <p className="mt-2">
          <b>A screen or a voice:</b> it gives a verdict, not its lamps, and a verdict can be wrong. Skip this
          step. Read out what it says on the phone.
        </p>
      </Help>
    </div>
  )
}

/** Step 4: which tester lamps are lit, by pair. */
export function LampsStep() {
  const { triage, change } = useTriage()
  const navigate = useNavigate()
  const skip = useSkip()
  const group = useId()
  const { lamps } = triage
  const set = (pair: LampPair, state: LampState | undefined) =>
    void change((from) => ({ ...from, lamps: { ...from.lamps, [pair]: state } }))
  const after = triage.have === 'tester' ? '/check/result' : '/check/5'
  return (
    <StepFrame
      step={4}
      title="Which tester lamps are lit?"
      back="/check/3"
      next={{
        words: triage.have === 'tester' ? 'Next: what it may be' : 'Next: used a meter before?',
        onPress: () => void navigate(after),
      }}
      onSkip={() =>
        skip(
          Object.values(lamps).some((lamp) => lamp !== undefined),
          { lamps: {} },
          after,
        )
      }
    >
      <p className="mt-[6px] text-small text-ink-2">
        Plug it into the outlet (receptacle) and look only at the lamps: the words printed on it can be wrong.
        No extension cord, no adapter. Leave its button alone.
      </p>
      <SignalPanel word="caution" slim className="mt-4">
        <b>It sparks, feels warm or sits loose?</b> Leave it where it is, keep off, and call.
      </SignalPanel>
      <ReceptacleFace lamps={lamps} onLamp={set} />
      {pairs.map(([pair, one, other]) => (
        <section key={pair} className="mt-4">
          <h2 className="lamp-pair" id={`${group}${pair}`}>
            <span className="sr-only">Tester lamp </span>
            <PairDiscs pair={pair} /> across <b>{one}</b> and <b>{other}</b>
          </h2>
          <Ways
            labelledBy={`${group}${pair}`}
            size="lamps"
            ways={states.map((state) => ({
              value: state,
              label: lampWords[state],
              mark: <TesterLamp state={state} />,
            }))}
            value={lamps[pair]}
            onChoose={(state) => set(pair, state === lamps[pair] ? undefined : state)}
          />
        </section>
      ))}
      <LampHelp />
    </StepFrame>
  )
}
