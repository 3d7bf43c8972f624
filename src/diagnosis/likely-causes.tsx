import { useState } from 'react'
import type { KeyboardEvent } from 'react'
import type { CauseRow as Row, Diagnosis } from '../../rules/ranking/diagnosis-types.ts'
import type { Article } from '../../rules/edition/schema.ts'
import { Button } from '../ui/button.tsx'
import { Rail } from '../ui/rail.tsx'
import { CauseRow } from './cause-row.tsx'
import { useDesk } from './desk.ts'
import { MisfitPlate } from './misfit-plate.tsx'
import { inSentence, percent, unexplained } from './words.ts'

const shownAtFirst = 4
/** Share from which it is worth saying whether one cause explains all. */
const worthSaying = 0.5

const idOf = (row: Row) => row.causes.map((one) => one.cause).join('-')
/** Share of a row's causes in the ranking before. */
function shareIn(diagnosis: Diagnosis | undefined, row: Row): number | undefined {
  if (diagnosis === undefined) return undefined
  const ids = row.causes.map((one) => one.cause)
  return diagnosis.ranking.filter((one) => ids.includes(one.cause)).reduce((sum, one) => sum + one.share, 0)
}

/** Arrows, Home and End move between the causes; Enter opens the one the cursor is on. */
function moveInList(event: KeyboardEvent<HTMLOListElement>): void {
  const heads = [...event.currentTarget.querySelectorAll<HTMLElement>('[data-cause]')]
  const at = heads.findIndex((head) => head === document.activeElement)
  if (at < 0) return
  const to = { ArrowDown: at + 1, ArrowUp: at - 1, Home: 0, End: heads.length - 1 }[event.key]
  if (to === undefined) return
  event.preventDefault()
  heads[Math.min(heads.length - 1, Math.max(0, to))]?.focus()
}

function WholeStory({ leader }: { leader: Row | undefined }) {
  const against = leader?.causes[0] && unexplained(leader.causes[0])
  if (leader === undefined || leader.share < worthSaying) return null
  return against === undefined ? (
    <>One cause explains all of this: yes.</>
  ) : (
    <>
      One cause explains all of this: no, it leaves “{inSentence(against.because).replace(/\.$/, '')}”
      unexplained.
    </>
  )
}

type LikelyCausesProps = {
  diagnosis: Diagnosis
  before: Diagnosis | undefined
  articleOf: (cause: string) => Article | undefined
}

/** The ranking: the first with its evidence, the rest by share; without a verdict where no single cause fits. */
export function LikelyCauses({ diagnosis, before, articleOf }: LikelyCausesProps) {
  const { edition } = useDesk()
  const { rows, misfit, nextTests } = diagnosis
  const [turned, setTurned] = useState<Readonly<Record<string, boolean>>>({})
  const [all, setAll] = useState(false)
  const shown = all ? rows : rows.slice(0, shownAtFirst)
  const rest = rows.slice(shownAtFirst)
  const restCount = rest.reduce((sum, row) => sum + row.causes.length, 0)
  const restShare = rest.reduce((sum, row) => sum + row.share, 0)
  const partingOf = (row: Row) => {
    const ids = row.causes.map((one) => one.cause)
    const tests = nextTests.filter((next) => ids.filter((id) => next.parts.includes(id)).length > 1)
    return [...new Set(tests.map((next) => edition.tests.get(next.test)?.label ?? next.test))].slice(0, 2)
  }
  return (
    <Rail
      title={misfit === undefined ? 'Likely causes' : 'As computed, no verdict'}
      action={
        <span className="text-note text-ink-2">
          <span className="dot" aria-hidden="true" /> before any finding
        </span>
      }
      className="likely"
      id="causes"
    >
      {misfit && <MisfitPlate misfit={misfit} leader={rows[0]} stopped={diagnosis.stops.length > 0} />}
      <ol className="causes" onKeyDown={moveInList}>
        {shown.map((row, rank) => {
          const id = idOf(row)
          const open = turned[id] ?? (rank === 0 && misfit === undefined)
          return (
            <CauseRow
              key={id}
              row={row}
              rank={misfit === undefined ? rank : rank + 1}
              open={open}
              onToggle={() => setTurned({ ...turned, [id]: !open })}
              was={shareIn(before, row)}
              articleOf={articleOf}
              parting={row.causes.length > 1 ? partingOf(row) : []}
            />
          )
        })}
      </ol>
      <div className="flex flex-wrap items-center justify-between gap-x-4 border-t border-rule pt-1 text-small">
        <span className="text-ink-2">
          {restCount > 0 && `${restCount} other causes share ${percent(restShare)} %. `}
          {misfit === undefined && <WholeStory leader={rows[0]} />}
        </span>
        {rest.length > 0 && (
          <Button look="plain" size="small" expanded={all} onPress={() => setAll(!all)}>
            {all ? 'Show fewer' : 'Show all'}
          </Button>
        )}
      </div>
    </Rail>
  )
}
