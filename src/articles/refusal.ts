import { DraftText } from '../../server/articles/drafts.contract.ts'
import { ApiProblem, NoNetwork } from '../api.ts'

export type Refusal = {
  title: string
  /** Field → sentence. */
  errors: Readonly<Record<string, string>>
  /** Nobody is signed in any more. */
  signedOut: boolean
}

/** What went wrong with something sent, in words; fields at fault each with a sentence. */
export function refusalOf(problem: unknown): Refusal {
  if (problem instanceof ApiProblem)
    return { title: problem.title, errors: problem.errors, signedOut: problem.status === 401 }
  return {
    title:
      problem instanceof NoNetwork
        ? 'No network. What you typed is still here.'
        : 'That did not work. Try again.',
    errors: {},
    signedOut: false,
  }
}

/** What keeps a text from being sent at all, before it is tried. */
export function misfitOf(text: DraftText): Refusal | undefined {
  const issues = DraftText.safeParse(text).error?.issues ?? []
  if (issues.length === 0) return undefined
  const errors = Object.fromEntries(issues.map(({ path, message }) => [path.join('.'), message]))
  return { title: 'Mend what is marked; until then it is not saved.', errors, signedOut: false }
}
