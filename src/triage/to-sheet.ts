import type { RawFinding, RawSheet } from '../../rules/findings/sheet.ts'
import { dangers } from './dangers.ts'
import { assume } from './feeds.ts'
import { noticesToAsk, someVeryBright } from './notices.ts'
import { measuredWell, readVolts } from './triage-state.ts'
import type { Triage } from './triage-state.ts'

const lampPairs = ['hn', 'ng', 'hg'] as const

/** Findings of step 1. A yes records only the part that was named; the rest of its question stays open. */
function fromDangers(triage: Triage): Record<string, RawFinding> {
  const found: Record<string, RawFinding> = {}
  for (const danger of dangers) {
    const answer = triage.dangers[danger.id]
    if (answer === 'no') Object.assign(found, danger.no)
    if (answer === 'yes') {
      const [only] = danger.parts
      const named = danger.parts.find((part) => part.id === triage.which[danger.id])
      Object.assign(found, (danger.parts.length === 1 ? only : named)?.findings)
    }
  }
  const smells = ['smoke', 'engine', 'battery'] as const
  if (smells.every((id) => triage.dangers[id] === 'no')) found['smell'] = 'none'
  return found
}

/** The answers as a findings sheet: what was left open is not in it. */
export function toSheet(triage: Triage): RawSheet {
  const findings = fromDangers(triage)
  for (const { finding } of noticesToAsk(triage.notices)) {
    const value = triage.notices[finding]
    if (value !== undefined && value !== someVeryBright) findings[finding] ??= value
  }
  for (const pair of lampPairs) {
    const lamp = triage.lamps[pair]
    if (lamp !== undefined) findings[`tester.${pair}-lamp`] = lamp
  }
  if (measuredWell(triage))
    for (const pair of lampPairs) {
      const volts = readVolts(triage.volts[pair])
      if (volts !== undefined) findings[`receptacle.${pair}.volts`] = volts
    }
  return { context: assume(triage.feeds).context, findings }
}
