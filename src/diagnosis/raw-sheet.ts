/** From what was typed to what the core reads. */
import { readSheet } from '../../rules/findings/parse.ts'
import type { FieldErrors } from '../../rules/findings/parse.ts'
import type { RawFinding, RawSheet, Sheet } from '../../rules/findings/sheet.ts'
import type { Edition } from '../../rules/edition/open.ts'
import { inView } from './sheet-content.ts'
import type { Entries, Entry, Meter, SheetContent } from './sheet-content.ts'

/** A number as it is typed, with a comma or a point; undefined when it is none. */
export function numberIn(text: string): number | undefined {
  const plain = text.trim().replace(',', '.')
  return /^(\d+\.?\d*|\.\d+)$/.test(plain) ? Number(plain) : undefined
}

/** Over limit, as meters show it. */
export const isOverLimit = (text: string): boolean => /^o\.?l\.?$/i.test(text.trim())

/** Input resistance in ohms; not a number while a low one is not typed in full. */
export function meterOhmsOf(meter: Meter): number {
  if (meter.kind === '10M') return 10_000_000
  if (meter.kind === '1M') return 1_000_000
  return numberIn(meter.ohms) ?? Number.NaN
}

function rawOf(entry: Entry, ohms: boolean): RawFinding | undefined {
  if (entry.kind === 'observation') return entry.value
  if (entry.unreachable === true || entry.text.trim() === '') return undefined
  const before = entry.earlier && numberIn(entry.earlier.text)
  const own = {
    ...(entry.meterOhms === undefined ? {} : { meterOhms: entry.meterOhms }),
    // What was no number before says nothing of the one there is now.
    ...(before === undefined || !entry.earlier
      ? {}
      : { earlier: { value: before, meterOhms: entry.earlier.meterOhms } }),
  }
  if (ohms && isOverLimit(entry.text)) return { overLimit: true, ...own }
  const value = numberIn(entry.text)
  // Text that is no number goes on as it is: the core says so beside its field.
  if (value === undefined) return entry.text
  const upper = entry.upper?.trim() ?? ''
  if (upper !== '') {
    const other = numberIn(upper)
    return other === undefined ? upper : { value, between: [value, other], ...own }
  }
  return Object.keys(own).length === 0 ? value : { value, ...own }
}

function findingsOf(edition: Edition, here: Entries[string]): Record<string, RawFinding> {
  const raw = Object.entries(here).flatMap(([id, entry]): [string, RawFinding][] => {
    const unit = edition.readings.get(id)?.unit
    const one = rawOf(entry, unit === 'Ω' || unit === 'MΩ')
    return one === undefined ? [] : [[id, one]]
  })
  return Object.fromEntries(raw)
}

/** The sheet in view as the core takes it: findings of the mode in view, the others by their mode. */
export function rawSheetOf(edition: Edition, content: SheetContent): RawSheet {
  const { source, system, wiring, meter } = content.context
  const entries = inView(content)
  const others = Object.entries(entries).filter(([mode]) => mode !== content.mode)
  return {
    context: { source, system, wiring, mode: content.mode, meterOhms: meterOhmsOf(meter) },
    findings: findingsOf(edition, entries[content.mode] ?? {}),
    otherModes: Object.fromEntries(
      others
        .map(([mode, here]) => [mode, findingsOf(edition, here)] as const)
        .filter(([, f]) => Object.keys(f).length > 0),
    ),
  }
}

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

/** The sentence beside one field, if it can't be read. */
export const errorAt = (
  errors: FieldErrors,
  content: SheetContent,
  mode: string,
  id: string,
): string | undefined => errors[mode === content.mode ? `findings.${id}` : `otherModes.${mode}.${id}`]
