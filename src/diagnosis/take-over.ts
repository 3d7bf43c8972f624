import type { Came } from './sent-sheet.ts'
import type { Entries, SheetContent } from './sheet-content.ts'

function withCame(entries: Entries, came: readonly Came[]): Entries {
  const next = { ...entries }
  for (const { mode, finding, entry } of came) {
    const { [finding]: _, ...rest } = next[mode] ?? {}
    next[mode] = entry === undefined ? rest : { ...rest, [finding]: entry }
  }
  return next
}

/**
 * The sheet with what others wrote on it. Undo takes back what was done here, so that what came stands in every step of
 * the past too.
 */
export function takeOver(content: SheetContent, came: readonly Came[]): SheetContent {
  const into = <Part extends Pick<SheetContent, 'entries' | 'whatIf'>>(part: Part): Part => ({
    ...part,
    entries: withCame(part.entries, came),
    whatIf: part.whatIf && withCame(part.whatIf, came),
  })
  return { ...into(content), past: content.past.map((step) => ({ ...step, before: into(step.before) })) }
}
