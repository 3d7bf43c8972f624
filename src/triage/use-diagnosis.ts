import { useEffect, useState } from 'react'
import type { Edition } from '../../rules/edition/open.ts'
import { readSheet } from '../../rules/findings/parse.ts'
import type { RawSheet } from '../../rules/findings/sheet.ts'
import { diagnose } from '../../rules/ranking/diagnose.ts'
import type { Diagnosis } from '../../rules/ranking/diagnosis-types.ts'

export type Answer = { diagnosis?: Diagnosis; failed?: string }

/** What the edition says of a sheet. An answer older than the sheet is dropped. */
export function useDiagnosis(edition: Edition | undefined, sheet: RawSheet): Answer {
  const [answer, setAnswer] = useState<Answer>({})
  const key = JSON.stringify(sheet)
  useEffect(() => {
    if (edition === undefined) return
    let wanted = true
    const read = readSheet(edition, JSON.parse(key))
    if (!read.ok) {
      setAnswer({ failed: Object.values(read.errors).join(' ') })
      return
    }
    diagnose(edition, read.sheet).then(
      (diagnosis) => wanted && setAnswer({ diagnosis }),
      () => wanted && setAnswer({ failed: 'The findings could not be ranked.' }),
    )
    return () => {
      wanted = false
    }
  }, [edition, key])
  return answer
}
