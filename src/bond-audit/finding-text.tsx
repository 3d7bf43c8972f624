import type { Exception } from '../../rules/bond-audit/exceptions.ts'
import type { Finding } from '../../rules/bond-audit/findings.ts'
import type { GroundCurrent } from '../../rules/bond-audit/ground-current.ts'
import { sections } from '../../rules/bond-audit/standards.ts'
import type { SectionId } from '../../rules/bond-audit/standards.ts'
import { Help } from '../ui/help.tsx'

/** Sections with what each says. From memory is said: check those against the adopted edition. */
function Sections({ ids }: { ids: readonly SectionId[] }) {
  return (
    <ul className="audit-sections">
      {ids.map((id) => {
        const { name, says, mark } = sections[id]
        return (
          <li key={id}>
            <b>{name}</b>
            {mark === 'memory' && ' (from memory)'}: {says}
          </li>
        )
      })}
    </ul>
  )
}

/** What is wrong, what it can do, ways to change it, what it rests on. */
export function FindingText({ finding }: { finding: Finding }) {
  return (
    <div className="audit-finding">
      <p>
        <b>{finding.says}</b> {finding.danger}
      </p>
      <Help summary="Ways to change it, and the code">
        <ul className="audit-ways">
          {finding.change.map((way) => (
            <li key={way}>{way}</li>
          ))}
        </ul>
        <Sections ids={finding.sections} />
      </Help>
    </div>
  )
}

/** What may stand, on which conditions. */
export function ExceptionText({ exception }: { exception: Exception }) {
  return (
    <div className="audit-exception">
      <p>
        <b>{exception.says}</b> Only while all of these hold:
      </p>
      <ul className="audit-ways">
        {exception.conditions.map((condition) => (
          <li key={condition}>{condition}</li>
        ))}
      </ul>
      <Sections ids={exception.sections} />
    </div>
  )
}

/** Amps to a tenth; thousandths under 0.1 A. */
export const inAmps = (amps: number): string =>
  amps >= 0.0995 ? `${amps.toFixed(1)} A` : `${Math.round(amps * 1000)} mA`

/** Where the neutral current goes with two bonds: one row a path. */
export function CurrentTable({ current }: { current: GroundCurrent }) {
  return (
    <Help summary={`Where ${current.loadAmps} A at ${current.at} return`}>
      <table className="audit-currents">
        <caption className="text-left">Over grounding conductors and soil; the rest by neutral.</caption>
        <thead>
          <tr>
            <th scope="col">Path</th>
            <th scope="col">Amps</th>
          </tr>
        </thead>
        <tbody>
          {current.paths.map(({ key, from, to, through, amps }) => (
            <tr key={`${key} ${through}`}>
              <th scope="row">
                {through === 'wire' ? `${from} to ${to}, ground wire` : `Soil, by the rod at ${from}`}
              </th>
              <td>{inAmps(amps)}</td>
            </tr>
          ))}
        </tbody>
      </table>
      <p className="mt-2">
        Resistances: NEC chapter 9 table 8 or IEC 60228, at 75 °C, stranded; connections as perfect.
        {current.assumed &&
          ' A run without a length counts as next to nothing: give lengths to have these right.'}
      </p>
    </Help>
  )
}
