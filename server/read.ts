import type { Request } from 'express'
import type * as z from 'zod/mini'
import { Problem } from './problem.ts'

/**
 * Reads the query of a request with its contract.
 * @throws Problem 400 that names each parameter at fault
 */
export function readQuery<Contract extends z.ZodMiniType>(
  req: Request,
  contract: Contract,
): z.output<Contract> {
  const read = contract.safeParse(req.query)
  if (read.success) return read.data
  const errors = Object.fromEntries(read.error.issues.map((issue) => [issue.path.join('.'), issue.message]))
  throw new Problem('bad-request', 'The query could not be read.', errors)
}
