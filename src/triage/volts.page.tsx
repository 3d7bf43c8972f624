import { useEffect, useRef, useState } from 'react'
import { Navigate, useNavigate } from 'react-router-dom'
import { useEdition } from '../editions/edition.api.ts'
import { getSetting, setSetting } from '../offline/settings.ts'
import { Keypad } from '../ui/keypad.tsx'
import { pairWords } from '../ui/pair-discs.tsx'
import { Rail } from '../ui/rail.tsx'
import { ShutReading } from '../ui/reading-field.tsx'
import { SignalPanel } from '../ui/signal-panel.tsx'
import { CheckRow } from '../ui/tick.tsx'
import { useTouch } from '../ui/use-touch.ts'
import { Ways } from '../ui/ways.tsx'
import { assume } from './feeds.ts'
import { dangersSaid } from './said-stops.ts'
import { StepFrame } from './step-frame.tsx'
import { insteadOf } from './step-gate.ts'
import { blank, conditions, mayMeasure } from './triage-state.ts'
import type { Triage, VoltsPair } from './triage-state.ts'
import { useTriage } from './triage-store.tsx'
import { useSkip } from './use-skip.ts'
import { asksAgain, order, VoltsFields } from './volts-fields.tsx'
import type { PadHandle } from './volts-fields.tsx'
import { stopsHere } from './stops-here.ts'

const used = [
  { value: 'yes', label: 'Yes, I have' },
  { value: 'no', label: 'No. Skip' },
] as const

function whyShut(triage: Triage): string {
  if (dangersSaid(triage).length > 0) return 'not while something is warm'
  return triage.usedMeter === 'yes' ? 'once all five are ticked' : 'only if you have used a meter'
}

function Conditions({
  triage,
  onTick,
}: {
  triage: Triage
  onTick: (index: number, ticked: boolean) => void
}) {
  return (
    <SignalPanel word="warning" className="mt-4">
      <p>
        <b>A wrong dial or a bad lead can burn or kill.</b> All five must be true. If one isn’t, skip.
      </p>
      <div className="mt-2 text-small">
        {conditions.map((words, index) => (
          <CheckRow
            key={words}
            checked={triage.ticked[index] === true}
            onChange={(ticked) => onTick(index, ticked)}
          >
            {words}
          </CheckRow>
        ))}
      </div>
    </SignalPanel>
  )
}

/** Which side the pad's action column stands on, remembered on the device. */
function usePadSide() {
  const [side, setSide] = useState<'left' | 'right'>('right')
  useEffect(() => {
    let wanted = true
    getSetting('padSide').then(
      (kept) => wanted && kept !== undefined && setSide(kept),
      () => {},
    )
    return () => {
      wanted = false
    }
  }, [])
  const put = (to: 'left' | 'right') => {
    setSide(to)
    void setSetting('padSide', to).catch(() => undefined)
  }
  return [side, put] as const
}

/** Step 5: volts, only for those who have used a meter, and only while all five conditions are ticked. */
function VoltsStep() {
  const { triage, change } = useTriage()
  const { edition } = useEdition()
  const navigate = useNavigate()
  const skip = useSkip()
  const touch = useTouch()
  const [chosen, setChosen] = useState<VoltsPair>()
  const [side, putSide] = usePadSide()
  const pad = useRef<PadHandle | undefined>(undefined)
  const latest = useRef(triage)
  useEffect(() => {
    latest.current = triage
  })

  const allowed = mayMeasure(triage)
  const { system } = assume(triage.feeds).context
  const nominalVolts = edition?.systems.get(system)?.nominalVolts ?? (system === '230' ? 230 : 120)
  const type = (pair: VoltsPair, text: string) =>
    void change((from) => {
      const next = { ...from, volts: { ...from.volts, [pair]: text } }
      latest.current = next
      return next
    })
  /** A reading that stops is acted on at once, not at the end; a likely slip is asked about first. */
  const taken = () => {
    if (order.some((pair) => asksAgain(latest.current.volts[pair], nominalVolts))) return
    if (stopsHere(latest.current, edition).length > 0) void navigate('/check/result')
  }
  const answerUsed = async (value: 'yes' | 'no') => {
    await change((from) => ({ ...from, usedMeter: value }))
    if (value === 'no') await navigate('/check/result')
  }
  const showPad = allowed && touch && chosen !== undefined
  return (
    <StepFrame
      step={5}
      title="Volts, only if you have used a meter before"
      back="/check/4"
      next={{ words: 'Next: what it may be', onPress: () => void navigate('/check/result') }}
      onSkip={() =>
        skip(
          triage.usedMeter !== undefined || Object.values(triage.volts).some((text) => text !== ''),
          { usedMeter: undefined, ticked: blank.ticked, volts: blank.volts },
          '/check/result',
        )
      }
      instead={
        showPad ? (
          <div className="sticky bottom-0 z-10 mt-auto">
            <Keypad
              label={pairWords(chosen)}
              onKey={(key) => pad.current?.key(key)}
              onCantReach={() => pad.current?.leaveOut()}
              doneWord={chosen === order.at(-1) ? 'Done' : 'Next side'}
              onDone={() => pad.current?.next()}
              side={side}
              onSide={putSide}
            />
          </div>
        ) : undefined
      }
    >
      <div className="mt-3">
        <Ways
          label="Have you used a meter before?"
          size="glove"
          ways={used}
          value={triage.usedMeter}
          onChoose={(value) => void answerUsed(value)}
        />
      </div>
      {triage.usedMeter === 'yes' && (
        <Conditions
          triage={triage}
          onTick={(index, ticked) =>
            void change((from) => ({
              ...from,
              ticked: conditions.map((_, i) => (i === index ? ticked : from.ticked[i] === true)),
            }))
          }
        />
      )}
      <Rail title="Three readings at one outlet (receptacle)" className="mt-[30px]!">
        {allowed ? (
          <VoltsFields
            volts={triage.volts}
            onType={type}
            onTaken={taken}
            ownPad={touch}
            nominalVolts={nominalVolts}
            onChosen={setChosen}
            pad={pad}
          />
        ) : (
          <div className="mt-3 grid gap-[10px]">
            {order.map((pair) => (
              <ShutReading key={pair} pair={pair} label={pairWords(pair)} because={whyShut(triage)} />
            ))}
          </div>
        )}
        <p className="mt-3 text-small text-ink-2">
          Long slot: neutral. Short slot: hot. Round hole: ground. One probe in each of two.
        </p>
      </Rail>
    </StepFrame>
  )
}

/** Step 5, where it may open. */
export function Component() {
  const { triage } = useTriage()
  const instead = insteadOf(5, triage)
  return instead === undefined ? <VoltsStep /> : <Navigate to={instead} replace />
}
