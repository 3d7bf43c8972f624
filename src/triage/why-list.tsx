import type { ReactNode } from 'react'
import { Icon } from '../ui/icon.tsx'
import { PairDiscs } from '../ui/pair-discs.tsx'
import { measuredWell, readVolts } from './triage-state.ts'
import type { LampPair, Triage } from './triage-state.ts'
import { dangersSaid } from './said-stops.ts'

const pairs: readonly [LampPair, string][] = [
  ['ng', 'neutral and ground'],
  ['hg', 'hot and ground'],
  ['hn', 'hot and neutral'],
]

/** What they found that bears on the stop: their answers, lamps and volts, each in a line. */
export function WhyList({ triage }: { triage: Triage }) {
  const lines: { key: string; mark: ReactNode; words: ReactNode }[] = dangersSaid(triage).map((danger) => {
    const part = danger.parts.find((one) => one.id === triage.which[danger.id])
    return {
      key: danger.id,
      mark: <Icon name="tick" />,
      words:
        part === undefined ? (
          <>
            <b>You said yes.</b> {danger.question}
          </>
        ) : (
          <>
            <b>{part.label}.</b> You said so
          </>
        ),
    }
  })
  for (const [pair, words] of pairs) {
    const lamp = triage.lamps[pair]
    if (lamp !== undefined)
      lines.push({
        key: `lamp-${pair}`,
        mark: <PairDiscs pair={pair} />,
        words: (
          <>
            <b>Tester lamp {lamp}</b> across {words}
          </>
        ),
      })
    const volts = measuredWell(triage) ? readVolts(triage.volts[pair]) : undefined
    if (volts !== undefined)
      lines.push({
        key: `volts-${pair}`,
        mark: <PairDiscs pair={pair} />,
        words: (
          <>
            <b>{volts} V</b> across {words}
          </>
        ),
      })
  }
  if (lines.length === 0) return null
  return (
    <ul>
      {lines.map(({ key, mark, words }) => (
        <li key={key} className="flex min-h-touch items-center gap-[14px] border-b border-rule py-[6px]">
          <span className="flex w-touch flex-none justify-center" aria-hidden="true">
            {mark}
          </span>
          <span>{words}</span>
        </li>
      ))}
    </ul>
  )
}
