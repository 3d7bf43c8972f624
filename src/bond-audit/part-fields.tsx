import type { Panel, Part, Receptacle, System } from '../../rules/bond-audit/system.ts'
import { CheckRow } from '../ui/tick.tsx'
import { FeedFields, partChoices, RunFields } from './feed-fields.tsx'
import { Choice, NumberField } from './fields.tsx'
import { voltageWords } from './part-words.ts'
import { SourceFields } from './source-fields.tsx'
import { SwitchFields } from './switch-fields.tsx'

export type PartFieldsProps<P extends Part = Part> = {
  part: P
  system: System
  errorAt: (field: string) => string | undefined
  onPart: (part: Part) => void
}

function PanelFields({ part, onPart }: PartFieldsProps<Panel>) {
  const { outbuilding, ...inside } = part
  return (
    <>
      <Choice
        label="Kind"
        value={part.role}
        of={[
          ['main', 'Service panel: the utility’s first disconnect'],
          ['sub', 'Any other panel'],
        ]}
        onChoose={(role) => onPart({ ...part, role })}
      />
      <div>
        <CheckRow checked={part.bond} onChange={(bond) => onPart({ ...part, bond })}>
          Bond screw or strap in
        </CheckRow>
        <CheckRow checked={part.multiwire} onChange={(multiwire) => onPart({ ...part, multiwire })}>
          Some circuits have two hots that share a neutral
        </CheckRow>
        <CheckRow
          checked={outbuilding !== undefined}
          onChange={(apart) =>
            onPart(apart ? { ...part, outbuilding: { oldFeeder: false, noMetalPath: false } } : inside)
          }
        >
          In a building of its own
        </CheckRow>
        {outbuilding !== undefined && (
          <>
            <CheckRow
              checked={outbuilding.oldFeeder}
              onChange={(oldFeeder) => onPart({ ...part, outbuilding: { ...outbuilding, oldFeeder } })}
            >
              Its feeder was there before a grounding conductor was asked for
            </CheckRow>
            <CheckRow
              checked={outbuilding.noMetalPath}
              onChange={(noMetalPath) => onPart({ ...part, outbuilding: { ...outbuilding, noMetalPath } })}
            >
              No pipe, shield or other metal joins the buildings
            </CheckRow>
          </>
        )}
      </div>
    </>
  )
}

function ReceptacleFields({ part, system, errorAt, onPart }: PartFieldsProps<Receptacle>) {
  const { neutralAt, ...plain } = part
  const panels = system.parts.flatMap((one): [string, string][] =>
    one.kind === 'panel' ? [[one.id, one.name]] : [],
  )
  return (
    <>
      <Choice
        label="Neutral to ground here"
        value={part.bond}
        of={[
          ['none', 'Not joined'],
          ['jumper', 'Joined by a jumper'],
          ['existing-range', 'An existing range’s or dryer’s frame on its neutral'],
        ]}
        onChoose={(bond) => onPart({ ...part, bond })}
      />
      <CheckRow checked={part.gfci} onChange={(gfci) => onPart({ ...part, gfci })}>
        A GFCI receptacle
      </CheckRow>
      <Choice
        label="Its neutral lands in"
        value={neutralAt ?? ''}
        of={[['', 'The panel its hot comes from'], ...panels]}
        error={errorAt('neutralAt')}
        onChoose={(id) => onPart(id === '' ? plain : { ...part, neutralAt: id })}
      />
    </>
  )
}

/** The fields that only this kind of part has. */
function OwnFields({ part, ...rest }: PartFieldsProps) {
  const { system, errorAt, onPart } = rest
  switch (part.kind) {
    case 'source':
      return <SourceFields source={part} system={system} errorAt={errorAt} onSource={onPart} />
    case 'switch':
      return <SwitchFields part={part} system={system} errorAt={errorAt} onSwitch={onPart} />
    case 'panel':
      return <PanelFields part={part} {...rest} />
    case 'receptacle':
      return <ReceptacleFields part={part} {...rest} />
    case 'transformer':
      return (
        <>
          <Choice
            label="Output"
            value={part.volts}
            of={voltageWords}
            onChoose={(volts) => onPart({ ...part, volts })}
          />
          <CheckRow checked={part.bond} onChange={(bond) => onPart({ ...part, bond })}>
            Its secondary neutral is bonded to its case
          </CheckRow>
        </>
      )
    case 'autotransformer':
      return (
        <Choice
          label="Its neutral"
          value={part.bond}
          of={[
            ['none', 'No bond of its own'],
            ['fixed', 'Bonded to its case'],
            ['relay', 'Bonded by a relay while utility is away'],
          ]}
          onChoose={(bond) => onPart({ ...part, bond })}
        />
      )
    case 'rod':
      return (
        <>
          <Choice
            label="Tied to"
            value={part.at}
            of={partChoices(system, part.id)}
            error={errorAt('at')}
            onChoose={(at) => onPart({ ...part, at })}
          />
          <NumberField
            label="To earth"
            unit="Ω"
            value={part.ohms}
            least={0.1}
            most={10_000}
            onValue={(ohms) => onPart({ ...part, ohms })}
          />
        </>
      )
    case 'ground-wire': {
      const { run: _run, ...bare } = part
      return (
        <>
          {(['from', 'to'] as const).map((end) => (
            <Choice
              key={end}
              label={end === 'from' ? 'From' : 'To'}
              value={part[end]}
              of={partChoices(system, part.id)}
              error={errorAt(end)}
              onChoose={(id) => onPart({ ...part, [end]: id })}
            />
          ))}
          <RunFields
            run={part.run}
            units={system.units}
            onRun={(run) => onPart(run === undefined ? bare : { ...part, run })}
          />
        </>
      )
    }
  }
}

/** All fields of a part but its name. */
export function PartFields(props: PartFieldsProps) {
  const { part, system, errorAt, onPart } = props
  return (
    <>
      <OwnFields {...props} />
      {'feed' in part && (
        <FeedFields
          partId={part.id}
          label="What feeds it"
          feed={part.feed}
          system={system}
          error={errorAt('feed')}
          onFeed={(feed) => onPart({ ...part, feed })}
        />
      )}
    </>
  )
}
