import { useEdition } from '../editions/edition.api.ts'

/** What this is and who decides, with the edition it was answered from. */
export function GuideLine() {
  const { info } = useEdition()
  return (
    <p className="text-note text-ink-2">
      {info !== undefined && `Edition ${info.number}. `}A guide, not an inspection. Local code and the
      authority having jurisdiction (your local inspector) decide.
    </p>
  )
}
