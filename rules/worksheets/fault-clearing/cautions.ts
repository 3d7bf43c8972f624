import { bodyReferences, disconnectionReference } from '../body.ts'
import { gfciReference } from '../leakage-trip/ul-943.ts'
import { rcdReferences } from '../leakage-trip/iec-61008.ts'
import { seen, whoDecides } from '../result.ts'
import type { Caution, Reference } from '../result.ts'
import { wireReferences } from '../wire.ts'
import { inTime, written } from '../written.ts'
import type { Clearing, Fault } from './clearing.ts'
import type { FaultInputs } from './fault-clearing.ts'
import { sourceReferences } from './source-limit.ts'
import type { Touch } from './touch.ts'

/** The gravest first. */
export function faultCautions(
  clearing: Clearing,
  { source, path }: Fault,
  touch: Touch,
  { bond }: FaultInputs,
): Caution[] {
  const all: Caution[] = []
  if (clearing.clears === 'nothing' || clearing.clears === 'perhaps-breaker')
    all.push({
      word: 'danger',
      text: 'A fault here leaves metal live, and nothing disconnects it. Keep people away from its metal and the system off until this is mended.',
    })
  else if (!touch.iecHolds)
    all.push({
      word: 'danger',
      text: `Until the fault is cleared, its metal stands at ${written(touch.volts)} V, for up to ${inTime(touch.seconds)}. Keep people away from it and the system off until this is mended.`,
    })
  else if (clearing.clears !== 'breaker' && clearing.clears !== 'leakage')
    all.push({
      word: 'warning',
      text: `Metal stays live until ${source.kind === 'inverter' ? 'the inverter shuts down' : 'the source stops'}. Read in its instructions how it acts on a fault, and whether it starts again by itself.`,
    })
  if (bond === 'rods')
    all.push({
      word: 'warning',
      text: 'Earth is no way back for a fault (NEC 250.4(A)(5)). Run a grounding conductor with the feeder.',
    })
  if (path === undefined)
    all.push({
      word: 'warning',
      text: 'Don’t install a bond on the strength of this page: a balanced output must never be bonded, and no bond is installed until its release on the Diagnosis page.',
    })
  if (source.kind !== 'utility')
    all.push({
      word: 'caution',
      text: 'The source’s fault current and its time come from its instructions. What stands here to begin with is typical, and no standard fixes it.',
    })
  return [...all, whoDecides]
}

/** Every standard this answer leans on. */
export function faultReferences({ units, leakage }: FaultInputs, { source, breaker }: Fault): Reference[] {
  return [
    ...wireReferences(units),
    ...breaker.references,
    ...sourceReferences(source.kind),
    ...(leakage === 'gfci' ? [gfciReference] : leakage === 'rcd' ? rcdReferences : []),
    seen('NEC 250.4(A)(5): an effective fault path to the source; earth is none'),
    disconnectionReference,
    ...bodyReferences,
  ]
}
