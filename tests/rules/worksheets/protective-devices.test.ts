/** Bands of breakers and fuses, held to the points that their standards publish. */
import { describe, expect, test } from 'vitest'
import { ampsToOpenWithin, opensAfter } from '../../../rules/worksheets/protective-devices/band.ts'
import { gG, ul248 } from '../../../rules/worksheets/protective-devices/fuses.ts'
import { iec60898 } from '../../../rules/worksheets/protective-devices/iec-60898.ts'
import type { Curve } from '../../../rules/worksheets/protective-devices/iec-60898.ts'
import { ul489 } from '../../../rules/worksheets/protective-devices/ul-489.ts'

describe('UL 489', () => {
  // UL 489: 100 % holds; 135 % within 1 h up to 50 A, 2 h above (from memory); 200 % by rating.
  test.each([
    [20, 20, Infinity],
    [20, 27, 3600],
    [20, 40, 120],
    [15, 30, 120],
    [40, 80, 240],
    [100, 200, 360],
    [100, 135, 7200],
    [125, 250, 480],
    [200, 400, 600],
    [400, 800, 720],
    // NEMA AB 4 field table at 300 %, from memory.
    [20, 60, 50],
    [40, 120, 80],
    [100, 300, 140],
  ])('a %d A breaker at %d A opens within %d s at the latest', (rating, amps, seconds) => {
    expect(opensAfter(ul489(rating), amps).toSeconds).toBeCloseTo(seconds, 6)
  })

  // Common rule of thumb: at ten times its rating a small breaker opens at once (15 A: 150 A).
  test.each([
    [15, 150],
    [20, 200],
    [30, 300],
  ])('a %d A breaker opens at once from %d A', (rating, amps) => {
    expect(opensAfter(ul489(rating), amps).toSeconds).toBeLessThanOrEqual(0.05)
    expect(opensAfter(ul489(rating), amps * 0.99).toSeconds).toBeGreaterThan(1)
    expect(ampsToOpenWithin(ul489(rating), 0.4)).toBeCloseTo(amps, 3)
  })

  test('between holding and opening it promises nothing', () => {
    expect(opensAfter(ul489(20), 24).toSeconds).toBe(Infinity)
    expect(opensAfter(ul489(20), 24).fromSeconds).toBeLessThan(Infinity)
  })
})

describe('IEC 60898-1, table 7', () => {
  test.each([
    // rating, type, amps, soonest at least, latest at most
    [16, 'B', 18.08, Infinity, Infinity],
    [16, 'B', 23.2, 60, 3600],
    [16, 'B', 40.8, 1, 60],
    [40, 'B', 102, 1, 120],
    [16, 'B', 48, 0.1, 45],
    [16, 'B', 80, 0, 0.1],
    [16, 'C', 80, 0.1, 15],
    [16, 'C', 160, 0, 0.1],
    [32, 'D', 320, 0.1, 4],
    [16, 'D', 320, 0, 0.1],
    [40, 'D', 400, 0.1, 8],
  ] as [number, Curve, number, number, number][])(
    '%d A, type %s, at %d A: no sooner than %d s, no later than %d s',
    (rating, type, amps, soonest, latest) => {
      const times = opensAfter(iec60898(rating, type), amps)
      expect(times.fromSeconds).toBeGreaterThanOrEqual(soonest * (1 - 1e-9))
      expect(times.toSeconds).toBeCloseTo(latest, 6)
    },
  )

  // BS 7671:2008 table 41.3, greatest loop impedance at 230 V for 0.4 s: 46/In, 23/In, 11.5/In.
  test.each([
    [6, 'B', 7.67],
    [16, 'B', 2.87],
    [32, 'B', 1.44],
    [16, 'C', 1.44],
    [32, 'C', 0.72],
    [16, 'D', 0.72],
  ] as [number, Curve, number][])(
    '%d A, type %s: a loop of %d Ω at 230 V for 0.4 s',
    (rating, type, ohms) => {
      // The table cuts off the third decimal.
      expect(Math.abs(230 / ampsToOpenWithin(iec60898(rating, type), 0.4) - ohms)).toBeLessThan(0.01)
    },
  )
})

describe('fuses', () => {
  // UL 248: 135 % within 1 h up to 60 A, 200 % within 4 and 6 min. From memory.
  test.each([
    [30, 40.5, 3600],
    [15, 30, 240],
    [30, 60, 240],
    [60, 120, 360],
    [20, 22, Infinity],
  ])('UL 248, %d A at %d A: %d s', (rating, amps, seconds) => {
    expect(opensAfter(ul248(rating), amps).toSeconds).toBeCloseTo(seconds, 6)
  })

  // IEC 60269-1 table 3 (gates of gG) from memory: opens within 5 s, and within 0.1 s.
  test.each([
    [16, 65, 5],
    [16, 150, 0.1],
    [32, 150, 5],
    [32, 350, 0.1],
    [63, 320, 5],
    [63, 820, 0.1],
    [16, 25.6, 3600],
  ])('gG %d A at %d A: %d s', (rating, amps, seconds) => {
    expect(opensAfter(gG(rating), amps).toSeconds).toBeCloseTo(seconds, 6)
  })
})

test.each([
  ul489(20),
  ul489(100),
  iec60898(16, 'B'),
  iec60898(32, 'D'),
  ul248(20),
  gG(16),
  ul489(15, { least: 2, most: 2 }),
])('more current never opens a $name later, and soonest is never after latest', (band) => {
  let before = { fromSeconds: Infinity, toSeconds: Infinity }
  for (let multiple = 0.5; multiple < 60; multiple *= 1.01) {
    const times = opensAfter(band, multiple * band.ratedAmps)
    expect(times.fromSeconds).toBeLessThanOrEqual(before.fromSeconds)
    expect(times.toSeconds).toBeLessThanOrEqual(before.toSeconds)
    expect(times.fromSeconds).toBeLessThanOrEqual(times.toSeconds)
    before = times
  }
})
