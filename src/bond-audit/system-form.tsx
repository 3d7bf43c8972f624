import { useState } from 'react'
import type { Fault } from '../../rules/bond-audit/check-system.ts'
import { mostParts } from '../../rules/bond-audit/system.ts'
import type { Part, System } from '../../rules/bond-audit/system.ts'
import { Button } from '../ui/button.tsx'
import { Help } from '../ui/help.tsx'
import { Rail } from '../ui/rail.tsx'
import { useToast } from '../ui/toast.tsx'
import { Ways } from '../ui/ways.tsx'
import { NameField } from './fields.tsx'
import { addable, newPart, withoutPart } from './new-part.ts'
import { PartRow } from './part-row.tsx'
import { Starts } from './starts.tsx'
import { inUnits } from './units.ts'

type SystemFormProps = {
  system: System
  faults: readonly Fault[]
  onChange: (system: System) => void
}

/** The system, part by part: add, change, rename, remove. */
export function SystemForm({ system, faults, onChange }: SystemFormProps) {
  const [open, setOpen] = useState<string>()
  const [adding, setAdding] = useState(false)
  const say = useToast()
  const put = (id: string, part: Part) =>
    onChange({ ...system, parts: system.parts.map((old) => (old.id === id ? part : old)) })
  const add = (what: (typeof addable)[number][0]) => {
    const part = newPart(what, system)
    onChange({ ...system, parts: [...system.parts, part] })
    setAdding(false)
    setOpen(part.id)
  }
  const remove = (part: Part) => {
    onChange(withoutPart(system, part.id))
    setOpen(undefined)
    say({ text: `${part.name} removed`, action: { word: 'Undo', onPress: () => onChange(system) } })
  }
  const start = (next: System) => {
    onChange(next)
    setOpen(undefined)
    say({ text: `Started from: ${next.name}`, action: { word: 'Undo', onPress: () => onChange(system) } })
  }
  return (
    <Rail title="The system" className="audit-system">
      <ul className="audit-parts">
        {system.parts.map((part) => (
          <PartRow
            key={part.id}
            part={part}
            system={system}
            faults={faults}
            open={open === part.id}
            onOpen={(is) => setOpen(is ? part.id : undefined)}
            onPart={(next) => put(part.id, next)}
            onRemove={() => remove(part)}
          />
        ))}
      </ul>
      <div className="screen-only">
        <Button
          wide
          icon="plus"
          expanded={adding}
          controls="audit-add"
          onPress={() => setAdding(!adding)}
          {...(system.parts.length >= mostParts && { barredBecause: `${mostParts} parts are the most.` })}
        >
          Source, panel or rod
        </Button>
        <ul id="audit-add" className="audit-add" hidden={!adding}>
          {adding &&
            addable.map(([what, words]) => (
              <li key={what}>
                <Button size="small" wide onPress={() => add(what)}>
                  {words}
                </Button>
              </li>
            ))}
        </ul>
        <div className="audit-about">
          <NameField
            label="Name of this system"
            value={system.name}
            most={60}
            open
            onName={(name) => onChange({ ...system, name })}
          />
          <div>
            <p className="field-label" id="audit-units">
              Lengths and wires
            </p>
            <Ways
              labelledBy="audit-units"
              ways={[
                { value: 'us', label: 'ft, AWG' },
                { value: 'metric', label: 'm, mm²' },
              ]}
              value={system.units}
              onChoose={(units: System['units']) => {
                if (units !== system.units) onChange(inUnits(system, units))
              }}
            />
          </div>
        </div>
        {system.parts.length > 0 && (
          <>
            <Help summary="Start from a common arrangement">
              <Starts onStart={start} />
            </Help>
            <Button
              look="plain"
              size="small"
              onPress={() => {
                onChange({ name: '', units: system.units, parts: [] })
                say({ text: 'Cleared', action: { word: 'Undo', onPress: () => onChange(system) } })
              }}
            >
              Clear all parts
            </Button>
          </>
        )}
      </div>
    </Rail>
  )
}
