import fc from 'fast-check'
import { expect, test } from 'vitest'
import { computeWorksheet, worksheetNames } from '../../../rules/worksheets/worksheets.ts'
import { flat, nested, worksheetAddress } from '../../../rules/worksheets/address.ts'

test('inputs go into an address and come back', () => {
  const address = worksheetAddress('lost-neutral', {
    volts: 120,
    neutral: 'open',
    loads: [
      { leg: '1', watts: 100 },
      { leg: '2', watts: 200.5 },
    ],
  })
  expect(address).toBe(
    '/worksheets/lost-neutral?volts=120&neutral=open&loads.0.leg=1&loads.0.watts=100&loads.1.leg=2&loads.1.watts=200.5',
  )
  const back = nested(Object.fromEntries(new URL(address, 'https://shop.example.test').searchParams))
  expect(back).toEqual({
    volts: '120',
    neutral: 'open',
    loads: [
      { leg: '1', watts: '100' },
      { leg: '2', watts: '200.5' },
    ],
  })
})

test('flat and nested are each other’s way back', () => {
  const word = fc.stringMatching(/^[a-z]{1,6}$/).filter((name) => name !== 'constructor')
  const leaf = fc.stringMatching(/^[a-z0-9]{1,5}$/)
  const row = fc.dictionary(word, leaf, { minKeys: 1, maxKeys: 4 })
  const inputs = fc.dictionary(word, fc.oneof(leaf, row, fc.array(row, { minLength: 1, maxLength: 4 })), {
    maxKeys: 5,
  })
  fc.assert(
    fc.property(inputs, (given) => {
      expect(nested(flat(given))).toEqual(JSON.parse(JSON.stringify(given)))
    }),
  )
})

test('a hostile address reaches nothing but its own values', () => {
  const found = nested({
    '__proto__.x': '1',
    'a.constructor.y': '2',
    'runs.999999999.size': '3',
    'b..c': '4',
    ok: '5',
  })
  expect(found).toEqual({ ok: '5' })
  expect(({} as Record<string, unknown>)['x']).toBeUndefined()
})

/** Sentences of our own: none of these words is the validator's. */
const foreign = /invalid|expected|received|unrecognized|undefined|NaN/i

test.each(worksheetNames)('%s: whatever is missing or wrong is asked for in our words', (name) => {
  const wrong = [{}, { units: 'furlongs', runs: 5, loads: 'x', source: 7, one: [], device: null }]
  const halves = [
    {
      which: 'equipment',
      source: { kind: 'inverter' },
      device: { kind: 'ul489' },
      one: { with: 'bulb' },
      runs: [{}],
    },
    {
      which: 'electrode',
      source: { kind: 'utility' },
      device: { kind: 'gG' },
      loads: [{}],
      feeder: {},
      branch: {},
    },
  ]
  for (const typed of [...wrong, ...halves]) {
    const answer = computeWorksheet(name, typed)
    const sentences = 'errors' in answer ? Object.values(answer.errors) : []
    expect(sentences.length).toBeGreaterThan(0)
    for (const sentence of sentences) expect(sentence).not.toMatch(foreign)
  }
})
