import { useId } from 'react'
import type { Fault } from '../../rules/bond-audit/check-system.ts'
import { nameLength } from '../../rules/bond-audit/system.ts'
import type { Part, System } from '../../rules/bond-audit/system.ts'
import { Button } from '../ui/button.tsx'
import { FieldError } from '../ui/field.tsx'
import { Ways } from '../ui/ways.tsx'
import { NameField } from './fields.tsx'
import { PartFields } from './part-fields.tsx'
import { partNote, plainBond } from './part-words.ts'

type PartRowProps = {
  part: Part
  system: System
  faults: readonly Fault[]
  open: boolean
  onOpen: (open: boolean) => void
  onPart: (part: Part) => void
  onRemove: () => void
}

/** One part: what it is, its bond as a choice of two, and all its fields behind "Change". */
export function PartRow({ part, system, faults, open, onOpen, onPart, onRemove }: PartRowProps) {
  const id = useId()
  const bond = plainBond(part)
  const own = faults.filter((fault) => fault.part === part.id)
  const errorAt = (field: string) => own.find((fault) => fault.field === field)?.says
  return (
    <li className="audit-part">
      <div className="audit-part-head">
        <div className="audit-part-name">
          <b id={id}>{part.name}</b>
          <span className="text-note text-ink-2">{partNote(part, system)}</span>
        </div>
        {bond !== undefined && (
          <Ways
            className="audit-bond screen-only"
            labelledBy={id}
            ways={[
              { value: 'bond', label: 'Bond' },
              { value: 'none', label: 'No bond' },
            ]}
            value={bond.bonded ? 'bond' : 'none'}
            onChoose={(way) => {
              if ((way === 'bond') !== bond.bonded) onPart(bond.put(way === 'bond'))
            }}
          />
        )}
        <Button
          size="small"
          className="audit-change screen-only"
          expanded={open}
          controls={`${id}-fields`}
          label={`${open ? 'Close' : 'Change'} ${part.name}`}
          onPress={() => onOpen(!open)}
        >
          {open ? 'Close' : 'Change'}
        </Button>
      </div>
      {!open && own[0] !== undefined && <FieldError>{own[0].says}</FieldError>}
      <div id={`${id}-fields`} className="audit-fields screen-only" hidden={!open}>
        {open && (
          <>
            <NameField
              label="Name"
              value={part.name}
              most={nameLength}
              error={errorAt('name')}
              help="As its label says, or where it stands."
              onName={(name) => onPart({ ...part, name })}
            />
            <PartFields part={part} system={system} errorAt={errorAt} onPart={onPart} />
            <Button size="small" icon="remove" onPress={onRemove}>
              Remove {part.name}
            </Button>
          </>
        )}
      </div>
    </li>
  )
}
