/** What in a system can't be: one sentence a fault, with the part and the field it belongs beside. */
import { feedsOf, gauges, isPower, millimeters, mostSources } from './system.ts'
import type { Feed, Part, PowerPart, System } from './system.ts'
import { wiringOf } from './wiring.ts'

/** `field` is a key of the part; of a switch's inputs with their number: `inputs.1`. */
export type Fault = { part: string; field: string; says: string }

/** What may feed something: everything but the receptacle-less rods and wires; a receptacle feeds what is plugged in. */
const isReached = (parts: ReadonlyMap<string, PowerPart>, from: string, target: string): boolean => {
  const seen = new Set<string>()
  const ahead = [from]
  for (let at = ahead.pop(); at !== undefined; at = ahead.pop()) {
    if (at === target) return true
    if (seen.has(at)) continue
    seen.add(at)
    const part = parts.get(at)
    if (part !== undefined) ahead.push(...feedsOf(part).map(({ feed }) => feed.from))
  }
  return false
}

function feedFaults(part: PowerPart, feed: Feed, field: string, system: System, parts: Parts): Fault[] {
  const at = (says: string): Fault[] => [{ part: part.id, field, says }]
  const from = parts.get(feed.from)
  if (from === undefined) return at('Choose what it is fed from.')
  if (isReached(parts, feed.from, part.id)) return at(`${from.name} is fed from ${part.name} already.`)
  if (from.kind === 'source' && from.volts === '240' && feed.neutral)
    return at(`${from.name} has two hots and no neutral to run.`)
  return runFaults(part, feed.run, field, system)
}
type Parts = ReadonlyMap<string, PowerPart>

function runFaults(part: Part, run: Feed['run'], field: string, { units }: System): Fault[] {
  if (run === undefined) return []
  const sizes: readonly string[] = units === 'us' ? gauges : millimeters
  return sizes.includes(run.neutral) && sizes.includes(run.ground)
    ? []
    : [{ part: part.id, field, says: `Choose wire sizes in ${units === 'us' ? 'AWG' : 'mm²'}.` }]
}

function powerFaults(part: PowerPart, system: System, parts: Parts): Fault[] {
  const at = (field: string, says: string): Fault => ({ part: part.id, field, says })
  const found = feedsOf(part).flatMap(({ feed, input }) =>
    feedFaults(part, feed, part.kind === 'switch' ? `inputs.${input}` : 'feed', system, parts),
  )
  if (part.kind === 'switch') {
    const from = part.inputs.map((input) => input.from)
    from.forEach((id, i) => {
      if (from.indexOf(id) < i) found.push(at(`inputs.${i}`, 'Two inputs come from one part.'))
    })
    const inverter = part.inverter === undefined ? undefined : parts.get(part.inverter)
    if (part.operated === 'built-in' && (inverter?.kind !== 'source' || !from.includes(inverter.id)))
      found.push(at('inverter', 'Choose the inverter it is built into; its own output is one of the inputs.'))
    else if (
      part.operated === 'built-in' &&
      wiringOf(system).builtIn(part.inverter ?? '')?.switch.id !== part.id
    )
      found.push(at('inverter', `${inverter?.name ?? ''} has a transfer switch inside already.`))
  }
  if (part.kind === 'source' && part.parallel !== undefined) {
    const other = parts.get(part.parallel.with)
    if (other?.kind !== 'source' || other.id === part.id)
      found.push(at('parallel', 'Choose the other source.'))
    else if (other.volts !== part.volts)
      found.push(at('parallel', `${other.name} gives other volts: write the volts of both together.`))
  }
  if (part.kind === 'source' && part.volts === '240' && (part.output === 'bonded' || part.output === 'relay'))
    if (part.output === 'bonded' || part.relay.length > 0)
      found.push(at('output', 'Two hots without a neutral have nothing to bond.'))
  if (
    part.kind === 'receptacle' &&
    part.neutralAt !== undefined &&
    parts.get(part.neutralAt)?.kind !== 'panel'
  )
    found.push(at('neutralAt', 'Choose the panel its neutral lands in.'))
  return found
}

/** Everything that can't be; empty for a system that can. */
export function checkSystem(system: System): Fault[] {
  const parts: Parts = new Map(system.parts.filter(isPower).map((part) => [part.id, part]))
  const found: Fault[] = []
  const named = new Map<string, string>()
  const ids = new Set<string>()
  for (const part of system.parts) {
    const says = named.get(part.name.toLowerCase())
    if (says !== undefined) found.push({ part: part.id, field: 'name', says: 'Another part has this name.' })
    named.set(part.name.toLowerCase(), part.id)
    if (ids.has(part.id)) found.push({ part: part.id, field: 'id', says: 'Another part has this id.' })
    ids.add(part.id)
    if (isPower(part)) found.push(...powerFaults(part, system, parts))
    else if (part.kind === 'rod') {
      if (!parts.has(part.at))
        found.push({ part: part.id, field: 'at', says: 'Choose the part it is tied to.' })
    } else {
      for (const end of ['from', 'to'] as const)
        if (!parts.has(part[end])) found.push({ part: part.id, field: end, says: 'Choose a part.' })
      if (part.from === part.to)
        found.push({ part: part.id, field: 'to', says: 'It runs between two different parts.' })
      found.push(...runFaults(part, part.run, 'run', system))
    }
  }
  const sources = system.parts.filter(({ kind }) => kind === 'source')
  for (const extra of sources.slice(mostSources))
    found.push({ part: extra.id, field: 'kind', says: `Up to ${mostSources} sources.` })
  return found
}
