import { useId } from 'react'
import type { KeyboardEvent, Ref } from 'react'
import { Icon } from './icon.tsx'

type SearchBoxProps = {
  /** Read aloud; not drawn. */
  label: string
  placeholder?: string
  value: string
  onText: (text: string) => void
  onSubmit?: () => void
  onKeyDown?: (event: KeyboardEvent<HTMLInputElement>) => void
  /** Id of the list it fills, for readers. */
  controls?: string
  describedBy?: string
  ref?: Ref<HTMLInputElement>
}

/** A search field with its lens. Enter sends it. */
export function SearchBox(props: SearchBoxProps) {
  const id = useId()
  return (
    <form
      role="search"
      className="seek"
      onSubmit={(event) => {
        event.preventDefault()
        props.onSubmit?.()
      }}
    >
      <label className="sr-only" htmlFor={id}>
        {props.label}
      </label>
      <Icon name="search" />
      <input
        id={id}
        ref={props.ref}
        className="input"
        type="search"
        enterKeyHint="search"
        autoComplete="off"
        spellCheck={false}
        placeholder={props.placeholder}
        value={props.value}
        aria-controls={props.controls}
        aria-describedby={props.describedBy}
        onKeyDown={props.onKeyDown}
        onChange={(event) => props.onText(event.target.value)}
      />
    </form>
  )
}
