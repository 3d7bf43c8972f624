import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { glyphOf, glyphSize } from '../../rules/triangle/glyph.ts'
import { onTheWay } from '../../rules/triangle/landing.ts'
import { layOut, sideAt } from '../../rules/triangle/layout.ts'
import type { Scene } from '../../rules/triangle/scene.ts'
import { seat } from '../../rules/triangle/seat.ts'
import type { Readings } from '../../rules/triangle/sides.ts'
import { spoken, verdictOf } from '../../rules/triangle/verdict.ts'
import { bulbWeight, meterWeight, ohmsInWords } from '../../rules/triangle/weight.ts'

const on = (hn?: number, ng?: number, hg?: number, nominal = 120): Readings => ({ hn, ng, hg, nominal })
const frame = { width: 400, height: 236 }
const draw = (readings: Readings) => layOut(readings, frame)

const nodeOf = (scene: Scene, corner: string) => scene.nodes.find((node) => node.corner === corner)
const sideOf = (scene: Scene, side: string) => scene.sides.find((s) => s.side === side && s.look !== 'dotted')
const long = (scene: Scene, side: string) => {
  const [a, b] = sideOf(scene, side)?.line ?? [
    [0, 0],
    [0, 0],
  ]
  return Math.hypot(b[0] - a[0], b[1] - a[1])
}

describe('the drawing', () => {
  it('keeps N left, H right, G below', () => {
    const scene = draw(on(120, 77, 92))
    const [n, h, g] = [nodeOf(scene, 'N'), nodeOf(scene, 'H'), nodeOf(scene, 'G')]
    expect(n?.at[0]).toBeLessThan(h?.at[0] ?? 0)
    expect(g?.at[1]).toBeGreaterThan(n?.at[1] ?? Infinity)
  })

  it('draws the cords to the rail’s scale', () => {
    const scene = draw(on(120, 77, 92))
    expect(long(scene, 'ng') / long(scene, 'hn')).toBeCloseTo(77 / 120, 6)
    expect(long(scene, 'hg') / long(scene, 'hn')).toBeCloseTo(92 / 120, 6)
  })

  it('leaves the gap open, hatches it and drops a dashed lamp between', () => {
    const scene = draw(on(119.6, 56.8, 57.2))
    expect(nodeOf(scene, 'G')?.loose).toBe(true)
    expect(scene.hatched?.length).toBeGreaterThan(8)
    expect(scene.gap?.text).toBe('5.6 V missing')
    const [left, right] = [sideOf(scene, 'ng')?.line[1][0] ?? 0, sideOf(scene, 'hg')?.line[1][0] ?? 0]
    expect((right - left) / long(scene, 'hn')).toBeCloseTo(5.6 / 119.6, 6)
  })

  it('dashes neutral inside the rail’s gap when neutral is untied', () => {
    const scene = draw(on(14, 31, 120))
    expect(nodeOf(scene, 'N')?.loose).toBe(true)
    expect(nodeOf(scene, 'H')?.loose).toBe(false)
    expect(scene.around).toBeDefined()
    const mirrored = draw(on(14, 120, 31))
    expect(nodeOf(mirrored, 'H')?.loose).toBe(true)
  })

  it('draws the half circle only below the line', () => {
    expect(draw(on(120, 77, 92)).swings).toHaveLength(1)
    expect(draw(on(120, 59.8, 59.9)).swings).toHaveLength(0)
  })

  it('dots the rail while hot–neutral is missing, and draws the arc of one reading', () => {
    expect(draw(on()).sides[0]?.look).toBe('dotted')
    expect(draw(on(undefined, 58, 60)).sides[0]?.look).toBe('dotted')
    const arc = draw(on(119.6, 57))
    expect(arc.loci).toHaveLength(1)
    expect(nodeOf(arc, 'G')).toBeUndefined()
  })

  it('marks the system’s voltage on a rail far too long', () => {
    expect(draw(on(240, 120, 120)).tick).toMatchObject({ text: '120 V' })
    expect(draw(on(125, 1, 124)).tick).toBeUndefined()
    expect(draw(on(240, 120, 120, 230)).tick).toBeUndefined()
  })

  it('writes volts on the sides only where the picture is shown, and draws what lay under another meter', () => {
    expect(draw(on(119.6, 59.8, 59.9)).lengths).toHaveLength(0)
    const shown = layOut(on(119.6, 59.8, 59.9), { width: 340, height: 196, lengths: true })
    expect(shown.lengths.map((l) => l.text)).toEqual(['119.6 V', '59.8', '59.9'])
    const behind = layOut(on(119.6, 7.4, 7.5), { ...frame, behind: { ng: 56.8, hg: 57.2 } }).behind
    expect(behind?.cords).toHaveLength(2)
  })

  it('keeps every point finite and inside the frame, whatever is read', () => {
    const maybe = fc.option(fc.double({ min: 0, max: 600, noNaN: true }), { nil: undefined })
    fc.assert(
      fc.property(maybe, maybe, maybe, fc.constantFrom(120, 230), (hn, ng, hg, nominal) => {
        const scene = draw(on(hn, ng, hg, nominal))
        const points = [
          ...scene.nodes.map((n) => n.at),
          ...scene.sides.flatMap((s) => [...s.line]),
          ...scene.loci.flat(),
          ...(scene.hatched ?? []),
          ...scene.swings.flat(),
        ]
        for (const [x, y] of points) {
          expect(x).toBeGreaterThanOrEqual(-1)
          expect(x).toBeLessThanOrEqual(frame.width + 1)
          expect(y).toBeGreaterThanOrEqual(-1)
          expect(y).toBeLessThanOrEqual(frame.height + 1)
        }
      }),
    )
  })

  it('chooses the side nearest to a tap, and none further than 24 px off', () => {
    const scene = draw(on(119.6, 56.8, 57.2))
    expect(sideAt(scene, [200, 38])).toBe('hn')
    expect(sideAt(scene, [90, 78])).toBe('ng')
    expect(sideAt(scene, [320, 78])).toBe('hg')
    expect(sideAt(scene, [200, 230])).toBeUndefined()
  })
})

describe('the list glyph', () => {
  it('stays inside 44 × 30 for any readings', () => {
    const amount = fc.double({ min: 0, max: 500, noNaN: true })
    fc.assert(
      fc.property(amount, amount, amount, (hn, ng, hg) => {
        const glyph = glyphOf(on(hn, ng, hg))
        for (const [x, y] of [glyph.neutral, glyph.hot, ...(glyph.ground ? [glyph.ground.at] : [])]) {
          expect(x).toBeGreaterThanOrEqual(0)
          expect(x).toBeLessThanOrEqual(glyphSize.width)
          expect(y).toBeGreaterThanOrEqual(0)
          expect(y).toBeLessThanOrEqual(glyphSize.height)
        }
      }),
    )
  })
  it('is faint with nothing to show, dashed when ground is untied', () => {
    expect(glyphOf(on()).faint).toBe(true)
    expect(glyphOf(on(119.6, 56.8, 57.2)).ground?.loose).toBe(true)
    expect(glyphOf(on(120, 0.2, 119.9)).ground?.loose).toBe(false)
  })
})

describe('what is said of it', () => {
  const verdict = (readings: Readings, weight = meterWeight(10_000_000)) =>
    verdictOf(seat(readings), readings, weight)

  it('calls nothing firm from a picture that closes under a light meter', () => {
    expect(verdict(on(119.6, 59.8, 59.9)).open).toMatch(/still open/)
    expect(verdict(on(119.6, 59.8, 59.9), meterWeight(3000)).open).toBe('')
  })
  it('says of the test bulb on neutral that the bulb may be the only bond', () => {
    expect(verdict(on(119.6, 0.3, 119.2), bulbWeight).open).toMatch(/only bond/)
  })
  it('leads with halfway only where it is', () => {
    expect(verdict(on(119.6, 56.8, 57.2)).lead).toBe('About halfway, untied.')
    expect(verdict(on(119.6, 20, 70)).lead).toBe('Ground is untied here.')
  })
  it('never says that something is safe, and never names a bond from a picture', () => {
    const maybe = fc.option(fc.double({ min: 0, max: 300, noNaN: true }), { nil: undefined })
    fc.assert(
      fc.property(maybe, maybe, maybe, fc.constantFrom(10_000_000, 3000), (hn, ng, hg, ohms) => {
        const words = Object.values(verdict(on(hn, ng, hg), meterWeight(ohms))).join(' ')
        expect(words).not.toMatch(/\bsafe\b|install|bonded/i)
      }),
    )
  })
  it('spells the readings for a reader', () => {
    const readings = on(119.6, 56.8)
    expect(spoken(readings, seat(readings))).toBe(
      'hot to neutral 119.6 volts, neutral to ground 56.8 volts, hot to ground not taken. One more reading.',
    )
  })
  it('names resistances as meters print them', () => {
    expect([10_000_000, 1_000_000, 400_000, 3000, 250].map(ohmsInWords)).toEqual([
      '10 MΩ',
      '1 MΩ',
      '400 kΩ',
      '3 kΩ',
      '250 Ω',
    ])
  })
})

describe('on the way from one drawing to the next', () => {
  it('begins below and ends exactly where the drawing is', () => {
    const [from, to] = [draw(on(119.6, 57)), draw(on(119.6, 56.8, 57.2))]
    expect(onTheWay(from, to, 1)).toBe(to)
    const begun = onTheWay(from, to, 0)
    expect(sideOf(begun, 'ng')?.line[1][1]).toBeGreaterThan(sideOf(to, 'ng')?.line[1][1] ?? Infinity)
    expect(begun.gap).toBeUndefined()
  })
  it('swings cords without stretching them', () => {
    const to = draw(on(120, 77, 92))
    for (const part of [0, 0.3, 0.8])
      expect(long(onTheWay(draw(on(120)), to, part), 'ng')).toBeCloseTo(long(to, 'ng'), 6)
  })
  it('slides between drawings that are alike', () => {
    const [from, to] = [draw(on(120, 0.2, 119.9)), draw(on(120, 60, 60))]
    const [a, b] = [nodeOf(from, 'G')?.at[0] ?? 0, nodeOf(to, 'G')?.at[0] ?? 0]
    expect(nodeOf(onTheWay(from, to, 0.5), 'G')?.at[0]).toBeCloseTo((a + b) / 2, 6)
  })
})
