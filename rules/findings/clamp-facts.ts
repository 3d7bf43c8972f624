import type { Findings, Say } from './facts.ts'

const flows = [
  ['feeder.egc.amps', 'feeder.egc.flow'],
  ['branch.egc.amps', 'branch.egc.flow'],
  ['rod.amps', 'rod.flow'],
] as const

/** Clamp readings: what flows on grounds, what leaks, and whether a circuit's currents match. */
export function clampFacts(f: Findings, say: Say): void {
  for (const [id, fact] of flows) {
    const amps = f.amount(id)
    if (amps !== undefined)
      say(fact, amps < 0.05 ? 'none' : amps < 0.15 ? 'trace' : amps < 0.5 ? 'some' : 'much', [id])
  }
  const leak = f.amount('branch.leakage.milliamps')
  if (leak !== undefined)
    say('leakage.band', leak < 4 ? 'small' : leak < 6 ? 'near' : 'trips', ['branch.leakage.milliamps'])

  const [hot, neutral] = [f.amount('branch.hot.amps'), f.amount('branch.neutral.amps')]
  if (hot !== undefined && neutral !== undefined) {
    const room = Math.max(0.3, 0.1 * Math.max(hot, neutral))
    const word =
      neutral < 0.05 * hot && hot > 0.5
        ? 'none'
        : neutral > hot + room
          ? 'more'
          : neutral < hot - room
            ? 'less'
            : 'same'
    say('neutral.against-hot', word, ['branch.hot.amps', 'branch.neutral.amps'])
  }
  const [breaker, wire] = [f.amount('branch.breaker.amps'), f.amount('branch.wire.amps')]
  const carried = Math.max(hot ?? 0, neutral ?? 0)
  if (hot !== undefined && breaker !== undefined)
    say('load.against-breaker', hot > breaker ? 'over' : 'under', ['branch.hot.amps', 'branch.breaker.amps'])
  if (wire !== undefined && (hot !== undefined || neutral !== undefined))
    say('load.against-wire', carried > wire ? 'over' : 'under', [
      'branch.hot.amps',
      'branch.neutral.amps',
      'branch.wire.amps',
    ])
  if (breaker !== undefined && wire !== undefined)
    say('breaker.against-wire', breaker > wire ? 'too-large' : 'fits', [
      'branch.breaker.amps',
      'branch.wire.amps',
    ])
}
