import type { Findings, Say } from './facts.ts'

/** Battery systems by nominal volts, with the range that is neither flat nor over; lead and lithium alike. */
const batteries = [
  { nominal: 12, flat: 11.5, over: 15.5 },
  { nominal: 24, flat: 23, over: 31 },
  { nominal: 48, flat: 46, over: 62 },
]

/** Frequency, DC against ground, and the battery. */
export function sourceFacts(f: Findings, say: Say): void {
  const hz = f.amount('source.hz')
  if (hz !== undefined) {
    const off = (hz - f.hertz) / f.hertz
    say('source.hertz', Math.abs(off) <= 0.01 ? 'within' : off > 0 && off <= 0.05 ? 'fast' : 'off', [
      'source.hz',
    ])
  }
  const dc = f.amount('source.ng.volts.dc')
  if (dc !== undefined)
    say('source.ng.dc', dc < 2 ? 'none' : dc < 12 ? 'some' : 'much', ['source.ng.volts.dc'])
  const volts = f.amount('source.dc.volts')
  if (volts !== undefined) {
    // The nominal whose charged middle lies nearest; a flat 24 V battery is not taken for a full 12 V one below 16 V.
    const near = batteries.reduce((a, b) =>
      Math.abs(volts - b.nominal * 1.08) < Math.abs(volts - a.nominal * 1.08) ? b : a,
    )
    say('battery.state', volts < near.flat ? 'flat' : volts > near.over ? 'over' : 'charged', [
      'source.dc.volts',
    ])
  }
}
