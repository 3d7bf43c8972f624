import { useState } from 'react'
import { ApiProblem, NoNetwork } from '../api.ts'

export type Refusal = {
  title: string
  /** Field → sentence. */
  errors: Readonly<Record<string, string>>
}

const refusalOf = (problem: unknown): Refusal => {
  if (problem instanceof ApiProblem) return { title: problem.title, errors: problem.errors }
  const noNetwork = problem instanceof NoNetwork
  return {
    title: noNetwork
      ? 'No network. This needs one; what you typed is still here.'
      : 'That did not work. Try again.',
    errors: {},
  }
}

/** Sends a form: one thing at a time, and what the server refused stays to be shown. */
export function useSending(): {
  sending: boolean
  refusal: Refusal | undefined
  /** Does the work; says whether it went through. */
  run: (work: () => Promise<unknown>) => Promise<boolean>
} {
  const [sending, setSending] = useState(false)
  const [refusal, setRefusal] = useState<Refusal>()
  const run = async (work: () => Promise<unknown>) => {
    if (sending) return false
    setSending(true)
    setRefusal(undefined)
    try {
      await work()
      return true
    } catch (problem) {
      setRefusal(refusalOf(problem))
      return false
    } finally {
      setSending(false)
    }
  }
  return { sending, refusal, run }
}
