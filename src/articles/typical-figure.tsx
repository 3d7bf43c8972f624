import { WhereGroundSits } from '../ui/where-ground-sits/where-ground-sits.tsx'
import { meterWeight } from '../../rules/triangle/weight.ts'
import type { Typical } from './cause-glyph.ts'

/** How a cause typically reads: the drawing and its readings in words. */
export function TypicalFigure({ readings }: { readings: Typical }) {
  const { hn, ng, hg, nominal, when } = readings
  return (
    <figure className="plate typical">
      <WhereGroundSits
        readings={readings}
        weight={meterWeight(10_000_000)}
        lengths
        width={460}
        height={212}
      />
      <figcaption>
        <b>How it reads.</b> Hot–neutral {hn} V, neutral–ground {ng} V, hot–ground {hg} V, to a 10 MΩ meter on
        a {nominal} V system{when === undefined ? '' : `, ${when}`}. An example: volts alone prove no cause.
      </figcaption>
    </figure>
  )
}
