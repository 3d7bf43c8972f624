import type { Switch, System } from '../../rules/bond-audit/system.ts'
import { Button } from '../ui/button.tsx'
import { FeedFields } from './feed-fields.tsx'
import { Choice } from './fields.tsx'
import { notChosen } from './new-part.ts'

type SwitchFieldsProps = {
  part: Switch
  system: System
  errorAt: (field: string) => string | undefined
  onSwitch: (part: Switch) => void
}
const mostInputs = 6

/** A transfer switch: how it is moved, whether neutral moves with it, what it chooses between. */
export function SwitchFields({ part, system, errorAt, onSwitch }: SwitchFieldsProps) {
  const inverters = system.parts.flatMap((one): [string, string][] =>
    one.kind === 'source' && one.type !== 'utility' ? [[one.id, one.name]] : [],
  )
  const { inverter, ...plain } = part
  return (
    <>
      <Choice
        label="Operated"
        value={part.operated}
        of={[
          ['automatic', 'By itself'],
          ['manual', 'By hand: a switch, or interlocked breakers'],
          ['built-in', 'Built into an inverter'],
        ]}
        onChoose={(operated) =>
          onSwitch(
            operated === 'built-in'
              ? { ...part, operated, inverter: inverter ?? inverters[0]?.[0] ?? notChosen }
              : { ...plain, operated },
          )
        }
      />
      {part.operated === 'built-in' && (
        <Choice
          label="Built into"
          value={inverter ?? notChosen}
          of={inverters}
          error={errorAt('inverter')}
          onChoose={(id) => onSwitch({ ...part, inverter: id })}
        />
      )}
      <Choice
        label="Neutral"
        value={part.neutral}
        of={[
          ['solid', 'Not switched: joined right through'],
          ['switched', 'Switched with the hots'],
        ]}
        help="Count the poles: two for 120/240 V leave the neutral joined, three switch it."
        onChoose={(neutral) => onSwitch({ ...part, neutral })}
      />
      {part.inputs.map((feed, i) => (
        <div key={i}>
          <FeedFields
            partId={part.id}
            label={`Input ${i + 1}`}
            feed={feed}
            system={system}
            error={errorAt(`inputs.${i}`)}
            onFeed={(next) =>
              onSwitch({ ...part, inputs: part.inputs.map((old, k) => (k === i ? next : old)) })
            }
          />
          {part.inputs.length > 2 && (
            <Button
              look="plain"
              size="small"
              onPress={() => onSwitch({ ...part, inputs: part.inputs.filter((_, k) => k !== i) })}
            >
              Remove input {i + 1}
            </Button>
          )}
        </div>
      ))}
      {part.inputs.length < mostInputs && (
        <Button
          size="small"
          icon="plus"
          onPress={() =>
            onSwitch({
              ...part,
              inputs: [
                ...part.inputs,
                { from: notChosen, joined: 'wired', neutral: true, ground: true, gfci: false },
              ],
            })
          }
        >
          Another input
        </Button>
      )}
    </>
  )
}
