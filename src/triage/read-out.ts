import { dangers } from './dangers.ts'
import { asksMode, modes, sources, twoForty, wirings } from './feeds.ts'
import { noticesToAsk, someVeryBright } from './notices.ts'
import { dangerIds, measuredWell, readVolts } from './triage-state.ts'
import type { Triage } from './triage-state.ts'
import { dangersSaid, leave } from './said-stops.ts'
import type { Here } from './said-stops.ts'

const pairs = [
  ['hn', 'hot to neutral'],
  ['ng', 'neutral to ground'],
  ['hg', 'hot to ground'],
] as const

const sentence = (text: string): string => `${text[0]?.toUpperCase() ?? ''}${text.slice(1)}.`
const labelOf = (list: readonly { value: string; label: string }[], value: string | undefined) =>
  value === undefined || value === 'unsure' ? undefined : list.find((one) => one.value === value)?.label

function feedsWords({ feeds }: Triage): string[] {
  const source = labelOf(sources, feeds.source)
  const words = source === undefined ? [] : [sentence(`${source} feeds it`)]
  const volts = { yes: 'There is 240 V too', no: 'Only 120 V', '230': labelOf(twoForty, '230') }[
    feeds.twoForty ?? ''
  ]
  if (volts !== undefined) words.push(sentence(volts))
  const wiring = labelOf(wirings, feeds.wiring)
  if (wiring !== undefined) words.push(sentence(wiring))
  const mode = asksMode(feeds.source) ? labelOf(modes, feeds.mode) : undefined
  if (mode !== undefined) words.push(sentence(`It was ${mode[0]?.toLowerCase()}${mode.slice(1)}`))
  return words
}

/** What they found, in sentences to read out on the phone: danger first, then what was measured and what feeds it. */
export function readOut(triage: Triage, stops: readonly Here[]): string[] {
  const words = dangersSaid(triage).map(
    (danger) =>
      (
        danger.parts.find((part) => part.id === triage.which[danger.id]) ??
        (danger.parts.length === 1 ? danger.parts[0] : undefined)
      )?.said ?? `I said yes to: ${danger.question}`,
  )
  const where = triage.where.trim() === '' ? '' : ` at ${triage.where.trim()}`
  const lamps = pairs.flatMap(([pair, said]) => {
    const lamp = triage.lamps[pair]
    return lamp === undefined ? [] : [`${said} ${lamp}`]
  })
  if (lamps.length > 0) words.push(`Tester${where}: ${lamps.join(', ')}.`)
  const volts = measuredWell(triage)
    ? pairs.flatMap(([pair, said]) => {
        const value = readVolts(triage.volts[pair])
        return value === undefined ? [] : [`${said} ${value} volts`]
      })
    : []
  if (volts.length > 0) words.push(`Meter${where}: ${volts.join(', ')}.`)
  if (lamps.length === 0 && volts.length === 0 && where !== '') words.push(`It is${where}.`)
  for (const notice of noticesToAsk(triage.notices)) {
    const value = triage.notices[notice.finding]
    const way = notice.ways.find((one) => one.value === value)
    if (way !== undefined && value !== someVeryBright) words.push(way.said)
  }
  words.push(...feedsWords(triage))
  if (dangerIds.every((id) => triage.dangers[id] === 'no'))
    words.push('I answered no to all eight questions about danger.')
  if (triage.madeOff === true) words.push(leave(stops) ? 'Everyone is out.' : 'I have switched it off.')
  return words
}

/** How many of step 1's questions still want an answer. */
export const openQuestions = (triage: Triage): number =>
  dangers.filter((danger) => triage.dangers[danger.id] === undefined).length
