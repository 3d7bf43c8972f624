import fc from 'fast-check'
import { expect, test } from 'vitest'
import { auditAddress, readSystem, writeSystem } from '../../../rules/bond-audit/address.ts'
import { arrangements } from '../../../rules/bond-audit/arrangements.ts'
import type { System } from '../../../rules/bond-audit/system.ts'
import { anySystem } from './any-system.ts'
import { source, system } from './build.ts'

const plain = (one: System | undefined) => JSON.parse(JSON.stringify(one ?? null)) as unknown

test('what is written is read back, part by part', () => {
  for (const { system: start } of arrangements) expect(readSystem(writeSystem(start))).toEqual(start)
  fc.assert(
    fc.property(anySystem, (one) => {
      expect(plain(readSystem(writeSystem(one)))).toEqual(plain(one))
    }),
    { numRuns: 200 },
  )
})

test('any name goes there and back', () => {
  fc.assert(
    fc.property(fc.string({ unit: 'grapheme', minLength: 1, maxLength: 20 }), (name) => {
      const trimmed = name.trim().slice(0, 28)
      fc.pre(trimmed.length > 0 && !/[\ud800-\udfff]/u.test(trimmed))
      const one = system({ ...source('inverter'), name: trimmed })
      expect(readSystem(writeSystem(one))).toEqual(one)
    }),
  )
})

test('an address needs no escaping, and that of three sources fits in a mail’s line', () => {
  for (const { system: start } of arrangements) {
    const address = auditAddress(start)
    expect(address).toMatch(/^\/worksheets\/bond-audit\?system=[\w~.*-]+$/)
    expect(new URL(address, 'http://shop.example.test').searchParams.get('system')).toBe(writeSystem(start))
    expect(address.length).toBeLessThan(500)
  }
})

test('a damaged address is no system, and no crash', () => {
  for (const words of ['', '1', '2~x~u', '1~x~u~9_a', '1~%~u', '1~*zz~u', '1~x~u~0_a_0000_00_~4_b_000_0.9'])
    expect(readSystem(words)).toBeUndefined()
  fc.assert(
    fc.property(
      fc.constantFrom(...arrangements),
      fc.nat(),
      fc.constantFrom('~', '_', '.', '*', 'z', ''),
      (one, at, mark) => {
        const words = writeSystem(one.system)
        const i = at % words.length
        expect(() => readSystem(words.slice(0, i) + mark + words.slice(i + 1))).not.toThrow()
      },
    ),
    { numRuns: 500 },
  )
})
