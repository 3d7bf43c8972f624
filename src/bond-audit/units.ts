import type { Feed, Part, Run, System } from '../../rules/bond-audit/system.ts'

/** Nearest sizes by the metal's cross-section: NEC chapter 9 table 8 (circular mils), 1 mm² = 1973.5 circular mils. */
const pairs: readonly (readonly [string, string])[] = [
  ['14', '2.5'],
  ['12', '4'],
  ['10', '6'],
  ['8', '10'],
  ['6', '16'],
  ['4', '25'],
]
const metersPerFoot = 0.3048

const sizeIn = (size: string, units: System['units']): string => {
  const [from, to] = units === 'us' ? [1, 0] : [0, 1]
  const pair = pairs.find((one) => one[from] === size)
  // Beyond the table the largest there is; under it the smallest.
  return pair?.[to] ?? (units === 'us' ? '14' : '25')
}

const runIn = (run: Run, units: System['units']): Run => {
  const length = units === 'us' ? run.length / metersPerFoot : run.length * metersPerFoot
  return {
    ...run,
    length: Math.min(5000, Math.round(length * 10) / 10),
    neutral: sizeIn(run.neutral, units),
    ground: sizeIn(run.ground, units),
  }
}

/** The same system in other units: lengths converted, wires of the nearest size. */
export function inUnits(system: System, units: System['units']): System {
  const feedIn = (feed: Feed): Feed =>
    feed.run === undefined ? feed : { ...feed, run: runIn(feed.run, units) }
  return {
    ...system,
    units,
    parts: system.parts.map((part): Part => {
      if (part.kind === 'switch') return { ...part, inputs: part.inputs.map(feedIn) }
      if (part.kind === 'ground-wire')
        return part.run === undefined ? part : { ...part, run: runIn(part.run, units) }
      return 'feed' in part ? { ...part, feed: feedIn(part.feed) } : part
    }),
  }
}
