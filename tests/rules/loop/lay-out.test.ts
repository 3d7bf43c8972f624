import { describe, expect, test } from 'vitest'
import type { Lie } from '../../../rules/loop/frame.ts'
import { layOutLoop } from '../../../rules/loop/lay-out.ts'
import { loopOf } from '../../../rules/loop/loop-of.ts'
import { loopDefaults } from '../../../rules/loop/loop-wiring.ts'
import type { LoopScene, Point } from '../../../rules/loop/scene.ts'
import { starter } from '../../edition.ts'
import { abroad, cabin, cords, house, loop } from './loops.ts'

const read = {
  source: ['H–N 120.1 V', 'N–G 58.2 V', 'H–G 57.9 V'],
  panel: ['H–N 119.8 V', 'N–G 57.1 V', 'H–G 57.4 V'],
  receptacle: ['H–N 119.6 V', 'N–G 56.8 V', 'H–G 57.2 V'],
}
const lies: readonly Lie[] = ['lying', 'standing']
const contexts = { cabin, house, cords, abroad }

/** Every scene of every cause that can be drawn, in all contexts and states. */
function* scenes(lie: Lie): Generator<[string, LoopScene]> {
  for (const [name, context] of Object.entries(contexts))
    for (const cause of starter.causeIds)
      for (const state of ['load', 'fault'] as const) {
        const own = loopDefaults(context, cause)
        const drawn = own && loopOf(context, cause, { state, ...own })
        if (drawn !== undefined) yield [`${name} ${cause} ${state}`, layOutLoop(drawn, lie, read)]
      }
}

/** Wide estimate of a text's extent: 14 px Noto Sans, bold. */
const spanOf = ({ at: [x], text, anchor }: LoopScene['texts'][number]): [number, number] => {
  const width = text.length * 7.4
  return anchor === 'start'
    ? [x, x + width]
    : anchor === 'end'
      ? [x - width, x]
      : [x - width / 2, x + width / 2]
}
type Box = { x: number; y: number; width: number; height: number }
const meet = (a: Box, b: Box) =>
  a.x < b.x + b.width && b.x < a.x + a.width && a.y < b.y + b.height && b.y < a.y + a.height

describe.each(lies)('%s', (lie) => {
  test('everything is drawn at finite places inside the picture', () => {
    let count = 0
    for (const [name, scene] of scenes(lie)) {
      count += 1
      const points: Point[] = [
        ...scene.wires.flatMap((wire) => wire.points),
        ...scene.currents.flatMap((current) => current.points),
        ...scene.arrows.map((arrow) => arrow.at),
        ...scene.discs.map((disc) => disc.at),
        ...scene.ties.flatMap((tie) => tie.points),
        ...scene.rods.flatMap((rod) => rod.lead),
        ...(scene.touch ?? []),
        ...(scene.earthPath ?? []),
      ]
      const stray = points.filter(([x, y]) => !(x >= 0 && x <= scene.width && y >= 0 && y <= scene.height))
      expect({ name, stray }).toEqual({ name, stray: [] })
    }
    expect(count).toBeGreaterThan(150)
  })
  test('no text, plate or label reaches over the edge', () => {
    for (const [name, scene] of scenes(lie)) {
      const over = [
        ...scene.texts
          .filter((text) => spanOf(text)[0] < -2 || spanOf(text)[1] > scene.width + 2)
          .map((t) => t.text),
        ...[...scene.plates, ...scene.labels]
          .filter((box) => box.x < 0 || box.x + box.width > scene.width)
          .map((box) => box.x),
        ...scene.plates.filter((plate) => plate.y + plate.height > scene.height).map((plate) => plate.y),
      ]
      expect({ name, over }).toEqual({ name, over: [] })
    }
  })
  test('plates and labels lie clear of one another', () => {
    for (const [name, scene] of scenes(lie)) {
      const boxes: Box[] = [...scene.plates, ...scene.labels]
      const pairs = boxes.flatMap((a, i) =>
        boxes
          .slice(i + 1)
          .filter((b) => meet(a, b))
          .map((b) => [a.x, a.y, b.x, b.y]),
      )
      expect({ name, pairs }).toEqual({ name, pairs: [] })
    }
  })
})

describe.each(lies)('%s', (lie) => {
  test('no plate or label hides what is written elsewhere', () => {
    for (const [name, scene] of scenes(lie)) {
      const boxes: Box[] = [...scene.plates, ...scene.labels]
      const hidden = scene.texts.filter((text) => {
        const [from, to] = spanOf(text)
        const own = { x: from + 2, y: text.at[1] - 9, width: to - from - 4, height: 8 }
        return boxes.some((box) => meet(box, own))
      })
      expect({ name, hidden: hidden.map(({ text }) => text) }).toEqual({ name, hidden: [] })
    }
  })
})

describe('what stands for what', () => {
  test('current is wider the more it is, and never wider than the rows stand apart', () => {
    const faint = layOutLoop(loop('rod-only-return'), 'lying')
    const strong = layOutLoop(loop('sound'), 'lying')
    const widest = (scene: LoopScene) => Math.max(...scene.currents.map(({ wash }) => wash))
    expect(widest(strong)).toBeGreaterThan(widest(faint))
    expect(widest(strong)).toBeLessThanOrEqual(26)
  })
  test('hollow arrows where no current goes round, and a dashed plate where the loop ends', () => {
    const scene = layOutLoop(loop('floating-neutral'), 'lying')
    expect(scene.arrows.length).toBe(4)
    expect(scene.arrows.every(({ hollow }) => hollow)).toBe(true)
    expect(scene.currents).toEqual([])
    expect(scene.plates).toMatchObject([{ look: 'open' }])
    const words = scene.plates[0]!.lines.map(({ text }) => text.replace('\u00a0', ' ')).join(' ')
    expect(words).toBe('No bond: loop ends here 0.2 mA leaks')
  })
  test('filled arrows and amps where it does, out on hot and back on ground', () => {
    const scene = layOutLoop(loop('sound'), 'lying')
    expect(scene.arrows.map(({ degrees, hollow }) => `${degrees} ${hollow}`).sort()).toEqual([
      '0 false',
      '0 false',
      '180 false',
      '180 false',
    ])
    expect(scene.texts.filter(({ look }) => look === 'amps')).toHaveLength(4)
    expect(scene.plates).toEqual([])
  })
  test('live metal is hatched and says so; metal that is cut off at once is not', () => {
    const open = layOutLoop(loop('open-ground'), 'standing')
    expect(open.boxes.map(({ place, live }) => `${place} ${live}`)).toEqual([
      'source false',
      'panel false',
      'receptacle true',
    ])
    expect(open.labels).toMatchObject([{ look: 'live', text: 'LIVE 117 V' }])
    const sound = layOutLoop(loop('sound'), 'standing')
    expect(sound.boxes.some(({ live }) => live)).toBe(false)
    expect(sound.labels.every(({ look }) => look === 'brief')).toBe(true)
  })
  test('current that crosses the ground is drawn from rod to rod', () => {
    expect(layOutLoop(loop('rod-only-return'), 'lying').earthPath).toBeDefined()
    expect(layOutLoop(loop('sound'), 'lying').earthPath).toBeUndefined()
  })
  test('readings stand at the place they were taken', () => {
    const scene = layOutLoop(loop('floating-neutral'), 'lying', { receptacle: read.receptacle })
    expect(scene.texts.map(({ text }) => text)).toContain('read: H–N 119.6 V · N–G 56.8 V · H–G 57.2 V')
  })
})
