import { useEdition } from '../editions/edition.api.ts'

const day = new Intl.DateTimeFormat('en-US', { day: 'numeric', month: 'long' })

/** Which edition answers here, and since when. */
export function EditionLine() {
  const { info } = useEdition()
  if (info === undefined) return <span />
  return (
    <span>
      Answers from edition {info.number}, in force since {day.format(new Date(info.inForceSince))}
    </span>
  )
}
