import type { Bond, BondLine } from '../../rules/ranking/diagnosis-types.ts'
import { Icon } from '../ui/icon.tsx'
import { Tick } from '../ui/tick.tsx'
import { useDesk } from './desk.ts'
import { readingOf } from './sheet-content.ts'
import { modeLabel } from './words.ts'

/** The findings that decide each line, to be entered from here. The fifth is decided by all of them. */
const findingsOf: Readonly<Record<BondLine['line'], readonly string[]>> = {
  1: ['source.bulb.ng.volts', 'source.bulb.hg.volts'],
  2: ['source.bulb.hn.volts'],
  3: ['bulb.proved'],
  4: ['instructions.bond'],
  5: [],
}

function Line({ line, mode }: { line: BondLine; mode: string }) {
  const { go } = useDesk()
  const findings = findingsOf[line.line]
  return (
    <li className="bond-line">
      <Tick state={line.met ? 'yes' : line.line === 5 ? 'no' : 'open'} />
      <span>
        {line.says}
        <span className="sr-only">: {line.met ? 'met' : 'not met'}</span>
      </span>
      {!line.met && findings.length > 0 && (
        <button type="button" className="link-alone text-glow underline" onClick={() => go(findings, mode)}>
          Enter<span className="sr-only"> for line {line.line}</span>
        </button>
      )}
    </li>
  )
}

function Released({ bond }: { bond: Bond }) {
  const { edition, stored } = useDesk()
  const volts = ['source.bulb.ng.volts', 'source.bulb.hg.volts'].map(
    (id) => readingOf(stored, bond.mode, id)?.text,
  )
  return (
    <section className="plate bond-plate" aria-labelledby="bond-title">
      <Icon name="tick" />
      <div>
        <h2 id="bond-title" className="text-body font-bold">
          Installing a bond: released
        </h2>
        <p className="text-small">
          Test bulb {volts.join(' and ')} V across it, {modeLabel(edition, bond.mode).toLowerCase()},
          hot–neutral up; bulb proved; instructions allow it. One bond, at the source, by a qualified person;
          then prove it in every mode. Local code and the authority having jurisdiction decide.
        </p>
      </div>
    </section>
  )
}

type BondPlateProps = {
  bond: Bond
  /** Values are only tried: nothing is released by them. */
  trying: boolean
  /** Entries that can't be read: what they say might speak against it. */
  unread: boolean
}

/** Installing a bond, held back until the five lines hold. No share, however high, says otherwise. */
export function BondPlate({ bond, trying, unread }: BondPlateProps) {
  if (bond.state === 'released' && !trying && !unread) return <Released bond={bond} />
  const against = bond.lines.find((line) => line.line === 5 && !line.met)
  return (
    <section className="plate-dashed bond-plate" aria-labelledby="bond-title">
      <Icon name="lock" />
      <div className="min-w-0">
        <h2 id="bond-title" className="text-body font-bold">
          Held back: installing a bond
        </h2>
        {against && (
          <p className="text-small font-bold">
            Never while this stands. {against.says}. A second tie, or a bond on a balanced output, can destroy
            the source or make its case live.
          </p>
        )}
        {trying && <p className="text-small font-bold">Values that are only tried release nothing.</p>}
        {unread && <p className="text-small font-bold">An entry can’t be read. It is mended first.</p>}
        <p className="text-small">Released when all five hold, in one mode; no share releases it.</p>
      </div>
      <ol className="bond-lines" aria-label="What releases it">
        {bond.lines.map((line) => (
          <Line key={line.line} line={line} mode={bond.mode} />
        ))}
      </ol>
    </section>
  )
}
