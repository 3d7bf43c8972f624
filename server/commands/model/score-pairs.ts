import type { Edition } from '../../../rules/edition/open.ts'
import type { Priors } from '../../../rules/ranking/weigh.ts'
import { answerCase } from '../answer.ts'
import { joinAlike } from '../scoring.ts'
import type { PairCase } from './cases.ts'

export type PairScore = {
  pairs: number
  /** The leader is one of the two, or the answer says misfit. */
  met: number
  misfits: number
  /** The leader is one of the two, misfit or not. */
  named: number
  /** "one + other → leader" of those not met, with the count. */
  missed: [string, number][]
}

/** How two faults at once are answered, from everything that was taken. Parts of all pairs. */
export async function scorePairs(
  edition: Edition,
  cases: readonly PairCase[],
  priors: Priors,
): Promise<PairScore> {
  const missed = new Map<string, number>()
  let [met, misfits, named] = [0, 0, 0]
  for (const one of cases) {
    const answer = await answerCase(edition, one, priors)
    if ('error' in answer) throw new Error(`${one.id}: ${JSON.stringify(answer.error)}`)
    const alike = (cause: string) =>
      cause === 'isolated-output' && one.context.wiring === 'panel' ? 'floating-neutral' : cause
    const leader = joinAlike(answer.ranking, one.context.wiring)[0]?.cause ?? ''
    const isNamed = [one.truth, one.also].map(alike).includes(leader)
    if (isNamed) named += 1
    if (answer.misfit) misfits += 1
    if (isNamed || answer.misfit) met += 1
    else {
      const words = `${[one.truth, one.also].sort().join(' + ')} → ${leader}`
      missed.set(words, (missed.get(words) ?? 0) + 1)
    }
  }
  const n = Math.max(1, cases.length)
  return {
    pairs: cases.length,
    met: met / n,
    misfits: misfits / n,
    named: named / n,
    missed: [...missed].sort((a, b) => b[1] - a[1] || (a[0] < b[0] ? -1 : 1)),
  }
}
