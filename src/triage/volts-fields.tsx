import { useEffect, useRef, useState } from 'react'
import { pressPadKey } from '../ui/pad-text.ts'
import type { PadKey } from '../ui/pad-text.ts'
import { pairWords } from '../ui/pair-discs.tsx'
import { ReadingField } from '../ui/reading-field.tsx'
import { readVolts } from './triage-state.ts'
import type { Triage, VoltsPair } from './triage-state.ts'

/** In the order they are taken. */
export const order: readonly VoltsPair[] = ['hn', 'ng', 'hg']

type VoltsFieldsProps = {
  volts: Triage['volts']
  /** Each key: keep what was typed. */
  onType: (pair: VoltsPair, text: string) => void
  /** Left a field, or pressed Done: the moment to see whether it stops. */
  onTaken: () => void
  ownPad: boolean
  nominalVolts: number
  /** Which field the pad types into; undefined closes it. */
  onChosen: (pair: VoltsPair | undefined) => void
  /** Hands the pad's keys down. */
  pad: { current: PadHandle | undefined }
}
export type PadHandle = { key: (key: PadKey) => void; next: () => void; leaveOut: () => void }

const errorOf = (text: string): string | undefined =>
  text.trim() === '' || readVolts(text) !== undefined ? undefined : 'Type a number of volts, such as 119.6.'

/** A point was likely left out; the question stands beneath the field. */
export const asksAgain = (text: string, nominal: number): boolean => slip(text, nominal) !== undefined

/** Beyond two and a half times what the outlet should give, a point was likely left out. */
function slip(text: string, nominal: number): string | undefined {
  const volts = readVolts(text)
  return volts !== undefined && volts > 2.5 * nominal ? String(volts / 10) : undefined
}

/** The three readings at one outlet. What is typed shows at once; the store keeps every key. */
export function VoltsFields({
  volts,
  onType,
  onTaken,
  ownPad,
  nominalVolts,
  onChosen,
  pad,
}: VoltsFieldsProps) {
  const [texts, setTexts] = useState(volts)
  const [chosen, setChosen] = useState<VoltsPair>()
  const inputs = useRef<Partial<Record<VoltsPair, HTMLInputElement | null>>>({})

  const type = (pair: VoltsPair, text: string) => {
    setTexts((now) => ({ ...now, [pair]: text }))
    onType(pair, text)
  }
  const choose = (pair: VoltsPair | undefined) => {
    setChosen(pair)
    onChosen(pair)
    if (pair === undefined && document.activeElement instanceof HTMLElement) document.activeElement.blur()
    if (pair !== undefined) inputs.current[pair]?.focus()
  }
  const goOn = (from: VoltsPair) => {
    onTaken()
    choose(order[order.indexOf(from) + 1])
  }
  useEffect(() => {
    pad.current =
      chosen === undefined
        ? undefined
        : {
            key: (key) => type(chosen, pressPadKey(texts[chosen], key)),
            next: () => goOn(chosen),
            leaveOut: () => {
              type(chosen, '')
              goOn(chosen)
            },
          }
  })
  return (
    <div className="mt-3 grid gap-[10px]">
      {order.map((pair) => {
        const likely = slip(texts[pair], nominalVolts)
        return (
          <ReadingField
            key={pair}
            ref={(input) => {
              inputs.current[pair] = input
            }}
            pair={pair}
            label={pairWords(pair)}
            unit="V"
            text={texts[pair]}
            onText={(text) => type(pair, text)}
            with={
              texts[pair] === ''
                ? 'tap, then type what the meter shows'
                : 'at one outlet, nothing else running'
            }
            error={chosen === pair ? undefined : errorOf(texts[pair])}
            question={
              likely === undefined
                ? undefined
                : {
                    text: `Over ${2.5 * nominalVolts} V on a ${nominalVolts} V outlet.`,
                    answer: `Meant ${likely}?`,
                    onTake: () => type(pair, likely),
                  }
            }
            chosen={chosen === pair}
            ownPad={ownPad}
            onFocus={() => {
              setChosen(pair)
              onChosen(pair)
            }}
            onLeave={onTaken}
            onKeyDown={(event) => {
              if (event.key !== 'Enter') return
              event.preventDefault()
              goOn(pair)
            }}
          />
        )
      })}
    </div>
  )
}
