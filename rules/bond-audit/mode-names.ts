/** A mode in words. */
import type { Live } from './circuit.ts'
import type { Mode } from './modes.ts'
import { listed } from './phrases.ts'
import { way } from './state.ts'
import type { Device, State } from './state.ts'
import type { PowerPart } from './system.ts'
import type { FeedAt, Wiring } from './wiring.ts'

const shortName = (part: PowerPart): string | undefined => {
  if (part.kind !== 'source') return undefined
  switch (part.type) {
    case 'utility':
      return 'On utility'
    case 'inverter':
    case 'power-station':
      return 'On battery'
    case 'portable-generator':
    case 'standby-generator':
      return 'On generator'
  }
}

/** "On battery" where one source alone can be meant by that, else "On" with the names. */
export function liveName(wiring: Wiring, live: readonly Live[]): string {
  const [first] = live
  if (first === undefined) return ''
  if (first.kind === 'transformer') return `Through ${first.name}`
  const short = shortName(first)
  const alike = [...wiring.parts.values()].filter((part) => shortName(part) === short)
  return alike.length === 1 && short !== undefined ? short : `On ${listed(live.map(({ name }) => name))}`
}

/** One device that is another way than at rest: "generator plugged in". */
function otherWay(wiring: Wiring, device: Device, state: State): string {
  const value = way(state, device.key)
  switch (device.kind) {
    case 'relay':
      return `${device.part.name} running too`
    case 'cord': {
      const { feed, to } = device.at
      const from = wiring.parts.get(feed.from)
      const cords = (one: FeedAt) => one.feed.joined === 'cord'
      const several = wiring.feeds.filter((one) => cords(one) && one.feed.from === feed.from).length > 1
      const inputs = wiring.feeds.filter((one) => cords(one) && one.to.id === to.id).length > 1
      if (value === 0) return `${to.name} unplugged${inputs ? ` from ${from?.name ?? feed.from}` : ''}`
      return from?.kind === 'source'
        ? `${from.name} plugged in${several ? ` at ${to.name}` : ''}`
        : `${to.name} plugged in${inputs ? ` at ${from?.name ?? feed.from}` : ''}`
    }
    case 'switch': {
      const input = device.part.inputs[value]?.from ?? ''
      return `${device.part.name} on ${wiring.parts.get(input)?.name ?? input}`
    }
  }
}

/** The mode's name; no two modes of a system that differ in what is found have the same. */
export function modeName({ circuit: { wiring, live, state }, other }: Mode): string {
  const ways = other.map((device) => otherWay(wiring, device, state))
  return [liveName(wiring, live), ...ways].join(', ')
}

/** What its way is: the switches it passes, one after another. Empty where it passes none. */
export function modeDetail({ circuit: { wiring, carrying } }: Mode): string {
  const passed = carrying.flatMap(({ to, feed }) => {
    if (to.kind !== 'switch') return []
    const inverter = to.inverter === undefined ? undefined : wiring.parts.get(to.inverter)
    if (to.operated !== 'built-in' || inverter === undefined)
      return [`${to.name} on ${wiring.parts.get(feed.from)?.name ?? feed.from}`]
    return wiring.group(inverter.id).some(({ id }) => id === feed.from)
      ? [`${inverter.name} on its own power`]
      : [`passing through ${inverter.name}`]
  })
  return passed.join('; ')
}
