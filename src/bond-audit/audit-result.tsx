import { useMemo } from 'react'
import { auditSystem } from '../../rules/bond-audit/audit.ts'
import { planFor } from '../../rules/bond-audit/plan.ts'
import type { System } from '../../rules/bond-audit/system.ts'
import { Empty } from '../ui/empty.tsx'
import { Rail } from '../ui/rail.tsx'
import { SignalPanel } from '../ui/signal-panel.tsx'
import { ModeRow } from './mode-row.tsx'
import { PlanList } from './plan-list.tsx'

/** Every mode of the system with its answer, and what to change. */
export function AuditResult({ system }: { system: System }) {
  const audit = useMemo(() => auditSystem(system), [system])
  const plan = useMemo(() => planFor(system, audit), [system, audit])
  const { modes, gone } = audit
  const passing = modes.filter(({ passes }) => passes).length
  const kinds = new Set(modes.flatMap(({ findings }) => findings.map(({ kind }) => kind)))
  const tally = `${passing} of ${modes.length} ${modes.length === 1 ? 'mode passes' : 'modes pass'}`
  return (
    <div className="audit-result">
      {kinds.has('bond-on-balanced') ? (
        <SignalPanel word="danger" className="mb-5">
          <p>
            <b>A bond ties a balanced output to ground.</b> Switch the source off and disconnect it from this
            wiring. Its case can be live, and it can be destroyed. No bond mends it: replace the source, or
            install a listed isolation transformer with a bonded secondary.
          </p>
        </SignalPanel>
      ) : (
        kinds.has('balanced-into-panel') && (
          <SignalPanel word="warning" className="mb-5">
            <p>
              <b>Never bond a balanced output.</b> No bond can fix this. Replace the source, or install a
              listed isolation transformer with a bonded secondary. Until then a breaker of one pole opens one
              live wire of two.
            </p>
          </SignalPanel>
        )
      )}
      <Rail id="as-it-stands" title="As it stands" action={<b className="text-small">{tally}</b>}>
        <p className="sr-only" role="status">
          {tally}
        </p>
        {modes.length === 0 ? (
          <Empty title="No source feeds anything yet.">
            Add a panel or a receptacle, and say what feeds it.
          </Empty>
        ) : (
          <ul className="audit-modes">
            {modes.map((mode) => (
              <ModeRow key={mode.name} mode={mode} />
            ))}
            {gone.map(({ name, places }) => (
              <li key={`gone ${name}`} className="audit-mode audit-gone">
                <div className="audit-mode-name">
                  <h3>{name}</h3>
                </div>
                <p className="audit-ladder">
                  Mode taken away: the cord to {places.join(', ')} stays unplugged. No bond is counted for it.
                </p>
                <p className="audit-count">
                  <span aria-hidden="true">–</span>
                </p>
              </li>
            ))}
          </ul>
        )}
      </Rail>
      {plan !== undefined && <PlanList plan={plan} system={system} />}
    </div>
  )
}
