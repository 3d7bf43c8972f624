import { checkSystem } from '../../rules/bond-audit/check-system.ts'
import { Button } from '../ui/button.tsx'
import { Failed } from '../ui/failed.tsx'
import { OfflineBar } from '../ui/offline-bar.tsx'
import { Page } from '../ui/page.tsx'
import { Rail } from '../ui/rail.tsx'
import { Waiting } from '../ui/waiting.tsx'
import { AuditResult } from './audit-result.tsx'
import { Starts } from './starts.tsx'
import { SystemForm } from './system-form.tsx'
import { useAuditSystem } from './use-audit-system.ts'
import './bond-audit.css'

/** The bond audit: a system by its parts, and for every mode how often its neutral meets ground. */
export function Component() {
  const { system, damaged, keepsNothing, change } = useAuditSystem()
  const name = system?.name ?? ''
  const faults = system === undefined ? [] : checkSystem(system)
  return (
    <Page title={name === '' ? 'Bond audit' : `Bond audit: ${name}`} className="audit">
      <header className="audit-head">
        <div>
          <p className="text-small text-ink-3">Worksheet</p>
          <h1>Bond audit{name === '' ? '' : `: ${name}`}</h1>
          <p className="audit-lead">
            Neutral must meet ground exactly once, in every way this system can run. A rung is a bond; count
            the solid ones. Dotted: there, but cut off in this mode.
          </p>
        </div>
        {system !== undefined && system.parts.length > 0 && (
          <Button size="small" icon="print" className="screen-only" onPress={() => window.print()}>
            Print
          </Button>
        )}
      </header>
      {system !== undefined && system.parts.length > 0 && faults.length === 0 && (
        <a className="audit-jump screen-only" href="#as-it-stands">
          To the answer, mode by mode
        </a>
      )}
      {damaged && (
        <Failed title="This address holds no system that can be read.">
          It may be cut short. What this device kept is shown instead.
        </Failed>
      )}
      {keepsNothing && (
        <OfflineBar>
          This device keeps nothing here: the address of this page holds the system. Bookmark it.
        </OfflineBar>
      )}
      {system === undefined ? (
        <Waiting what="the system this device kept" />
      ) : (
        <div className="audit-columns">
          <SystemForm system={system} faults={faults} onChange={change} />
          <div>
            {system.parts.length === 0 ? (
              <Rail title="Start from a common arrangement">
                <p className="mt-1 text-small text-ink-2">
                  Take the nearest and change it, or add the sources, then what each of them feeds.
                </p>
                <Starts onStart={change} />
              </Rail>
            ) : faults.length > 0 ? (
              <div className="failed" role="status">
                <b>
                  {faults.length === 1 ? 'One entry to mend' : `${faults.length} entries to mend`}; the audit
                  waits for it.
                </b>
                <ul className="audit-ways">
                  {faults.map(({ part, field, says }) => (
                    <li key={`${part} ${field} ${says}`}>
                      {system.parts.find(({ id }) => id === part)?.name}: {says}
                    </li>
                  ))}
                </ul>
              </div>
            ) : (
              <AuditResult system={system} />
            )}
          </div>
        </div>
      )}
      <p className="audit-foot">
        <b>What it takes for granted.</b> Every position that the switches, relays and cords allow is a mode;
        an off position feeds nothing and is left out. Sections are the NEC’s unless another standard is
        named; editions number some of them differently. A guide, not an inspection: local code and the
        authority having jurisdiction decide. Work inside equipment is for qualified people, with every source
        off, locked and proved dead. The address of this page holds the system, and this device keeps it.
      </p>
    </Page>
  )
}
