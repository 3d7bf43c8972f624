import { expect, test } from 'vitest'
import { standing } from '../../rules/findings/standing.ts'
import type { Entered } from '../../rules/findings/standing.ts'

const entry = (id: string, value: Entered['value'], minute: number, after: string[] = []): Entered => ({
  id,
  mode: 'inverter',
  finding: 'receptacle.hn.volts',
  value,
  after,
  deviceAt: new Date(Date.UTC(2026, 10, 30, 9, minute)).toISOString(),
})
const outcome = (entries: readonly Entered[]) =>
  standing(entries).map(({ entry: one, against }) => [one.id, ...against.map((other) => other.id)])

test('whoever knew the reading before takes its place, whatever the order they come in', () => {
  const [a, b, c] = [entry('a', 119, 1), entry('b', 118, 2, ['a']), entry('c', null, 3, ['b'])]
  expect(outcome([a, b])).toEqual([['b']])
  expect(outcome([c, b, a])).toEqual([['c']])
})

test('two who did not know of each other both stand, the last entered first', () => {
  const entries = [entry('a', 119, 1), entry('c', 57, 3, ['a']), entry('b', 118, 2, ['a'])]
  expect(outcome(entries)).toEqual([['c', 'b']])
  expect(outcome([...entries, entry('d', 57, 4, ['b', 'c'])])).toEqual([['d']])
})

test('the same reading twice contradicts nothing, in whatever order its parts are written', () => {
  expect(
    outcome([entry('a', { value: 57, meterOhms: 3000 }, 1), entry('b', { meterOhms: 3000, value: 57 }, 2)]),
  ).toEqual([['b']])
})

test('a removal that did not know of a newer reading leaves it standing', () => {
  expect(outcome([entry('a', 119, 1), entry('b', 57, 2, ['a']), entry('c', null, 3, ['a'])])).toEqual([
    ['c', 'b'],
  ])
})

test('what one device calls its last is decided by time, not by the way the moment is written', () => {
  const zoned = { ...entry('a', 119, 0), deviceAt: '2026-11-30T09:00:00Z' }
  const later = { ...entry('b', 57, 0), deviceAt: '2026-11-30T09:00:00.500Z' }
  expect(outcome([zoned, later])).toEqual([['b', 'a']])
})
