import type { Edition } from '../../rules/edition/open.ts'
import { answerCase } from './answer.ts'
import type { Priors } from '../../rules/ranking/weigh.ts'

/** Findings a cut leaves; the context stays whole. `call` keeps everything. */
export type Cut = 'kit' | 'meter' | 'call'

const kit = ['tester.hn-lamp', 'tester.hg-lamp', 'tester.ng-lamp', 'lights', 'extent', 'onset', 'tingle']
const meter = [...kit, 'receptacle.hn.volts', 'receptacle.hg.volts', 'receptacle.ng.volts']

type Raw = Record<string, unknown>
const isObject = (x: unknown): x is Raw => typeof x === 'object' && x !== null && !Array.isArray(x)

/** A case with only the findings of a cut. */
export function cutCase(raw: unknown, cut: Cut): unknown {
  if (cut === 'call' || !isObject(raw)) return raw
  const keep = new Set(cut === 'kit' ? kit : meter)
  const only = (findings: unknown) =>
    isObject(findings)
      ? Object.fromEntries(Object.entries(findings).filter(([id]) => keep.has(id)))
      : findings
  const others = raw['otherModes']
  return {
    ...raw,
    findings: only(raw['findings']),
    ...(isObject(others)
      ? { otherModes: Object.fromEntries(Object.entries(others).map(([mode, f]) => [mode, only(f)])) }
      : {}),
  }
}

type Shared = { cause: string; share: number }[]

/** Behind a panel an isolated output is electrically a floating neutral: the two are one answer. */
export function joinAlike(ranking: Shared, wiring: unknown): Shared {
  if (wiring !== 'panel') return ranking
  const sum = ranking
    .filter((r) => r.cause === 'isolated-output' || r.cause === 'floating-neutral')
    .reduce((a, r) => a + r.share, 0)
  return ranking
    .filter((r) => r.cause !== 'isolated-output')
    .map((r) => (r.cause === 'floating-neutral' ? { ...r, share: sum } : r))
    .sort((a, b) => b.share - a.share)
}

export type Score = {
  cases: number
  top1: number
  top3: number
  brier: number
  calibration: number
  misfits: number
  /** "truth → leader" with its count, most first. */
  confused: [string, number][]
}

/** Scores answers against the truth written in each case: a line with an error is a miss. */
export async function score(
  edition: Edition,
  cases: readonly unknown[],
  cut: Cut,
  priors: Priors,
): Promise<Score> {
  const bins = Array.from({ length: 10 }, () => ({ n: 0, share: 0, hits: 0 }))
  const confused = new Map<string, number>()
  let [top1, top3, brier, misfits] = [0, 0, 0, 0]
  for (const raw of cases) {
    const given = isObject(raw) ? raw : {}
    const context = isObject(given['context']) ? given['context'] : {}
    const behindPanel = context['wiring'] === 'panel'
    const truth =
      behindPanel && given['truth'] === 'isolated-output' ? 'floating-neutral' : String(given['truth'])
    const answer = await answerCase(edition, cutCase(raw, cut), priors)
    if ('error' in answer) {
      brier += 1
      continue
    }
    const ranking = joinAlike(answer.ranking, context['wiring'])
    const leader = ranking[0] ?? { cause: '', share: 0 }
    const hit = leader.cause === truth
    if (hit) top1 += 1
    else {
      const pair = `${truth} → ${leader.cause}`
      confused.set(pair, (confused.get(pair) ?? 0) + 1)
    }
    if (ranking.slice(0, 3).some((r) => r.cause === truth)) top3 += 1
    if (answer.misfit) misfits += 1
    brier += ranking.reduce((sum, r) => sum + (r.share - (r.cause === truth ? 1 : 0)) ** 2, 0)
    const bin = bins[Math.min(9, Math.floor(leader.share * 10))]
    if (bin !== undefined) {
      bin.n += 1
      bin.share += leader.share
      bin.hits += hit ? 1 : 0
    }
  }
  const n = Math.max(1, cases.length)
  return {
    cases: cases.length,
    top1: top1 / n,
    top3: top3 / n,
    brier: brier / n,
    calibration: bins.reduce((sum, b) => sum + (b.n === 0 ? 0 : Math.abs(b.share - b.hits)), 0) / n,
    misfits: misfits / n,
    confused: [...confused].sort((a, b) => b[1] - a[1] || (a[0] < b[0] ? -1 : 1)),
  }
}
