import type { Edition } from '../../rules/edition/open.ts'
import { readCase } from '../../rules/findings/parse.ts'
import type { Sheet } from '../../rules/findings/sheet.ts'
import { diagnose } from '../../rules/ranking/diagnose.ts'
import type { Diagnosis } from '../../rules/ranking/diagnosis-types.ts'
import type { Priors } from '../../rules/ranking/weigh.ts'
import { cutCase, joinAlike } from './scoring.ts'

/** One fixed order of tests, for comparison: what each takes. */
const fixedOrder: readonly (readonly string[])[] = [
  ['receptacle.hn.volts', 'receptacle.hg.volts', 'receptacle.ng.volts'],
  ['bulb.ng', 'bulb.ng.volts', 'bulb.hg'],
  ['panel.hn.volts', 'panel.hg.volts', 'panel.ng.volts'],
  ['receptacle.hn.volts.loaded', 'receptacle.ng.volts.loaded'],
  ['receptacle.ng.ohms', 'receptacle.hg.ohms'],
  ['source.ng.ohms'],
  ['source.hn.volts', 'source.hg.volts', 'source.ng.volts'],
  ['panel.ng.ohms'],
  ['feeder.egc.amps'],
  ['receptacle.ge.volts'],
  ['panel.l1n.volts', 'panel.l2n.volts', 'panel.l1l2.volts'],
  ['gfci.own-test'],
  ['gfci.plug-test'],
  ['gfci.in-use'],
]

export type Steps = { tests: number; right: boolean }
type Choose = (found: Diagnosis, has: (id: string) => boolean) => readonly string[] | undefined

const byNextTest: Choose = (found, has) =>
  found.nextTests.find((t) => t.mode === undefined && t.findings.some(has))?.findings
const byFixedOrder: Choose = (_, has) => fixedOrder.find((ids) => ids.some(has))

/**
 * From the kit, does one test after another with the case's own findings until the leader holds 90 % or no test
 * is left. Undefined when the case can't be read.
 */
export async function stepsOf(
  edition: Edition,
  raw: unknown,
  priors: Priors,
  order: 'next' | 'fixed',
): Promise<Steps | undefined> {
  const whole = readCase(edition, raw)
  const start = readCase(edition, cutCase(raw, 'kit'))
  if (!whole.ok || !start.ok) return undefined
  const choose = order === 'next' ? byNextTest : byFixedOrder
  const rest = new Map(
    whole.sheet.taken.filter((t) => t.mode === whole.sheet.context.mode).map((t) => [t.id, t]),
  )
  for (const t of start.sheet.taken) rest.delete(t.id)
  const truth = (raw as { truth?: unknown }).truth
  const wiring = whole.sheet.context.wiring
  const answer = wiring === 'panel' && truth === 'isolated-output' ? 'floating-neutral' : truth

  let sheet: Sheet = start.sheet
  for (let tests = 0; ; tests++) {
    const found = await diagnose(edition, sheet, { priors })
    const leader = joinAlike(
      found.ranking.map(({ cause, share }) => ({ cause, share })),
      wiring,
    )[0]
    const ids = leader && leader.share >= 0.9 ? undefined : choose(found, (id) => rest.has(id))
    if (ids === undefined) return { tests, right: leader?.cause === answer }
    const added = ids.flatMap((id) => rest.get(id) ?? [])
    for (const t of added) rest.delete(t.id)
    sheet = { ...sheet, taken: [...sheet.taken, ...added] }
  }
}
