import { sha256 } from '@noble/hashes/sha2.js'
import { bytesToHex } from '@noble/hashes/utils.js'
import type { EditionInForce, FileName } from '../../server/editions/editions.contract.ts'
import { getBytes } from '../api.ts'
import { getFile, putFile } from '../offline/files.ts'

export type FileOf = EditionInForce['files'][number]

/** A file of this edition. Undefined where this person may not have it. */
export const fileOf = (info: EditionInForce, name: FileName): FileOf | undefined =>
  info.files.find((one) => one.name === name)

/**
 * Brings an edition's file: from this device, else from the server, and then keeps it.
 * @throws Error when what came is not the file of that hash; NoNetwork or ApiProblem when nothing came
 */
export async function bringFile({ hash, audience }: FileOf, signal?: AbortSignal): Promise<Uint8Array> {
  // A private window may have no database: the file is then fetched each time.
  const kept = await getFile(hash).catch(() => undefined)
  if (kept !== undefined) return kept
  const bytes = await getBytes(`/edition-files/${hash}`, signal)
  if (bytesToHex(sha256(bytes)) !== hash) throw new Error('The file came damaged. Try again.')
  // A full device is no reason to show nothing.
  await putFile(hash, bytes, audience).catch(() => undefined)
  return bytes
}

/** A file's content, still to be checked by its schema. */
export const readJson = (bytes: Uint8Array): unknown => JSON.parse(new TextDecoder().decode(bytes))
