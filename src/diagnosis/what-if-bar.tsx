import { Button } from '../ui/button.tsx'
import { useDesk } from './desk.ts'

/** While values are tried and not kept: said where nobody can miss it, with the two ways out. */
export function WhatIfBar() {
  const { typed, dispatch } = useDesk()
  if (typed.whatIf === null) return null
  return (
    <section className="plate-dashed what-if" aria-label="What if">
      <p>
        <b>What if.</b> What you type now is tried, not kept. The ranking beside it answers as if it had been
        read.
      </p>
      <div className="flex flex-wrap gap-2">
        <Button size="small" onPress={() => dispatch({ do: 'keep-what-if' })}>
          Keep
        </Button>
        <Button size="small" onPress={() => dispatch({ do: 'drop-what-if' })}>
          Drop
        </Button>
      </div>
    </section>
  )
}
