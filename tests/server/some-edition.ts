import { editionBytes } from '../../server/editions/edition-bytes.ts'
import type { EditionBytes } from '../../server/editions/edition-bytes.ts'
import { readStarter } from '../../server/editions/read-starter.ts'

const starter = await readStarter()

/** The starter edition as bytes. */
export const starterBytes: EditionBytes = editionBytes(starter)

/** An edition that differs from the starter in one cause's title, and so in its hash. */
export function changedEdition(title: string): EditionBytes {
  const [first, ...others] = starter.diagnosis.causes
  return editionBytes({
    ...starter,
    diagnosis: { ...starter.diagnosis, causes: [{ ...first!, title }, ...others] },
  })
}

/** An edition that ranks otherwise: it knows nothing of volts at the receptacle. */
export const rankingOtherwise: EditionBytes = editionBytes({
  ...starter,
  diagnosis: {
    ...starter.diagnosis,
    groups: starter.diagnosis.groups.filter(({ id }) => !id.startsWith('receptacle-')),
  },
})
