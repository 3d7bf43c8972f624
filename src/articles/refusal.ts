import { ApiProblem, NoNetwork } from '../api.ts'

/** What went wrong with something sent, in words; fields at fault each with a sentence. */
export function refusalOf(problem: unknown): { title: string; errors: Readonly<Record<string, string>> } {
  if (problem instanceof ApiProblem) return { title: problem.title, errors: problem.errors }
  return {
    title:
      problem instanceof NoNetwork
        ? 'No network. What you typed is still here.'
        : 'That did not work. Try again.',
    errors: {},
  }
}
