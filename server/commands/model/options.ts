import type { Priors } from '../../../rules/ranking/weigh.ts'

export const usage = `npm run -s rank:model -- [options]
  --part fit|held-back   which cases: those the rules may be fitted to, or those kept from it (held-back)
  --each N               cases for each cause (30)
  --pairs N              cases of two faults at once (200)
  --steps N              cases for each cause whose further tests are counted (10)
  --seed TEXT            another seed, other cases (1)
  --priors flat|field    (flat)
  --everything           also the readings that a call seldom takes
  --physics              also how often no wiring of any one cause gives the findings (slow)
  --confused N           lines of what was taken for what (8)
  --write FILE           writes the cases as JSON Lines and scores nothing`

export type Options = {
  part: 'fit' | 'held-back'
  each: number
  pairs: number
  steps: number
  seed: string
  priors: Priors
  everything: boolean
  physics: boolean
  confused: number
  write: string | undefined
}

/** Reads the options; undefined where one is not known or has no such value. */
export function readOptions(args: readonly string[]): Options | undefined {
  const given: Record<string, string> = {}
  for (let i = 0; i < args.length; i++) {
    const name = args[i] ?? ''
    if (name === '--everything' || name === '--physics') given[name] = 'yes'
    else given[name] = args[++i] ?? ''
  }
  const known = [
    'part',
    'each',
    'pairs',
    'steps',
    'seed',
    'priors',
    'everything',
    'physics',
    'confused',
    'write',
  ]
  if (Object.keys(given).some((name) => !known.includes(name.replace(/^--/, '')))) return undefined
  const count = (name: string, usual: number) => {
    const text = given[name] ?? String(usual)
    return /^\d{1,6}$/.test(text) ? Number(text) : NaN
  }
  const [part, priors] = [given['--part'] ?? 'held-back', given['--priors'] ?? 'flat']
  const options = {
    each: count('--each', 30),
    pairs: count('--pairs', 200),
    steps: count('--steps', 10),
    confused: count('--confused', 8),
    seed: given['--seed'] ?? '1',
    everything: given['--everything'] !== undefined,
    physics: given['--physics'] !== undefined,
    write: given['--write'],
  }
  if (part !== 'fit' && part !== 'held-back') return undefined
  if (priors !== 'flat' && priors !== 'field') return undefined
  if (Object.values(options).some((value) => Number.isNaN(value) || value === '')) return undefined
  return { ...options, part, priors }
}
