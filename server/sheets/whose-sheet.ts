import { timingSafeEqual } from 'node:crypto'
import type { Request } from 'express'
import { personOf } from '../session.ts'
import { tokenHash } from '../token.ts'
import type { SheetRow } from './sheets.queries.ts'

/** Names the key that a device without an account made for its sheets. */
export const keyHeader = 'Sheet-Key'

const isKey = /^[0-9a-f]{64}$/

/** What is kept of the key a request came with. Undefined when it came with none. */
export function keyHashOf(req: Request): string | undefined {
  const key = req.get(keyHeader)
  return key !== undefined && isKey.test(key) ? tokenHash(key) : undefined
}

/** Whether the asker began this sheet: signed in as its owner, or with the key of the device it was begun on. */
export function isOwn(req: Request, sheet: Pick<SheetRow, 'ownerId' | 'keyHash'>): boolean {
  const person = personOf(req)
  if (sheet.ownerId !== null) return person?.id === sheet.ownerId
  const key = keyHashOf(req)
  return (
    key !== undefined &&
    sheet.keyHash !== null &&
    timingSafeEqual(Buffer.from(key), Buffer.from(sheet.keyHash))
  )
}
