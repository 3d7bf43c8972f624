import type { Source, System } from '../../rules/bond-audit/system.ts'
import { CheckRow } from '../ui/tick.tsx'
import { Choice } from './fields.tsx'
import { outputWords, sourceTypes, voltageWords } from './part-words.ts'

type SourceFieldsProps = {
  source: Source
  system: System
  errorAt: (field: string) => string | undefined
  onSource: (source: Source) => void
}

/** A source: what it is, what it gives, what ties its neutral to ground. */
export function SourceFields({ source, system, errorAt, onSource }: SourceFieldsProps) {
  const put = (more: Partial<Source>) => onSource({ ...source, ...more })
  const relay = (when: Source['relay'][number]) => (closed: boolean) =>
    put({ relay: closed ? [...source.relay, when] : source.relay.filter((one) => one !== when) })
  const others = system.parts.flatMap((part): [string, string][] =>
    part.kind === 'source' && part.id !== source.id ? [[part.id, part.name]] : [],
  )
  const { parallel, ...alone } = source
  return (
    <>
      <Choice
        label="Kind"
        value={source.type}
        of={sourceTypes}
        error={errorAt('kind')}
        onChoose={(type) => put({ type })}
      />
      <Choice label="Output" value={source.volts} of={voltageWords} onChoose={(volts) => put({ volts })} />
      <Choice
        label="Its neutral"
        value={source.output}
        of={outputWords}
        error={errorAt('output')}
        help={
          source.type === 'utility'
            ? 'In North America the service panel holds the bond: leave this floating. Bonded: a 230 V supply whose utility brings neutral and ground apart.'
            : 'As its instructions say, or as Diagnosis found it. A reading of half means balanced or floating, never bonded.'
        }
        onChoose={(output) => put({ output })}
      />
      <div>
        {source.output === 'relay' && (
          <>
            <CheckRow checked={source.relay.includes('own-power')} onChange={relay('own-power')}>
              The relay closes while it makes power itself
            </CheckRow>
            <CheckRow checked={source.relay.includes('passing-through')} onChange={relay('passing-through')}>
              It is closed while it passes another source through
            </CheckRow>
          </>
        )}
        <CheckRow checked={source.gfci} onChange={(gfci) => put({ gfci })}>
          Its receptacles or its output have ground-fault protection
        </CheckRow>
      </div>
      {others.length > 0 && (
        <Choice
          label="In parallel with"
          value={parallel?.with ?? ''}
          of={[['', 'Nothing: its own wires'], ...others]}
          error={errorAt('parallel')}
          onChoose={(id) =>
            onSource(
              id === '' ? alone : { ...source, parallel: { with: id, alone: parallel?.alone ?? true } },
            )
          }
        />
      )}
      {parallel !== undefined && (
        <CheckRow
          checked={parallel.alone}
          onChange={(goesOn) => put({ parallel: { ...parallel, alone: goesOn } })}
        >
          Either goes on when the other stops
        </CheckRow>
      )}
    </>
  )
}
