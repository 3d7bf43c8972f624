import { useId } from 'react'
import type { ReactNode } from 'react'
import type { Flat } from '../../rules/worksheets/address.ts'
import { Button } from '../ui/button.tsx'
import { rowCount } from './forms/parts.ts'
import type { RowsPart } from './forms/parts.ts'

/** The values without one row; those after it move up. */
function withoutRow(values: Flat, name: string, index: number): Flat {
  const kept: Record<string, string> = {}
  for (const [key, value] of Object.entries(values)) {
    const [first, at, ...rest] = key.split('.')
    const row = Number(at)
    if (first !== name || !Number.isInteger(row)) kept[key] = value
    else if (row !== index) kept[[name, row > index ? row - 1 : row, ...rest].join('.')] = value
  }
  return kept
}

/** The values with one row more, like the last one, since runs and loads of a house are alike. */
function withRow(values: Flat, { name, blank }: RowsPart): Flat {
  const count = rowCount(values, name)
  const added = Object.entries(blank).map(([key, value]) => [
    `${name}.${count}.${key}`,
    values[`${name}.${count - 1}.${key}`] ?? value,
  ])
  return { ...values, ...(Object.fromEntries(added) as Flat) }
}

type RowsProps = {
  part: RowsPart
  values: Flat
  onReplace: (values: Flat) => void
  children: (at: string) => ReactNode
}

/** Runs or loads one after the other; one can be added, and taken away while there are two. */
export function Rows({ part, values, onReplace, children }: RowsProps) {
  const count = rowCount(values, part.name)
  const id = useId()
  return (
    <>
      {Array.from({ length: count }, (_, index) => (
        <div key={index} className="ws-row" role="group" aria-labelledby={`${id}-${index}`}>
          <div className="ws-row-head">
            <h3 id={`${id}-${index}`}>
              {part.noun} {index + 1}
            </h3>
            {count > 1 && (
              <Button
                look="plain"
                size="small"
                icon="remove"
                label={`Remove ${part.noun.toLowerCase()} ${index + 1}`}
                onPress={() => onReplace(withoutRow(values, part.name, index))}
              >
                Remove
              </Button>
            )}
          </div>
          <div className="ws-fields">{children(`${part.name}.${index}`)}</div>
        </div>
      ))}
      <Button
        icon="plus"
        wide
        {...(count >= part.most && { barredBecause: `${part.most} is the most this sheet takes.` })}
        onPress={() => onReplace(withRow(values, part))}
      >
        {part.noun}
      </Button>
    </>
  )
}
