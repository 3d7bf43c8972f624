import { useId } from 'react'
import type { MouseEvent, ReactNode, Ref } from 'react'
import { Link } from 'react-router-dom'
import { Icon } from './icon.tsx'
import type { IconName } from './icon.tsx'

type Look = {
  /** `main`: the screen's one black button. `plain`: an underlined word. */
  look?: 'main' | 'outline' | 'plain'
  /** `glove` is 60 px high, `touch` 48, `small` 44. */
  size?: 'small' | 'touch' | 'glove'
  wide?: boolean
  /** Before the words. */
  icon?: IconName
  /** After the words: an arrow for "goes on". */
  iconAfter?: IconName
  className?: string
}

const classes = ({ look = 'outline', size = 'touch', wide = false, className = '' }: Look) =>
  [
    'btn',
    look !== 'outline' && `btn-${look}`,
    size !== 'touch' && `btn-${size}`,
    wide && 'btn-wide',
    className,
  ]
    .filter(Boolean)
    .join(' ')

type ButtonProps = Look & {
  children: ReactNode
  onPress?: (event: MouseEvent<HTMLButtonElement>) => void
  type?: 'button' | 'submit'
  /**
   * Bars the button and says why beneath it. It stays focusable, so that a reader hears the reason too.
   */
  barredBecause?: ReactNode
  pressed?: boolean
  expanded?: boolean
  controls?: string
  label?: string
  ref?: Ref<HTMLButtonElement>
}

/** A button. Barred, it is dashed and gives its reason. */
export function Button({
  children,
  onPress,
  type = 'button',
  barredBecause,
  pressed,
  expanded,
  controls,
  label,
  ref,
  ...look
}: ButtonProps) {
  const reason = useId()
  const barred = barredBecause !== undefined && barredBecause !== false
  return (
    <>
      <button
        ref={ref}
        type={barred ? 'button' : type}
        className={classes(barred && look.look === 'main' ? { ...look, look: 'outline' } : look)}
        aria-disabled={barred || undefined}
        aria-describedby={barred ? reason : undefined}
        aria-pressed={pressed}
        aria-expanded={expanded}
        aria-controls={controls}
        aria-label={label}
        onClick={(event) => {
          if (!barred) onPress?.(event)
        }}
      >
        {look.icon && <Icon name={look.icon} />}
        <span>{children}</span>
        {look.iconAfter && <Icon name={look.iconAfter} />}
      </button>
      {barred && (
        <p id={reason} className="mt-2 text-center text-note text-ink-2">
          {barredBecause}
        </p>
      )}
    </>
  )
}

type LinkButtonProps = Look & { to: string; children: ReactNode; replace?: boolean; onPress?: () => void }

/** A link that looks like a button, because it is the step to take. */
export function LinkButton({ to, children, replace, onPress, ...look }: LinkButtonProps) {
  return (
    <Link to={to} replace={replace ?? false} className={classes(look)} onClick={onPress}>
      {look.icon && <Icon name={look.icon} />}
      <span>{children}</span>
      {look.iconAfter && <Icon name={look.iconAfter} />}
    </Link>
  )
}

/** A link to call a telephone number, as a button. */
export function CallButton({ number, children, ...look }: Look & { number: string; children: ReactNode }) {
  return (
    <a href={`tel:${number.replace(/\D/g, '')}`} className={classes(look)}>
      <Icon name="phone" />
      <span>{children}</span>
    </a>
  )
}
