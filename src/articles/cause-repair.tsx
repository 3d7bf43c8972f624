import { Link } from 'react-router-dom'
import type { CauseProcedure, Remedy } from '../../rules/edition/schema.ts'
import { HazardMark } from '../ui/hazard-mark.tsx'
import { Icon } from '../ui/icon.tsx'
import { Steps } from '../ui/steps.tsx'
import { addressOf } from './hit-row.tsx'
import type { Knowledge } from './knowledge.ts'

/** A repair that installs a bond is named, never told: only a findings sheet can release it. */
function HeldBack() {
  return (
    <div className="plate-dashed mt-3">
      <p className="flex items-start gap-3 font-bold">
        <Icon name="lock" />
        <span>Installing a bond: held back</span>
      </p>
      <p className="mt-2 text-small">
        Released on a findings sheet only, by readings with the test bulb at the source’s own terminals. A
        balanced output reads the same on most meters; bonded, it short-circuits half of itself or makes its
        case live.{' '}
        <Link className="screen-only" to="/diagnosis">
          Go to Diagnosis
        </Link>
      </p>
    </div>
  )
}

const hazards = ['closed', 'closed-can-energize', 'open-dead', 'open-live'] as const

function Way({ remedy }: { remedy: Remedy }) {
  return remedy.installsBond === true ? <HeldBack /> : <Steps className="mt-3" steps={remedy.steps} />
}

/** Ways to put a cause right, by how much is opened and who may. */
export function Remedies({ remedies }: { remedies: readonly Remedy[] }) {
  return hazards.flatMap((hazard) =>
    (['anyone', 'qualified'] as const).map((who) => {
      const ways = remedies.filter((one) => one.hazard === hazard && one.who === who)
      if (ways.length === 0) return null
      const held = ways.filter((one) => one.installsBond === true).slice(0, 1)
      const told = ways.filter((one) => one.installsBond !== true)
      return (
        <div key={`${hazard} ${who}`} className="mt-5">
          <h3 className="flex flex-wrap items-center justify-between gap-x-4 gap-y-1">
            <span>{who === 'anyone' ? 'By anyone' : 'By a qualified person'}</span>
            <HazardMark hazard={hazard} />
          </h3>
          {[...told, ...held].map((remedy, index) => (
            <div key={index}>
              {index > 0 && <p className="mt-4 text-small font-bold">Or:</p>}
              <Way remedy={remedy} />
            </div>
          ))}
        </div>
      )
    }),
  )
}

/** Tests that part a cause from what looks like it, and how. */
export function LookAlikes({ knowledge, cause }: { knowledge: Knowledge; cause: CauseProcedure }) {
  return (
    <ul className="rows">
      {(cause.lookAlikes ?? []).map((other) => (
        <li key={`${other.cause} ${other.test}`}>
          <Link className="font-bold" to={addressOf('cause', other.cause)}>
            {knowledge.edition.causes.get(other.cause)?.title ?? other.cause}
          </Link>
          <p className="mt-1">{other.how}</p>
          <p className="mt-1 text-small">
            Test:{' '}
            <Link to={addressOf('test', other.test)}>
              {knowledge.edition.tests.get(other.test)?.title ?? other.test}
            </Link>
          </p>
        </li>
      ))}
    </ul>
  )
}

/** What has to be read after the repair, and in which modes. */
export function Proof({ knowledge, cause }: { knowledge: Knowledge; cause: CauseProcedure }) {
  return (
    <ul className="rows">
      {(cause.proof ?? []).map((proof, index) => (
        <li key={index}>
          <Link className="font-bold" to={addressOf('test', proof.test)}>
            {knowledge.edition.tests.get(proof.test)?.title ?? proof.test}
          </Link>
          <p className="mt-1">{proof.expect}</p>
          <p className="mt-1 text-small text-ink-2">
            {proof.modes === 'every' ? 'In every operating mode' : 'In the mode where it was found'}
          </p>
        </li>
      ))}
    </ul>
  )
}
