import type { Request } from 'express'
import type * as z from 'zod/mini'
import { Problem, notFound } from './problem.ts'

/**
 * Reads the query of a request with its contract.
 * @throws Problem 400 that names each parameter at fault
 */
export function readQuery<Contract extends z.ZodMiniType>(
  req: Request,
  contract: Contract,
): z.output<Contract> {
  return read(req.query, contract, 'The query could not be read.')
}

/**
 * Reads the JSON body of a request with its contract.
 * @throws Problem 400 that names each field at fault
 */
export function readBody<Contract extends z.ZodMiniType>(
  req: Request,
  contract: Contract,
): z.output<Contract> {
  return read(req.body ?? {}, contract, 'Mend what is marked.')
}

const uuid = /^[0-9a-f]{8}(-[0-9a-f]{4}){3}-[0-9a-f]{12}$/

/** Reads the `id` of an address. What is no id can't be found either. */
export function readId(req: Request, what: string): string {
  const { id } = req.params
  if (typeof id !== 'string' || !uuid.test(id)) throw notFound(what)
  return id
}

function read<Contract extends z.ZodMiniType>(input: unknown, contract: Contract, title: string) {
  const result = contract.safeParse(input)
  if (result.success) return result.data
  // The first fault of a field says enough.
  const errors: Record<string, string> = {}
  for (const { path, message } of result.error.issues) errors[path.join('.')] ??= message
  throw new Problem('bad-request', title, errors)
}
