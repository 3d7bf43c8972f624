import type { CauseRow, Misfit } from '../../rules/ranking/diagnosis-types.ts'
import { Button } from '../ui/button.tsx'
import { useDesk } from './desk.ts'
import { findingLabel, modeLabel, percent } from './words.ts'

type MisfitPlateProps = {
  misfit: Misfit
  leader: CauseRow | undefined
  /** Something stops: nobody is sent back to a reading before that is dealt with. */
  stopped: boolean
}

/** No single cause fits: why, and what to take again. No verdict stands beside it. */
export function MisfitPlate({ misfit, leader, stopped }: MisfitPlateProps) {
  const { edition, typed, go } = useDesk()
  const { because, again, mode } = misfit
  const elsewhere = mode !== typed.mode ? `, ${modeLabel(edition, mode).toLowerCase()}` : ''
  return (
    <div className="plate-dashed mt-3">
      <p className="font-bold">No single cause fits.</p>
      <p className="mt-1">
        {because} {leader && `The best cause is at ${percent(leader.share)} %.`}{' '}
        {stopped
          ? 'Nothing is taken again before what the danger panel says has been done and proved.'
          : 'Nothing is concluded before it has been taken again; two faults at once look like this too.'}
      </p>
      {again !== '' && !stopped && (
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
