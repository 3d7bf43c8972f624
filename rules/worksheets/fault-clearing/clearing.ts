import { gfciLeastVoltage, gfciLongest, gfciMilliamps } from '../leakage-trip/ul-943.ts'
import { rcdTimes } from '../leakage-trip/iec-61008.ts'
import type { Band } from '../protective-devices/band.ts'
import { opensAfter } from '../protective-devices/band.ts'
import type { Times } from '../written.ts'
import { feedsFor } from './source-limit.ts'
import type { SourceLimit } from './source-limit.ts'

/** The way of a fault from the source's hot terminal back to its neutral, ohms; without the source itself. */
export type FaultPath = {
  /** Hot wire, and the fault's own contact. */
  outOhms: number
  /** From the faulted metal to the source's neutral. */
  backOhms: number
  /** Of that, what lies between the metal and the ground a person stands on: the touch voltage is across it. */
  touchOhms: number
}

type LeakageDevice = 'none' | 'gfci' | 'rcd'

export type Fault = {
  source: SourceLimit
  /** Undefined where neutral meets ground nowhere: then nothing but stray current flows. */
  path: FaultPath | undefined
  breaker: Band
  leakage: LeakageDevice
}

/** What ends the fault. `breaker-or-source`: one of them, not sure which. `perhaps-breaker`: it may, or nothing does. */
type Clears = 'breaker' | 'leakage' | 'source' | 'breaker-or-source' | 'perhaps-breaker' | 'nothing'

export type Clearing = {
  clears: Clears
  /** Whole way, the source included. Infinity without a path. */
  loopOhms: number
  /** Into the fault at first. */
  amps: { least: number; most: number }
  /** Whether the source gives less than the loop would let through: surely, by its band, or not. */
  sourceLimits: 'yes' | 'perhaps' | 'no'
  breaker: Times
  source: Times
  /** Of the GFCI or RCD. */
  leakage: Times
  /** Set where a GFCI is fitted but the fault leaves it too little voltage to be counted on. */
  leakageStarved: boolean
  /** How long the fault lasts. */
  lasts: Times
  /** On the metal meanwhile. */
  touchVolts: { least: number; most: number }
}

const never: Times = { fromSeconds: Infinity, toSeconds: Infinity }

function currents({ source, path }: Fault) {
  if (path === undefined) return { loopOhms: Infinity, least: 0, most: 0, limits: 'no' as const }
  const loopOhms = source.ohms + path.outOhms + path.backOhms
  const byLoop = source.volts / loopOhms
  const [low, high] = source.limitAmps
  const limits = high < byLoop ? 'yes' : low < byLoop ? 'perhaps' : 'no'
  return { loopOhms, least: Math.min(byLoop, low), most: Math.min(byLoop, high), limits } as const
}

/** Soonest with the most current, latest with the least, and with what the source goes on with once it has sagged. */
function breakerTimes({ source, breaker }: Fault, least: number, most: number): Times {
  const soonest = opensAfter(breaker, most).fromSeconds
  const latest = opensAfter(breaker, least).toSeconds
  if (source.thenAmps === 0) return { fromSeconds: soonest, toSeconds: latest }
  const later = (amps: number) => opensAfter(breaker, Math.min(amps, source.thenAmps))
  return {
    fromSeconds: soonest <= feedsFor(source, most).toSeconds ? soonest : later(most).fromSeconds,
    toSeconds:
      latest <= feedsFor(source, least).fromSeconds ? latest : Math.max(latest, later(least).toSeconds),
  }
}

function leakageTimes({ source, path, leakage }: Fault, least: number) {
  if (leakage === 'none' || path === undefined) return { times: never, starved: false }
  if (leakage === 'rcd') return { times: rcdTimes(least * 1000, 30, 'general'), starved: false }
  // What the fault leaves of the voltage at the source's terminals, with the least that the source may give.
  const left = least * (path.outOhms + path.backOhms)
  const starved = left < gfciLeastVoltage * source.volts
  const felt = least * 1000 >= gfciMilliamps.mustFrom
  const times = felt && !starved ? { fromSeconds: 0, toSeconds: gfciLongest(least * 1000) } : never
  return { times, starved: starved && felt }
}

/** Who is surely first, or why that can't be told. */
function first(breaker: Times, source: Times, leakage: Times): Clears {
  // It ends the fault then at the latest, though the source may let go sooner.
  if (leakage.toSeconds < Infinity && leakage.toSeconds <= source.toSeconds)
    return breaker.toSeconds <= leakage.toSeconds ? 'breaker' : 'leakage'
  if (breaker.toSeconds < Infinity && breaker.toSeconds <= source.fromSeconds) return 'breaker'
  if (breaker.fromSeconds >= source.toSeconds) return source.toSeconds === Infinity ? 'nothing' : 'source'
  if (source.toSeconds === Infinity && breaker.toSeconds === Infinity) return 'perhaps-breaker'
  return 'breaker-or-source'
}

const least = (...all: number[]) => Math.min(...all)

/** What a bolted fault from hot to grounded metal does, and what ends it. */
export function clearingOf(fault: Fault): Clearing {
  const { source, path } = fault
  const { loopOhms, limits, ...amps } = currents(fault)
  const breaker = breakerTimes(fault, amps.least, amps.most)
  const stopping = path === undefined ? never : stops(source, amps)
  const { times: leakage, starved } = leakageTimes(fault, amps.least)
  return {
    clears: first(breaker, stopping, leakage),
    loopOhms,
    amps: { least: amps.least, most: amps.most },
    sourceLimits: limits,
    breaker,
    source: stopping,
    leakage,
    leakageStarved: starved,
    lasts: {
      fromSeconds: least(breaker.fromSeconds, stopping.fromSeconds, leakage.fromSeconds),
      toSeconds: least(breaker.toSeconds, stopping.toSeconds, leakage.toSeconds),
    },
    touchVolts:
      path === undefined
        ? { least: source.volts, most: source.volts }
        : { least: amps.least * path.touchOhms, most: amps.most * path.touchOhms },
  }
}

/** When the source lets go of the fault: never where it goes on with less. */
function stops(source: SourceLimit, amps: { least: number; most: number }): Times {
  if (source.thenAmps > 0) return never
  const [slow, fast] = [feedsFor(source, amps.least), feedsFor(source, amps.most)]
  return {
    fromSeconds: least(slow.fromSeconds, fast.fromSeconds),
    toSeconds: Math.max(slow.toSeconds, fast.toSeconds),
  }
}
