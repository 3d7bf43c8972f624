import type { Edition } from '../../rules/edition/open.ts'
import { Field, TextField } from '../ui/field.tsx'
import { OptionList, Ways } from '../ui/ways.tsx'
import type { Meter, SheetContext } from './sheet-content.ts'

export type Draft = Pick<SheetContext, 'source' | 'system' | 'wiring' | 'meter'>

const meters = [
  { value: '10M', label: '10 MΩ', note: 'most digital meters' },
  { value: '1M', label: '1 MΩ', note: '' },
  { value: 'low', label: 'Low', note: 'low-impedance range' },
] as const

type ContextFieldsProps = {
  edition: Edition
  draft: Draft
  onChange: (draft: Draft) => void
  /** Field → sentence. */
  errors: Readonly<Record<string, string>>
}

/** What feeds the wires, what system it is, how it is wired, and how hard the meter pulls. */
export function ContextFields({ edition, draft, onChange, errors }: ContextFieldsProps) {
  const { file } = edition
  const meterKind = draft.meter.kind
  const setMeter = (kind: Meter['kind']) =>
    onChange({ ...draft, meter: kind === 'low' ? { kind, ohms: '' } : { kind } })
  return (
    <div className="grid gap-5">
      <div>
        <p className="field-label" id="context-source">
          What feeds it
        </p>
        <OptionList
          labelledBy="context-source"
          ways={file.sources.map((source) => ({ value: source.id, label: source.label }))}
          value={draft.source}
          onChoose={(source) => onChange({ ...draft, source })}
        />
      </div>
      <div>
        <p className="field-label" id="context-system">
          System
        </p>
        <OptionList
          labelledBy="context-system"
          ways={file.systems.map((system) => ({ value: system.id, label: system.label }))}
          value={draft.system}
          onChoose={(system) => onChange({ ...draft, system })}
        />
      </div>
      <div>
        <p className="field-label" id="context-wiring">
          Wiring
        </p>
        <OptionList
          labelledBy="context-wiring"
          ways={file.wirings.map((wiring) => ({ value: wiring.id, label: wiring.label }))}
          value={draft.wiring}
          onChoose={(wiring) => onChange({ ...draft, wiring })}
        />
      </div>
      <div>
        <p className="field-label" id="context-meter">
          Your meter’s input resistance, on AC volts
        </p>
        <Ways
          labelledBy="context-meter"
          ways={meters.map(({ value, label, note }) => ({ value, label, ...(note === '' ? {} : { note }) }))}
          value={meterKind}
          onChoose={setMeter}
        />
        <p className="field-help">
          It is in the meter’s data sheet. A light meter shows ghosts; a low-resistance one pulls them away.
        </p>
        {draft.meter.kind === 'low' && (
          <TextField
            className="mt-3"
            label="Low input resistance, in ohms"
            help="About 3000 to 400 000 on most meters that have such a range"
            inputMode="decimal"
            value={draft.meter.ohms}
            onText={(ohms) => onChange({ ...draft, meter: { kind: 'low', ohms } })}
            error={errors['meter']}
          />
        )}
      </div>
    </div>
  )
}

/** A title of the sheet: where, and what is wrong. */
export function TitleField({ value, onText }: { value: string; onText: (text: string) => void }) {
  return (
    <Field label="Title" help="Where, and what is wrong: “Cabin: no GFCI will trip”">
      {(wiring) => (
        <input
          className="input"
          {...wiring}
          value={value}
          maxLength={80}
          onChange={(e) => onText(e.target.value)}
        />
      )}
    </Field>
  )
}
