import fc from 'fast-check'
import { fitsContext } from '../../rules/edition/open.ts'
import type { Edition } from '../../rules/edition/open.ts'
import type { CaseContext } from '../edition.ts'

/** Numbers as meters show them: near nothing, near half, near nominal, over limit, anything. */
const number = fc.oneof(
  fc.double({ min: 0, max: 3, noNaN: true }),
  fc.double({ min: 40, max: 80, noNaN: true }),
  fc.double({ min: 100, max: 260, noNaN: true }),
  fc.constant(1e9),
  fc.double({ min: 0, max: 1e6, noNaN: true }),
)

/** A context and a handful of findings that it allows, in random order. */
export function anyCase(
  edition: Edition,
): fc.Arbitrary<{ context: CaseContext; findings: Record<string, number | string> }> {
  const context = fc.record({
    source: fc.constantFrom(...edition.sources.keys()),
    system: fc.constantFrom(...edition.systems.keys()),
    wiring: fc.constantFrom(...edition.wirings),
    meterOhms: fc.constantFrom(10_000_000, 1_000_000, 400_000, 10_000, 3_000),
  })
  return context.chain((where) => {
    const readings = edition.file.readings
      .filter((r) => fitsContext(r, where))
      .map((r) => fc.tuple(fc.constant(r.id), number as fc.Arbitrary<number | string>))
    const observations = edition.file.observations.map((o) =>
      fc.tuple(
        fc.constant(o.id),
        fc.constantFrom(...o.values.map((v) => v.id)) as fc.Arbitrary<number | string>,
      ),
    )
    return fc
      .uniqueArray(fc.oneof(...readings, ...observations), {
        selector: ([id]) => id,
        minLength: 0,
        maxLength: 14,
      })
      .map((entries) => ({ context: where, findings: Object.fromEntries(entries) }))
  })
}
