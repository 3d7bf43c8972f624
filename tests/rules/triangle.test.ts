import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { seat, tolerance } from '../../rules/triangle/seat.ts'
import type { Seat } from '../../rules/triangle/seat.ts'
import type { Readings } from '../../rules/triangle/sides.ts'

const on = (hn?: number, ng?: number, hg?: number, nominal = 120): Readings => ({ hn, ng, hg, nominal })

/** Every case of the design's table: what is read, what kind it is, the numbers that matter, the words. */
const table: readonly [name: string, Readings, Partial<Seat>][] = [
  [
    'bonded',
    on(120, 0.2, 119.9),
    { kind: 'closed', at: 'neutral', taut: true, say: 'Ground sits on neutral.' },
  ],
  [
    'swapped',
    on(120, 119.8, 0.3),
    {
      kind: 'closed',
      at: 'hot',
      say: 'Ground sits on hot: hot and neutral are swapped, here or before here.',
    },
  ],
  [
    'halfway',
    on(119.6, 59.8, 59.9),
    {
      kind: 'closed',
      at: 'middle',
      taut: true,
      say: 'Ground sits halfway, and stays there against this meter.',
    },
  ],
  [
    'floating',
    on(119.6, 56.8, 57.2),
    {
      kind: 'gap',
      corner: 'G',
      nowhere: false,
      say: 'The ground readings fall 5.6 V short of hot–neutral: this meter pulls ground down.',
    },
  ],
  [
    'floating, low-impedance range',
    on(119.6, 7.4, 7.5),
    {
      kind: 'gap',
      corner: 'G',
      nowhere: false,
      say: 'The ground readings fall 105 V short of hot–neutral: this meter pulls ground down.',
    },
  ],
  [
    'open ground',
    on(119.6, 0.8, 1.4),
    { kind: 'gap', corner: 'G', nowhere: true, say: 'Ground sits nowhere.' },
  ],
  ['open ground, long dead wire', on(120, 59.5, 59.5), { kind: 'closed', at: 'middle' }],
  [
    'off the line',
    on(120, 77, 92),
    {
      kind: 'closed',
      at: 'off-line',
      driven: false,
      say: 'A wire ties it on one side, stray capacitance on the other.',
    },
  ],
  [
    'driven',
    on(120, 104, 118),
    { kind: 'closed', at: 'off-line', driven: true, say: 'Something else drives it.' },
  ],
  [
    'hot–neutral near zero',
    on(0.6, 120, 119.8),
    { kind: 'needle', say: 'Hot and neutral read the same; ground stands 120 V away.' },
  ],
  [
    'neutral untied',
    on(14, 31, 120),
    { kind: 'gap', corner: 'N', gap: 75, say: 'Neutral is tied to nothing here.' },
  ],
  ['hot untied', on(31, 120, 14), { kind: 'gap', corner: 'H', gap: 75, say: 'Hot is tied to nothing here.' }],
  ['one missing', on(119.6, 57), { kind: 'arc', about: 'N', missing: ['hg'], say: 'One more reading.' }],
  ['the other missing', on(119.6, undefined, 57), { kind: 'arc', about: 'H', missing: ['ng'] }],
  [
    'hot–neutral missing',
    on(undefined, 58, 60),
    { kind: 'part', missing: ['hn'], say: 'Hot–neutral still to take; drawn on 120 V for now.' },
  ],
  ['two missing', on(119.6), { kind: 'part', missing: ['ng', 'hg'], say: 'Two more readings.' }],
  ['all dead', on(0.4, 0.1, 0.2), { kind: 'dead', say: 'Dead, or a wire is open: prove your meter.' }],
  ['none', on(), { kind: 'empty', say: 'Tap a side, type the volts.' }],
  ['two hots', on(240, 120, 120), { kind: 'closed', at: 'middle' }],
  [
    '230 V, a third of the way',
    on(230, 78, 152, 230),
    { kind: 'closed', at: 'between', say: 'Ground sits 34 % of the way from neutral to hot.' },
  ],
  [
    '230 V, hot–neutral missing',
    on(undefined, 114, 115, 230),
    { kind: 'part', say: 'Hot–neutral still to take; drawn on 230 V for now.' },
  ],
  ['230 V, dead below 4 % of it', on(9, 0.1, 9, 230), { kind: 'dead' }],
  ['120 V, alive above 4 % of it', on(9, 0.1, 9), { kind: 'closed', at: 'neutral' }],
]

describe('where ground sits', () => {
  it.each(table)('%s', (_, readings, expected) => {
    expect(seat(readings)).toMatchObject(expected)
  })

  it('measures the gap as what is missing to hot–neutral', () => {
    expect(seat(on(119.6, 56.8, 57.2))).toMatchObject({ gap: expect.closeTo(5.6, 9) })
    expect(seat(on(119.6, 7.4, 7.5))).toMatchObject({ gap: expect.closeTo(104.7, 9) })
  })

  it('puts ground below the rail where the sides close off the line', () => {
    // By hand: x = (120² + 77² − 92²) / 240 = 49.4375, y = √(77² − x²) = 59.04
    expect(seat(on(120, 77, 92))).toMatchObject({
      x: expect.closeTo(49.4375, 6),
      y: expect.closeTo(59.03, 1),
    })
  })

  it('does not hang ground over the rail when it lies past an end of it', () => {
    const s = seat(on(14, 120, 106))
    expect(s).toMatchObject({ kind: 'closed', taut: false, driven: true, x: expect.closeTo(120, 6) })
  })

  it('takes a number that can’t be for one that was not taken', () => {
    expect(seat(on(Number.NaN, -4, Infinity)).kind).toBe('empty')
  })
})

const amount = fc.double({ min: 0, max: 400, noNaN: true })
const maybe = fc.option(fc.double({ min: -500, max: 5000 }), { nil: undefined })
const nominal = fc.constantFrom(120, 230)

describe('for any readings', () => {
  it('no number is missing or endless, and something is said', () => {
    fc.assert(
      fc.property(maybe, maybe, maybe, nominal, (hn, ng, hg, volts) => {
        const s = seat(on(hn, ng, hg, volts))
        for (const value of Object.values(s))
          if (typeof value === 'number') expect(Number.isFinite(value)).toBe(true)
        expect(s.say).not.toMatch(/NaN|undefined|Infinity/)
        expect(s.say.length).toBeGreaterThan(5)
      }),
    )
  })

  it('a taut lamp hangs over the rail, and a hanging one is as far from N and H as was read', () => {
    fc.assert(
      fc.property(amount, amount, amount, nominal, (hn, ng, hg, volts) => {
        const s = seat(on(hn, ng, hg, volts))
        if (s.kind !== 'closed') return
        if (s.taut) {
          expect(s.x).toBeGreaterThanOrEqual(0)
          expect(s.x).toBeLessThanOrEqual(hn)
          expect(s.y).toBe(0)
        } else {
          expect(Math.abs(Math.hypot(s.x, s.y) - ng)).toBeLessThanOrEqual(tolerance(Math.max(hn, ng, hg)))
          expect(Math.abs(Math.hypot(hn - s.x, s.y) - hg)).toBeLessThanOrEqual(
            tolerance(Math.max(hn, ng, hg)),
          )
        }
      }),
    )
  })

  it('swapping the ends of the rail mirrors the picture', () => {
    const mirrored = { neutral: 'hot', hot: 'neutral' } as Record<string, string>
    const other = { N: 'H', H: 'N', G: 'G' } as const
    fc.assert(
      fc.property(amount, amount, amount, nominal, (hn, ng, hg, volts) => {
        const [a, b] = [seat(on(hn, ng, hg, volts)), seat(on(hn, hg, ng, volts))]
        expect(b.kind).toBe(a.kind)
        if (a.kind === 'gap' && b.kind === 'gap') {
          // With both ground readings level and longest, either end may be named.
          if (ng !== hg) expect(b.corner).toBe(other[a.corner])
          expect(b.gap).toBeCloseTo(a.gap, 6)
        }
        if (a.kind === 'closed' && b.kind === 'closed') {
          expect(b.x).toBeCloseTo(hn - a.x, 4)
          expect(b.driven).toBe(a.driven)
          // A part of exactly 5, 45 or 95 % may fall to either side by rounding.
          const edge = [0.05, 0.45, 0.55, 0.95].some((e) => Math.abs(a.t - e) < 1e-9)
          if (!edge) expect(b.at).toBe(mirrored[a.at] ?? a.at)
        }
      }),
    )
  })

  it('a gap opens and closes without a jump', () => {
    const gapOf = (s: Seat) => (s.kind === 'gap' || s.kind === 'closed' ? s.gap : undefined)
    fc.assert(
      fc.property(
        amount,
        amount,
        amount,
        fc.double({ min: -0.01, max: 0.01, noNaN: true }),
        (hn, ng, hg, step) => {
          const [a, b] = [gapOf(seat(on(hn, ng, hg))), gapOf(seat(on(hn, Math.max(0, ng + step), hg)))]
          if (a === undefined || b === undefined) return
          expect(Math.abs(a - b)).toBeLessThanOrEqual(Math.abs(step) + 1e-9)
        },
      ),
    )
  })

  it('a gap is said exactly when the two shorter sides miss the longest by more than the tolerance', () => {
    fc.assert(
      fc.property(amount, amount, amount, (hn, ng, hg) => {
        const [least, middle, most] = [hn, ng, hg].sort((x, y) => x - y) as [number, number, number]
        if (most < 0.04 * 120) return
        const misses = most - least - middle
        if (Math.abs(misses - tolerance(most)) < 1e-6) return
        expect(seat(on(hn, ng, hg)).kind === 'gap').toBe(misses > tolerance(most))
      }),
    )
  })
})
