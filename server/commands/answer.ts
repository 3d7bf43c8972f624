import type { Edition } from '../../rules/edition/open.ts'
import { readCase } from '../../rules/findings/parse.ts'
import { diagnose } from '../../rules/ranking/diagnose.ts'
import type { Diagnosis } from '../../rules/ranking/diagnosis-types.ts'
import type { Priors } from '../../rules/ranking/weigh.ts'

export type Answer =
  | {
      id: string
      ranking: { cause: string; share: number }[]
      nextTests: { test: string; findings: readonly string[]; gainBits: number; mode?: string }[]
      stop: boolean
      misfit: boolean
      bond: Diagnosis['bond']['state']
    }
  | { id: string | null; error: Record<string, string> }

/** The answer to one case, as the case format words it. `raw` undefined: the line was no JSON. */
export async function answerCase(edition: Edition, raw: unknown, priors: Priors): Promise<Answer> {
  const read = readCase(edition, raw)
  if (!read.ok) return { id: read.id, error: read.errors }
  const found = await diagnose(edition, read.sheet, { priors })
  return {
    id: read.id,
    ranking: found.ranking.map(({ cause, share }) => ({ cause, share })),
    nextTests: found.nextTests.map(({ test, findings, gainBits, mode }) => ({
      test,
      findings,
      gainBits,
      ...(mode === undefined ? {} : { mode }),
    })),
    stop: found.stops.length > 0,
    misfit: found.misfit !== undefined,
    bond: found.bond.state,
  }
}
