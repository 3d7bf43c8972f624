import type { ReactNode } from 'react'
import { useRoving } from './use-roving.ts'

type Way<Value extends string> = {
  value: Value
  label: ReactNode
  /** Second line, smaller: "7 readings". */
  note?: ReactNode
  /** Before the label: a tester lamp, for example. */
  mark?: ReactNode
}

type GroupProps<Value extends string> = {
  ways: readonly Way<Value>[]
  /** The chosen one, or undefined while nobody has answered. */
  value: Value | undefined
  onChoose: (value: Value) => void
  /** Name of the group for readers; or the id of what names it. */
  label?: string
  labelledBy?: string
  describedBy?: string
  className?: string
}

/** The buttons of a radio group. Choosing the chosen one again calls back too, so a caller may take it back. */
function Choices<Value extends string>(props: GroupProps<Value> & { group: string }) {
  const { ways, value, onChoose, group } = props
  const roving = useRoving(
    ways.length,
    ways.findIndex((way) => way.value === value),
  )
  return (
    <div
      className={`${group} ${props.className ?? ''}`}
      role="radiogroup"
      aria-label={props.label}
      aria-labelledby={props.labelledBy}
      aria-describedby={props.describedBy}
    >
      {ways.map((way, index) => (
        <button
          key={way.value}
          type="button"
          className="opt"
          role="radio"
          aria-checked={way.value === value}
          {...roving.item(index)}
          onClick={() => onChoose(way.value)}
        >
          {way.mark}
          <span>
            {way.label}
            {way.note !== undefined && <small>{way.note}</small>}
          </span>
        </button>
      ))}
    </div>
  )
}

type WaysProps<Value extends string> = GroupProps<Value> & {
  /** `glove`: 60 px high. `lamps`: a drawing beside each word. */
  size?: 'touch' | 'glove' | 'lamps'
}

/** Two to four ways side by side, one chosen: mode, yes or no, lit or dim or dark. Arrows move, space chooses. */
export function Ways<Value extends string>({ size = 'touch', ...rest }: WaysProps<Value>) {
  return <Choices {...rest} group={size === 'touch' ? 'ways' : `ways ways-${size}`} />
}

/** A longer list of big options one below the other, one chosen. */
export function OptionList<Value extends string>(props: GroupProps<Value>) {
  return <Choices {...props} group="opt-list" />
}
