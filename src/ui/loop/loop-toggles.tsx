import { useId } from 'react'
import type { LoopOptions, LoopStateName } from '../../../rules/loop/loop-options.ts'
import { Button } from '../button.tsx'
import { CheckRow } from '../tick.tsx'
import { Ways } from '../ways.tsx'

const states: readonly { value: LoopStateName; label: string }[] = [
  { value: 'load', label: 'Load running' },
  { value: 'fault', label: 'Hot touches metal' },
]

type LoopTogglesProps = {
  options: LoopOptions
  /** What the cause's own wiring has. */
  own: Omit<LoopOptions, 'state'>
  /** Without a panel there is no other end for a second bond. */
  panel: boolean
  onTurn: (part: Partial<LoopOptions>) => void
  onAsFound: () => void
  still: boolean
  onStill: (still: boolean) => void
}

/** What is drawn: which state, and with which bonds and rods. It changes the picture and nothing else. */
export function LoopToggles({ options, own, panel, onTurn, onAsFound, still, onStill }: LoopTogglesProps) {
  const note = useId()
  const changed = (['bond', 'rod', 'secondBond'] as const).some((part) => options[part] !== own[part])
  return (
    <div className="loop-toggles screen-only">
      <fieldset>
        <legend>Drawn while</legend>
        <Ways
          label="Drawn while"
          ways={states}
          value={options.state}
          onChoose={(state) => onTurn({ state })}
        />
      </fieldset>
      <fieldset aria-describedby={note}>
        <legend>Drawn with</legend>
        <div className="loop-checks">
          <CheckRow checked={options.bond} onChange={(bond) => onTurn({ bond })}>
            Bond
          </CheckRow>
          {panel && (
            <CheckRow checked={options.secondBond} onChange={(secondBond) => onTurn({ secondBond })}>
              Second bond
            </CheckRow>
          )}
          <CheckRow checked={options.rod} onChange={(rod) => onTurn({ rod })}>
            Ground rod
          </CheckRow>
        </div>
      </fieldset>
      <p id={note} className="loop-note">
        {changed ? 'Not as this cause leaves it. ' : 'As this cause leaves it. '}
        The picture alone changes: it releases no bond.
      </p>
      <div className="loop-buttons">
        {changed && (
          <Button size="small" look="plain" onPress={onAsFound}>
            As this cause leaves it
          </Button>
        )}
        <span className="loop-motion">
          <Button size="small" look="plain" pressed={still} onPress={() => onStill(!still)}>
            Hold still
          </Button>
        </span>
      </div>
    </div>
  )
}
