import type { Edition } from '../edition/open.ts'
import { readSheet } from './parse.ts'
import type { FieldErrors } from './parse.ts'
import type { RawFinding, RawSheet, Sheet } from './sheet.ts'

export type Readable = {
  /** Undefined when what feeds it can't be read. */
  sheet: Sheet | undefined
  /** Field path → sentence. What stands here was left out of the sheet. */
  errors: FieldErrors
}

function without(raw: RawSheet, errors: FieldErrors): RawSheet {
  const keep = (at: string, findings: Record<string, RawFinding>) =>
    Object.fromEntries(Object.entries(findings).filter(([id]) => errors[`${at}.${id}`] === undefined))
  const others = Object.entries(raw.otherModes ?? {}).filter(
    ([mode]) => errors[`otherModes.${mode}`] === undefined,
  )
  const { meterOhms, ...context } = raw.context
  return {
    context:
      errors['context.meterOhms'] === undefined && meterOhms !== undefined
        ? { ...context, meterOhms }
        : context,
    findings: keep('findings', raw.findings ?? {}),
    otherModes: Object.fromEntries(others.map(([mode, f]) => [mode, keep(`otherModes.${mode}`, f)])),
  }
}

/**
 * Reads as much of the sheet as can be read. One entry that is no number must not blind the page to all others; it
 * is named beside its field, and the bond stays held back while there is one.
 */
export function readWhatCanBe(edition: Edition, raw: RawSheet): Readable {
  const whole = readSheet(edition, raw)
  if (whole.ok) return { sheet: whole.sheet, errors: {} }
  const rest = readSheet(edition, without(raw, whole.errors))
  return { sheet: rest.ok ? rest.sheet : undefined, errors: whole.errors }
}
