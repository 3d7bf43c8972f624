import type { CauseRow, Misfit } from '../../rules/ranking/diagnosis-types.ts'
import { Button } from '../ui/button.tsx'
import { useDesk } from './desk.ts'
import { findingLabel, modeLabel, percent } from './words.ts'

/** No single cause fits: why, and what to take again. No verdict stands beside it. */
export function MisfitPlate({ misfit, leader }: { misfit: Misfit; leader: CauseRow | undefined }) {
  const { edition, typed, go } = useDesk()
  const { because, again, mode } = misfit
  const elsewhere = mode !== typed.mode ? `, ${modeLabel(edition, mode).toLowerCase()}` : ''
  return (
    <div className="plate-dashed mt-3">
      <p className="font-bold">No single cause fits.</p>
      <p className="mt-1">
        {because} {leader && `The best cause is at ${percent(leader.share)} %.`} Nothing is concluded before
        it has been taken again; two faults at once look like this too.
      </p>
      {again !== '' && (
        <div className="mt-3">
          <Button look="main" onPress={() => go([again], mode)}>
            Take again: {findingLabel(edition, again)}
            {elsewhere}
          </Button>
        </div>
      )}
    </div>
  )
}
