import { CheckRow } from '../ui/tick.tsx'

const keys: readonly [string, string][] = [
  ['s', 'search the findings'],
  ['m', 'operating mode; arrows move, space chooses'],
  ['1 – 5', 'place, from the source on'],
  ['h  n  g', 'hot–neutral, neutral–ground, hot–ground; then type digits'],
  ['l', 'the same with the load on'],
  ['Enter', 'next side'],
  ['Backspace', 'in an empty field: removes the reading'],
  ['Ctrl + Z', 'undo'],
  ['t', 'the next test'],
  ['c', 'the causes; then arrows, Home, End; Enter opens the evidence'],
]

type KeysListProps = { letters: boolean; onLetters: (on: boolean) => void }

/** What the keyboard does on this page. */
export function KeysList({ letters, onLetters }: KeysListProps) {
  return (
    <section className="keys-list" aria-label="Keys">
      <dl>
        {keys.map(([key, does]) => (
          <div key={key}>
            <dt>
              <kbd>{key}</kbd>
            </dt>
            <dd>{does}</dd>
          </div>
        ))}
      </dl>
      <CheckRow checked={letters} onChange={onLetters}>
        Single letters and digits act as keys while no field has the cursor
      </CheckRow>
    </section>
  )
}
