import { useId } from 'react'
import type { KeyboardEvent, ReactNode, Ref } from 'react'
import { FieldError } from './field.tsx'
import { Icon } from './icon.tsx'
import { PairDiscs } from './pair-discs.tsx'
import type { PairId } from './pair-discs.tsx'

type ReadingFieldProps = {
  /** Draws the two discs; leave out for a clamp or a rating. */
  pair?: PairId | undefined
  label: string
  unit: string
  /** As typed; the caller reads it as a number. */
  text: string
  onText: (text: string) => void
  /** The second number of an unsteady reading; undefined: it is steady. */
  upper?: string | undefined
  onUpper?: (text: string) => void
  /** Instrument, condition, expected band: the line beneath the number. */
  with?: ReactNode
  /**
   * `odd`: outside every cause's band (dashed). `bad`: can't be (rust). `lent`: the homeowner's (dotted).
   */
  look?: 'taken' | 'odd' | 'bad' | 'lent'
  /** One sentence beneath, in rust. */
  error?: string | undefined
  /** A question with one answer to take: "Meant 57.2?". */
  question?: { text: string; answer: string; onTake: () => void } | undefined
  /** The field the pad types into, when focus lies elsewhere. */
  chosen?: boolean
  /** Our own pad is up: keep the system's away. A hardware keyboard still types. */
  ownPad?: boolean
  onFocus?: (which: 'lower' | 'upper') => void
  onLeave?: () => void
  onKeyDown?: (event: KeyboardEvent<HTMLInputElement>) => void
  /** Beside the label: a menu for loaded, other instrument, note, remove. */
  menu?: ReactNode
  ref?: Ref<HTMLInputElement>
  upperRef?: Ref<HTMLInputElement>
  className?: string
}

/** One reading: what is measured, the number, its unit and under which condition it was taken. */
export function ReadingField(props: ReadingFieldProps) {
  const id = useId()
  const { upper, error, question, look = 'taken' } = props
  const bad = error !== undefined || look === 'bad'
  const classes = [
    'reading',
    props.chosen && 'reading-chosen',
    bad ? 'reading-bad' : look !== 'taken' && `reading-${look}`,
  ]
  const common = {
    type: 'text',
    inputMode: props.ownPad === true ? 'none' : 'decimal',
    autoComplete: 'off',
    spellCheck: false,
    placeholder: '…',
    onBlur: props.onLeave,
    onKeyDown: props.onKeyDown,
    'aria-invalid': bad || undefined,
    'aria-describedby': `${id}-with${error === undefined ? '' : ` ${id}-error`}`,
  } as const
  return (
    <div className={props.className}>
      <div className={classes.filter(Boolean).join(' ')}>
        <span className="reading-of">
          <label htmlFor={id} className="inline-flex min-w-0 flex-1 items-center gap-[6px]">
            {props.pair && <PairDiscs pair={props.pair} />} {props.label}
          </label>
          {props.menu}
        </span>
        {/* Any tap on the plate goes to the number. */}
        <label className="reading-value" htmlFor={id}>
          <span className="sr-only">{`${props.label}, `}</span>
          <input
            {...common}
            id={id}
            ref={props.ref}
            value={props.text}
            onFocus={() => props.onFocus?.('lower')}
            onChange={(event) => props.onText(event.target.value)}
          />
          {upper !== undefined && (
            <>
              <span aria-hidden="true">–</span>
              <input
                {...common}
                ref={props.upperRef}
                aria-label={`${props.label}, wanders up to`}
                value={upper}
                onFocus={() => props.onFocus?.('upper')}
                onChange={(event) => props.onUpper?.(event.target.value)}
              />
            </>
          )}
          <span className="reading-unit">{props.unit}</span>
        </label>
        <span className="reading-with" id={`${id}-with`}>
          {props.with}
        </span>
      </div>
      {error !== undefined && <FieldError id={`${id}-error`}>{error}</FieldError>}
      {question !== undefined && (
        <p className="mt-1 flex flex-wrap items-center gap-2 text-small font-semibold text-rust">
          <Icon name="close" className="h-[20px] w-[20px]" />
          {question.text}
          <button type="button" className="link-alone text-glow underline" onClick={question.onTake}>
            {question.answer}
          </button>
        </p>
      )}
    </div>
  )
}

/** A reading this person may not take: named, not offered. */
export function ShutReading({ pair, label, because }: { pair?: PairId; label: string; because: string }) {
  return (
    <div className="reading reading-shut">
      <span className="reading-of">
        {pair && <PairDiscs pair={pair} />} {label}
      </span>
      <Icon name="lock" className="my-1" />
      <span className="reading-with">{because}</span>
    </div>
  )
}
