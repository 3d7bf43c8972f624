import type { Edition } from '../edition/open.ts'
import type { Facts } from '../findings/facts.ts'
import { overLimitOhms } from '../findings/sheet.ts'
import type { ReadyRule } from './engine.ts'

const short = (x: number) => (x >= 100 ? String(Math.round(x)) : String(Math.round(x * 10) / 10))

/** A finding in words: "Hot–ground 57.2 V", "Tester lamp H–G dim". */
function inWords(edition: Edition, id: string, value: string | number): string {
  const reading = edition.readings.get(id)
  if (reading !== undefined && typeof value === 'number') {
    const over = (reading.unit === 'Ω' || reading.unit === 'MΩ') && value >= overLimitOhms
    return `${reading.label} ${over ? 'over limit' : `${short(value)} ${reading.unit}`}`
  }
  const observation = edition.observations.get(id)
  const label = observation?.values.find((v) => v.id === value)?.label ?? String(value)
  return `${observation?.label ?? id}: ${label.toLowerCase()}`
}

/** The findings behind a rule that fired, in words. */
export function numbersBehind(edition: Edition, facts: Facts, rule: ReadyRule): string {
  const ids = new Set(rule.facts.flatMap((name) => facts.get(name)?.from ?? []))
  return [...ids]
    .flatMap((id) => {
      const fact = facts.get(id)
      return fact === undefined ? [] : inWords(edition, id, fact.value)
    })
    .join(', ')
}
