import fc from 'fast-check'
import { describe, expect, test } from 'vitest'
import { arrangements } from '../../../rules/bond-audit/arrangements.ts'
import { auditSystem } from '../../../rules/bond-audit/audit.ts'
import {
  groundBetween,
  inOrder,
  ladderOf,
  ladderWords,
  neutralBetween,
} from '../../../rules/bond-audit/ladder.ts'
import { nameLines, oneLineOf, oneLineWords } from '../../../rules/bond-audit/one-line.ts'
import type { OneLine } from '../../../rules/bond-audit/one-line.ts'
import { isPower } from '../../../rules/bond-audit/system.ts'
import { anySystem } from './any-system.ts'

const modeOf = (id: string, name: string) => {
  const start = arrangements.find((one) => one.id === id)
  const mode = start && auditSystem(start.system).modes.find((one) => one.name === name)
  if (mode === undefined) throw new Error(`no ${name} in ${id}`)
  return mode
}

describe('the ladder', () => {
  test('parts stand in the order power takes, each source just before what it feeds', () => {
    const start = arrangements.find(({ id }) => id === 'three-sources')
    expect(start && inOrder(start.system).map(({ name }) => name)).toEqual([
      'Utility',
      'Main panel',
      'Standby generator',
      'Transfer switch',
      'Inverter',
      'Inverter transfer',
      'Backed-up panel',
    ])
  })

  test('a bond that is cut off is a dotted rung, and its neutral is cut off', () => {
    expect(
      ladderOf(modeOf('three-sources', 'On battery')).map(({ name, inCircuit, rung }) => [
        name,
        inCircuit,
        rung,
      ]),
    ).toEqual([
      ['Utility', false, 'none'],
      ['Main panel', false, 'cut'],
      ['Standby generator', false, 'cut'],
      ['Inverter', true, 'in'],
      ['Backed-up panel', true, 'none'],
    ])
  })

  test('an old feeder without a grounding conductor has a gap in the ground rail, none in neutral', () => {
    const posts = ladderOf(modeOf('old-outbuilding', 'On utility'))
    expect(posts.map(({ rung }) => rung)).toEqual(['none', 'in', 'excepted'])
    expect([groundBetween(posts, 0), groundBetween(posts, 1)]).toEqual([true, false])
    expect([neutralBetween(posts, 0), neutralBetween(posts, 1)]).toEqual([true, true])
  })

  test('in words', () => {
    expect(ladderWords(ladderOf(modeOf('subpanel', 'On utility')))).toBe(
      'Utility: neutral in circuit, no bond; Main panel: neutral in circuit, a bond in circuit; Garage panel: neutral in circuit, a bond in circuit',
    )
  })
})

/** Whether a straight stretch of a line runs through a box it does not end at. */
function crossings({ boxes, wires, box }: OneLine): string[] {
  const found: string[] = []
  for (const { key, points } of wires)
    points.slice(1).forEach((to, i) => {
      const from = points[i] ?? to
      for (const one of boxes) {
        // Ends lie in the middle of their boxes; a hair inside the edge counts as through.
        const ends = [points[0], points.at(-1)].some((end) => end?.[0] === one.x && end[1] === one.y)
        const overX =
          Math.max(from[0], to[0]) > one.x - box.width / 2 && Math.min(from[0], to[0]) < one.x + box.width / 2
        const overY =
          Math.max(from[1], to[1]) > one.y - box.height / 2 &&
          Math.min(from[1], to[1]) < one.y + box.height / 2
        if (!ends && overX && overY) found.push(`${key} through ${one.id}`)
      }
    })
  return found
}

describe('the one-line picture', () => {
  test.each(['lying', 'standing'] as const)(
    '%s: every part once, none over another, no line through one',
    (way) => {
      fc.assert(
        fc.property(anySystem, (system) => {
          const [mode] = auditSystem(system).modes
          fc.pre(mode !== undefined)
          if (mode === undefined) return
          const picture = oneLineOf(mode, way, 358)
          expect(picture.boxes.map(({ id }) => id).sort()).toEqual(
            system.parts
              .filter(isPower)
              .map(({ id }) => id)
              .sort(),
          )
          picture.boxes.forEach((a, i) =>
            picture.boxes.slice(i + 1).forEach((b) => {
              const apart =
                Math.abs(a.x - b.x) >= picture.box.width || Math.abs(a.y - b.y) >= picture.box.height
              expect({ a: a.id, b: b.id, apart }).toEqual({ a: a.id, b: b.id, apart: true })
            }),
          )
          expect(crossings(picture)).toEqual([])
          for (const { x, y } of picture.boxes) {
            expect(x + picture.box.width / 2).toBeLessThanOrEqual(picture.width)
            expect(y + picture.box.height / 2).toBeLessThanOrEqual(picture.height)
          }
        }),
        { numRuns: 150 },
      )
    },
  )

  test('live, cut off and marked are drawn as the mode has them', () => {
    const mode = modeOf('inlet-generator', 'On generator')
    const picture = oneLineOf(mode, 'lying', 700)
    expect(picture.boxes.map(({ name, live, marked, bond }) => [name, live, marked, bond])).toEqual([
      ['Utility', false, false, 'none'],
      ['Generator', true, true, 'in'],
      ['Interlocked breakers', true, false, 'none'],
      ['Main panel', true, false, 'in'],
    ])
    expect(Object.fromEntries(picture.wires.map(({ key, look }) => [key, look]))).toEqual({
      'interlock#0': 'dead',
      'interlock#1': 'live',
      'main-panel': 'live',
    })
    expect(oneLineWords(mode.circuit.wiring.system, picture)).toBe(
      'Portable generator on an inlet. Live: Generator, Interlocked breakers, Main panel. Marked: Generator.',
    )
  })

  test('names break between words, and are cut when they must be', () => {
    expect(nameLines('Interlocked breakers', 13)).toEqual(['Interlocked', 'breakers'])
    expect(nameLines('Panel', 13)).toEqual(['Panel'])
    expect(nameLines('Panel of the old milking barn', 13)).toEqual(['Panel of the', 'old milking …'])
  })
})
