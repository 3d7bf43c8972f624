import * as z from 'zod/mini'
import type { Flat } from '../../rules/worksheets/address.ts'
import type { WorksheetName } from '../../rules/worksheets/worksheets.ts'
import { Units } from '../../rules/worksheets/wire.ts'
import { getSetting, setSetting } from '../offline/settings.ts'

const Kept = z.record(z.string(), z.string())

/** What was last typed into this worksheet, and the units of this device. A device that keeps nothing knows neither. */
export async function keptInputs(name: WorksheetName): Promise<{ values: Flat | undefined; units: Units }> {
  const [values, units] = await Promise.all([
    getSetting(`worksheet.${name}`).catch(() => undefined),
    getSetting('worksheetUnits').catch(() => undefined),
  ])
  return { values: Kept.safeParse(values).data, units: Units.safeParse(units).data ?? 'american' }
}

// A private window may keep nothing; the address still holds it all.
const perhaps = (kept: Promise<void>) => void kept.catch(() => undefined)

export const keepInputs = (name: WorksheetName, values: Flat): void =>
  perhaps(setSetting(`worksheet.${name}`, { ...values }))
export const keepUnits = (units: Units): void => perhaps(setSetting('worksheetUnits', units))
