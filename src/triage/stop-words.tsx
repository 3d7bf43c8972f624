import type { Edition } from '../../rules/edition/open.ts'
import { SignalPanel } from '../ui/signal-panel.tsx'
import { Steps } from '../ui/steps.tsx'
import { leaveNow, stopFirst } from './first-words.ts'
import { leave } from './said-stops.ts'
import type { Here } from './said-stops.ts'

type Words = { title: string; now: readonly string[] }

/** Each stop's own words from the edition; until it is at hand, the words that hold for every stop. */
function wordsOf(stops: readonly Here[], edition: Edition | undefined): readonly Words[] {
  const own = stops.flatMap(({ id }) => edition?.file.stops.find((one) => one.id === id) ?? [])
  if (own.length > 0) return own
  return [leave(stops) ? leaveNow : stopFirst]
}

/** The danger panel: what to do now, before anything else. Steps already said are not said twice. */
export function StopWords({ stops, edition }: { stops: readonly Here[]; edition: Edition | undefined }) {
  const [first, ...others] = wordsOf(stops, edition)
  if (first === undefined) return null
  const said = new Set(first.now)
  return (
    <SignalPanel word="danger" live>
      <h1 className="text-[1.625rem] leading-[1.22]">{first.title}</h1>
      <Steps steps={first.now} />
      {others.map((other) => {
        const more = other.now.filter((step) => !said.has(step))
        for (const step of more) said.add(step)
        return (
          <section key={other.title} className="mt-4 border-t border-rule pt-3">
            <h2 className="text-lead">{other.title}</h2>
            {more.length > 0 && <Steps steps={more} />}
          </section>
        )
      })}
      {stops.some((stop) => stop.mayBeGhost) && (
        <p className="mt-3 border-t border-rule pt-3">
          The voltage may be a ghost. Treat it as live until a low-resistance meter or the test bulb says
          otherwise; both are for a professional.
        </p>
      )}
      <p className="mt-[14px] border-t border-rule pt-3 leading-[1.4]">
        <b>Burns, fire or someone hurt?</b> Call 911, or your local emergency number.
      </p>
    </SignalPanel>
  )
}
