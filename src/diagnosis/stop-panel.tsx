import type { Stop } from '../../rules/ranking/diagnosis-types.ts'
import { SignalPanel } from '../ui/signal-panel.tsx'
import { Steps } from '../ui/steps.tsx'
import { useDesk } from './desk.ts'
import { findingLabel, listed, modeLabel } from './words.ts'

/** For a stop whose own words are missing from the edition: nothing may stop without saying what to do. */
const plainWords = {
  title: 'Stop: this can hurt someone now.',
  now: [
    'Keep away from metal on this circuit, and keep others away.',
    'Switch the source off, then its breaker, each only if you can reach it without touching metal or standing in wet.',
    'Lock and tag it. Battery and PV wires stay live.',
  ],
}

/**
 * What stops, before anything else on the page: what to do now, then which findings say so. It may go on being a
 * ghost; it is treated as live all the same.
 */
export function StopPanel({ stops, trying }: { stops: readonly Stop[]; trying: boolean }) {
  const { edition } = useDesk()
  if (stops.length === 0) return null
  const panels = [...new Map(stops.map((stop) => [`${stop.id} ${stop.mode}`, stop])).values()]
  return (
    <SignalPanel word="danger" live label="Danger: stop" className="stop-panel">
      {panels.map((stop, index) => {
        const words = edition.file.stops.find((one) => one.id === stop.id) ?? plainWords
        return (
          <div
            key={`${stop.id} ${stop.mode}`}
            className={index === 0 ? '' : 'mt-4 border-t border-rule pt-3'}
          >
            <h2 className="text-lead">
              {trying && 'What if: '}
              {words.title}
            </h2>
            <Steps steps={words.now} />
            {stop.mayBeGhost && (
              <p className="mt-3 font-bold">
                It may be a ghost; treat it as live until a low-resistance meter or the test bulb says
                otherwise.
              </p>
            )}
            <p className="mt-3 text-small text-ink-2">
              Found: {listed(stop.findings.map((id) => findingLabel(edition, id)))},{' '}
              {modeLabel(edition, stop.mode).toLowerCase()}.
            </p>
          </div>
        )
      })}
      <p className="mt-3 text-small">
        Go on measuring only once this has been made harmless and a qualified person has proved it. Local code
        and the authority having jurisdiction decide.
      </p>
    </SignalPanel>
  )
}
