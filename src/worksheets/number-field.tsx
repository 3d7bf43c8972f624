import { Field } from '../ui/field.tsx'
import type { NumberPart } from './forms/parts.ts'

const unitWords: Readonly<Record<string, string>> = {
  V: 'volts',
  A: 'amps',
  mA: 'milliamps',
  W: 'watts',
  Ω: 'ohms',
  'Ω·m': 'ohm-meters',
  s: 'seconds',
  ft: 'feet',
  m: 'meters',
  in: 'inches',
  mm: 'millimeters',
  Hz: 'hertz',
  '°C': 'degrees Celsius',
  '×': 'times',
}

type NumberFieldProps = {
  part: NumberPart
  value: string
  error: string | undefined
  onText: (text: string) => void
  onLeave: () => void
}

/** A number with its unit behind it, and what is often typed there. */
export function NumberField({ part, value, error, onText, onLeave }: NumberFieldProps) {
  const { label, unit, help, often } = part
  const words = unitWords[unit]
  return (
    <Field
      label={
        <>
          {label}
          {words !== undefined && <span className="sr-only">, {words}</span>}
        </>
      }
      {...(help !== undefined && { help })}
      error={error}
    >
      {(wiring) => (
        <>
          <span className="ws-number">
            <input
              className="input"
              {...wiring}
              inputMode="decimal"
              autoComplete="off"
              value={value}
              onChange={(event) => onText(event.target.value)}
              onBlur={onLeave}
            />
            {unit !== '' && <span aria-hidden="true">{unit}</span>}
          </span>
          {often && (
            <span className="ws-often">
              {often.map((one) => (
                <button
                  key={one.value}
                  type="button"
                  className="opt"
                  aria-pressed={one.value === value}
                  aria-label={`${label}: ${one.label}`}
                  onClick={() => onText(one.value)}
                >
                  {one.label}
                </button>
              ))}
            </span>
          )}
        </>
      )}
    </Field>
  )
}
