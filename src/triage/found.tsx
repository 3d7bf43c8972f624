import { Link } from 'react-router-dom'
import type { Edition } from '../../rules/edition/open.ts'
import type { CauseProcedure } from '../../rules/edition/schema.ts'
import type { Diagnosis, Misfit } from '../../rules/ranking/diagnosis-types.ts'
import { useArticles, useProcedures } from '../editions/edition.api.ts'
import { Rail } from '../ui/rail.tsx'
import { SignalPanel } from '../ui/signal-panel.tsx'
import { Steps } from '../ui/steps.tsx'
import { CauseWords } from './cause-words.tsx'
import { assume } from './feeds.ts'
import { inHomeownerWords } from './homeowner-words.ts'
import { openTests, plainVerdict, wayTo } from './plain-verdict.ts'
import type { PlainVerdict } from './plain-verdict.ts'
import { useTriage } from './triage-store.tsx'

type Procedures = ReadonlyMap<string, CauseProcedure>
type Rows = { edition: Edition; verdict: PlainVerdict; procedures: Procedures }

/** Where a finding of the check is entered again. */
const wayBack = (finding: string): string =>
  finding.startsWith('tester') ? '/check/4' : finding.endsWith('volts') ? '/check/5' : '/check/3'

function NoSingleCause({ edition, misfit }: { edition: Edition; misfit: Misfit }) {
  const { again, because } = misfit
  const label = edition.readings.get(again)?.label ?? edition.observations.get(again)?.label ?? again
  return (
    <div className="plate-dashed">
      <h2>No single cause fits.</h2>
      <p className="mt-2">{inHomeownerWords(because)}</p>
      <p className="mt-2">
        <b>Look at this one again: {inHomeownerWords(label)}.</b>{' '}
        <Link to={wayBack(again)} className="link-alone">
          Go there
        </Link>
      </p>
    </div>
  )
}

function Verdict({ edition, verdict, procedures }: Rows) {
  const { fits, may } = verdict
  if (fits.length + may.length === 0)
    return (
      <div className="plate-dashed">
        <h2>Nothing stands out yet.</h2>
        <p className="mt-2">What you found so far fits many causes. Answer more below, or call.</p>
      </div>
    )
  const asSound = fits.some((row) => row.causes.some(({ cause }) => cause === 'sound'))
  return (
    <>
      {fits.length > 0 && (
        <Rail title="What fits">
          {asSound && (
            <p className="mt-2">
              <b>Sound wiring looks like this, and so do some faults.</b> It proves nothing: a plug-in tester
              can’t see a missing bond or a poor joint.
            </p>
          )}
          {fits.map((row) => (
            <CauseWords key={row.causes[0]?.cause} row={row} edition={edition} procedures={procedures} />
          ))}
        </Rail>
      )}
      {may.length > 0 && (
        <Rail title={fits.length > 0 ? 'It may also be' : 'It may be'}>
          {may.map((row) => (
            <CauseWords key={row.causes[0]?.cause} row={row} edition={edition} procedures={procedures} />
          ))}
        </Rail>
      )}
    </>
  )
}

/** For several causes in one row: what the more dangerous one asks for. */
function DoNow({ verdict, procedures }: Omit<Rows, 'edition'>) {
  const worst = (verdict.fits[0] ?? verdict.may[0])?.causes[0]?.cause
  const steps = worst === undefined ? [] : (procedures.get(worst)?.homeowner?.doNow ?? [])
  if (steps.length === 0) return null
  return (
    <Rail title="What you can do with nothing opened">
      <Steps steps={steps} className="mt-1" />
    </Rail>
  )
}

function MoreTests({ edition, diagnosis }: { edition: Edition; diagnosis: Diagnosis }) {
  const { triage } = useTriage()
  const direct = assume(triage.feeds).context.wiring === 'direct'
  const tests = openTests(edition, diagnosis, triage, direct)
  return (
    <Rail title="What would tell more">
      {tests.length === 0 ? (
        <p className="mt-2 text-small">Nothing more you can do with the covers on. Call the shop.</p>
      ) : (
        <ul>
          {tests.map(({ test }) => (
            <li key={test} className="border-b border-rule">
              <Link to={wayTo(test)} className="link-alone py-2 leading-[1.3]">
                {inHomeownerWords(edition.tests.get(test)?.title ?? test)}
              </Link>
            </li>
          ))}
        </ul>
      )}
    </Rail>
  )
}

function ToRead({ verdict }: { verdict: PlainVerdict }) {
  const { articles } = useArticles(false)
  const causes = new Set(
    [...verdict.fits, ...verdict.may].flatMap((row) => row.causes.map(({ cause }) => cause)),
  )
  const found = [...articles.values()].filter((article) => article.causes.some((cause) => causes.has(cause)))
  if (found.length === 0) return null
  return (
    <Rail title="To read" className="screen-only">
      <ul>
        {found.slice(0, 4).map((article) => (
          <li key={article.slug} className="border-b border-rule">
            <Link to={`/articles/${article.slug}`} className="link-alone py-2 leading-[1.3]">
              {article.title}
            </Link>
          </li>
        ))}
      </ul>
    </Rail>
  )
}

/** What was found, in plain words: danger, what fits, what may be done, what would tell more, what to read. */
export function Found({ edition, diagnosis }: { edition: Edition; diagnosis: Diagnosis }) {
  const { causes: procedures } = useProcedures(false)
  const verdict = plainVerdict(edition, diagnosis)
  const misfit = diagnosis.misfit !== undefined
  const [fitting] = verdict.fits
  const first = fitting?.causes[0]?.cause
  // Where sound wiring looks the same, a warning of one fault would say too much.
  const asSound = fitting?.causes.some(({ cause }) => cause === 'sound') === true
  const danger = first === undefined || asSound ? undefined : procedures.get(first)?.danger
  return (
    <>
      {verdict.metalMayBeLive || misfit ? (
        <SignalPanel word="warning" live>
          <b>Metal may be live.</b> Don’t touch metal on that circuit: appliances, pipes, outlet plates.
          Switch its breaker off if you can reach it without touching other metal. Leave it off and call.
        </SignalPanel>
      ) : (
        danger !== undefined && (
          <SignalPanel word={danger.level}>
            <b>{inHomeownerWords(edition.causes.get(first ?? '')?.title ?? '')}.</b>{' '}
            {inHomeownerWords(danger.text)}
          </SignalPanel>
        )
      )}
      {diagnosis.misfit === undefined ? (
        <Verdict edition={edition} verdict={verdict} procedures={procedures} />
      ) : (
        <NoSingleCause edition={edition} misfit={diagnosis.misfit} />
      )}
      {!misfit && <DoNow verdict={verdict} procedures={procedures} />}
      {!verdict.metalMayBeLive && !misfit && <MoreTests edition={edition} diagnosis={diagnosis} />}
      {!misfit && <ToRead verdict={verdict} />}
    </>
  )
}
