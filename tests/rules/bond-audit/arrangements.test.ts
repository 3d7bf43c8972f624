import { describe, expect, test } from 'vitest'
import { auditSystem } from '../../../rules/bond-audit/audit.ts'
import { System } from '../../../rules/bond-audit/system.ts'
import { system } from './build.ts'
import { knownAnswers } from './known-answers.ts'

/** Each mode as the answers write it: count, faults, exceptions. */
function answer(parts: (typeof knownAnswers)[number]['parts']): Record<string, string> {
  const { modes, gone } = auditSystem(system(...parts))
  return Object.fromEntries([
    ...modes.map(({ name, count, findings, exceptions }): [string, string] => [
      name,
      [
        String(count),
        ...findings.map(({ kind }) => kind).sort(),
        ...exceptions.map(({ kind }) => `+${kind}`).sort(),
      ].join(' '),
    ]),
    ...gone.map(({ name }): [string, string] => [name, 'taken away']),
  ])
}

test('there are 40 arrangements or more, no two alike, each a system of the form', () => {
  expect(knownAnswers.length).toBeGreaterThanOrEqual(40)
  expect(new Set(knownAnswers.map(({ parts }) => JSON.stringify(parts))).size).toBe(knownAnswers.length)
  for (const { parts } of knownAnswers) expect(System.parse(system(...parts)).parts).toEqual(parts)
})

describe('bonds are counted as the standards’ rules have it', () => {
  test.each(knownAnswers)('$what ($section)', ({ parts, modes }) => {
    expect(answer(parts)).toEqual(modes)
  })
})
