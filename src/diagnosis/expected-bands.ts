/** The circuit model's bands; fetched apart, since nothing that is typed waits for them. */
import type { Edges } from '../../rules/bands/place-in-band.ts'
import { electricalCauses } from '../../rules/circuit/wiring/context.ts'
import type { ElectricalCause } from '../../rules/circuit/wiring/context.ts'
import { canOccur } from '../../rules/circuit/wiring/occurs.ts'
import { expect } from '../../rules/circuit/expect.ts'
import { knownContext } from '../../rules/loop/known-context.ts'

const isElectrical = (cause: string): cause is ElectricalCause =>
  (electricalCauses as readonly string[]).includes(cause)

export type Bands = (reading: string, meterOhms: number) => Edges | undefined

/**
 * The bands of a cause for the meters of a sheet, all computed now.
 * @returns undefined where the model has no wiring of this cause in this context
 */
export function bandsOf(
  context: { source: string; system: string; wiring: string },
  cause: string,
  meters: readonly number[],
): Bands | undefined {
  const known = knownContext(context)
  if (known === undefined || !isElectrical(cause) || !canOccur(cause, known)) return undefined
  const byMeter = new Map(meters.map((ohms) => [ohms, expect(known, cause, ohms).readings]))
  return (reading, meterOhms) => byMeter.get(meterOhms)?.get(reading)
}
