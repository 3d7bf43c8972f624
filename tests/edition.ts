import { openEdition } from '../rules/edition/open.ts'
import type { Edition } from '../rules/edition/open.ts'
import { readCase } from '../rules/findings/parse.ts'
import type { RawFinding, Sheet } from '../rules/findings/sheet.ts'
import { readStarterDiagnosis } from '../server/editions/read-starter.ts'

/** The starter edition, opened once a test file. */
export const starter: Edition = openEdition(await readStarterDiagnosis())

export const generator = { source: 'generator', system: '120', wiring: 'panel' }
export const powerStation = { source: 'power-station', system: '120', wiring: 'direct' }
export const splitPhase = { source: 'utility', system: '120/240', wiring: 'panel' }
export const european = { source: 'generator', system: '230', wiring: 'panel' }

export type CaseContext = {
  source: string
  system: string
  wiring: string
  mode?: string
  meterOhms?: number
}

/** A sheet from plain findings; throws where they can't be read, so that a test's slip is not taken for silence. */
export function sheetOf(
  context: CaseContext,
  findings: Record<string, RawFinding>,
  otherModes: Record<string, Record<string, RawFinding>> = {},
): Sheet {
  const read = readCase(starter, { id: 'test', context, findings, otherModes })
  if (!read.ok) throw new Error(JSON.stringify(read.errors))
  return read.sheet
}

/** Three volts at one place. */
export const volts = (hn: number, hg: number, ng: number, place = 'receptacle') => ({
  [`${place}.hn.volts`]: hn,
  [`${place}.hg.volts`]: hg,
  [`${place}.ng.volts`]: ng,
})
/** Three tester lamps: hot–neutral, hot–ground, neutral–ground. */
export const lamps = (hn: string, hg: string, ng: string) => ({
  'tester.hn-lamp': hn,
  'tester.hg-lamp': hg,
  'tester.ng-lamp': ng,
})
