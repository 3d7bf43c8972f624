import type { Request } from 'express'

/** A cookie as the browser sent it. Undefined when it sent none of that name. */
export function cookieOf(req: Request, name: string): string | undefined {
  for (const pair of (req.get('cookie') ?? '').split(';')) {
    const [key, value] = pair.trim().split('=', 2)
    if (key === name) return value
  }
  return undefined
}
