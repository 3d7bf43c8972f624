/**
 * A system as part of an address: letters, digits and the marks - _ . ~ * alone, so that nothing is escaped twice on
 * its way through mail and paper. The first field is the version of this writing; older ones stay readable.
 */
import { kinds, text, untext, idFrom, nowhere, nth, place } from './address/codes.ts'
import { readPart } from './address/read-part.ts'
import { writePart } from './address/write-part.ts'
import { System } from './system.ts'

/** Where the audit is, with nothing filled in. */
export const auditPath = '/worksheets/bond-audit'
const version = '1'

/** Writes a system as one word for an address. */
export function writeSystem({ name, units, parts }: System): string {
  const ref = (id: string) => {
    const index = parts.findIndex((part) => part.id === id)
    return index < 0 ? 'zz' : index.toString(36)
  }
  return [
    version,
    text(name),
    units === 'us' ? 'u' : 'm',
    ...parts.map((part) =>
      [
        place(kinds, part.kind) + (part.id === idFrom(part.name) ? '' : part.id),
        text(part.name),
        ...writePart(part, ref),
      ].join('_'),
    ),
  ].join('~')
}

/** Reads a system out of an address; undefined where it is damaged or of a version not known here. */
export function readSystem(words: string): System | undefined {
  try {
    const [is, name = '', units, ...rest] = words.split('~')
    if (is !== version || (units !== 'u' && units !== 'm')) return undefined
    const heads = rest.map((one) => {
      const [head = '', title = '', ...fields] = one.split('_')
      const own = untext(title)
      return { kind: nth(kinds, head[0]), id: head.slice(1) || idFrom(own), name: own, fields }
    })
    const ref = (index: string | undefined) => nth(heads, index)?.id ?? nowhere
    const parts = heads.map(({ kind, id, name: own, fields }) => {
      if (kind === undefined) throw new RangeError('no such kind')
      return { kind, id, name: own, ...readPart(kind, fields, ref) }
    })
    const read = System.safeParse({ name: untext(name), units: units === 'u' ? 'us' : 'metric', parts })
    return read.success ? read.data : undefined
  } catch {
    return undefined
  }
}

/** The address that opens the audit with this system filled in. */
export const auditAddress = (system: System): string => `${auditPath}?system=${writeSystem(system)}`
