/** Which changes make every mode pass, with the least work. */
import { auditSystem } from './audit.ts'
import type { Audit } from './audit.ts'
import { changesFor } from './changes.ts'
import type { Change } from './changes/change.ts'
import { checkSystem } from './check-system.ts'
import { findIn } from './findings.ts'
import { modesOf } from './modes.ts'
import type { System } from './system.ts'

export type Plan = {
  /** In the order to do them: the least work first. */
  steps: readonly Change[]
  /** The system after them, audited. */
  then: Audit
  /** Whether every mode that is left passes then. */
  passes: boolean
}

/** How much is wrong: failing modes, findings in all of them. A mode that is gone is none. */
function wrong(system: System): number {
  const findings = modesOf(system).map(({ circuit }) => findIn(circuit).findings.length)
  return findings.filter((count) => count > 0).length * 100 + findings.reduce((sum, count) => sum + count, 0)
}

const most = 4
/** Beyond so many changes pairs are not tried: that would be felt. */
const fewEnoughForPairs = 16

type Tried = { steps: Change[]; system: System; wrong: number; work: number }
const better = (a: Tried, b: Tried) => a.wrong - b.wrong || a.work - b.work

const withStep = (from: Tried, step: Change): Tried => {
  const system = step.apply(from.system)
  return { steps: [...from.steps, step], system, wrong: wrong(system), work: from.work + step.work }
}

/**
 * A way to have every mode pass, if up to four changes do it; else the best they do.
 * @returns undefined where nothing is wrong, or nothing that is known helps
 */
export function planFor(system: System, { modes }: Audit): Plan | undefined {
  if (modes.every(({ passes }) => passes) || checkSystem(system).length > 0) return undefined
  let best: Tried = { steps: [], system, wrong: wrong(system), work: 0 }
  while (best.wrong > 0 && best.steps.length < most) {
    const base = best
    const rows = base.steps.length === 0 ? modes : auditSystem(base.system).modes
    const options = changesFor(base.system, rows)
    const singles = options.map((option) => withStep(base, option))
    const pairs =
      options.length <= fewEnoughForPairs && singles.every((one) => one.wrong > 0)
        ? singles.flatMap((one, i) =>
            options
              .slice(i + 1)
              .flatMap((two) => (two.part === one.steps.at(-1)?.part ? [] : [withStep(one, two)])),
          )
        : []
    const next = [...singles, ...pairs].sort(better)[0]
    if (next === undefined || next.wrong >= base.wrong) break
    best = next
  }
  if (best.steps.length === 0) return undefined
  const then = auditSystem(best.system)
  return {
    steps: [...best.steps].sort((a, b) => a.work - b.work),
    then,
    passes: then.modes.every(({ passes }) => passes),
  }
}
