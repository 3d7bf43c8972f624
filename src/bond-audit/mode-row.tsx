import type { Audited } from '../../rules/bond-audit/audit.ts'
import { byGravity } from '../../rules/bond-audit/audit.ts'
import { ladderOf, ladderWords } from '../../rules/bond-audit/ladder.ts'
import { oneLineOf, oneLineWords } from '../../rules/bond-audit/one-line.ts'
import { bondWords, listed } from '../../rules/bond-audit/phrases.ts'
import { Help } from '../ui/help.tsx'
import { Tick } from '../ui/tick.tsx'
import { CurrentTable, ExceptionText, FindingText, inAmps } from './finding-text.tsx'
import { LyingLadder, StandingLadder } from './ladder-picture.tsx'
import { OneLinePicture } from './one-line-picture.tsx'

/** The verdict in a few words, beside the count. */
function verdictOf({ count, counted, passes, findings, current }: Audited): { lead: string; say: string } {
  const bonds = listed(counted.map(bondWords))
  if (passes)
    return count === 0 ? { lead: 'No bond wanted', say: 'here.' } : { lead: 'One bond', say: `: ${bonds}.` }
  const kinds = new Set(findings.map(({ kind }) => kind))
  if (kinds.has('balanced-into-panel') || kinds.has('bond-on-balanced'))
    return { lead: 'Balanced output.', say: 'No bond can mend it.' }
  if (kinds.has('two-bonds')) {
    const ground = current !== undefined && current.most >= 0.05 ? current : undefined
    const lead = count === 2 ? 'Two bonds.' : `${count} bonds.`
    return {
      lead,
      say:
        ground === undefined
          ? `${bonds[0]?.toUpperCase()}${bonds.slice(1)}.`
          : `With ${ground.loadAmps} A running, ${inAmps(ground.most)} returns on the ground wire.`,
    }
  }
  if (kinds.has('no-bond')) return { lead: 'No bond.', say: 'A fault has no way back.' }
  if (kinds.has('no-neutral')) return { lead: 'No neutral.', say: 'There is nothing to bond.' }
  if (kinds.has('wrong-place')) return { lead: 'One bond, in the wrong place', say: `: ${bonds}.` }
  if (kinds.has('ground-missing'))
    return { lead: 'One bond, but no way to it', say: 'for some of the metal.' }
  if (kinds.has('rod-only')) return { lead: 'One bond, reached through soil', say: 'alone.' }
  return { lead: 'One bond;', say: 'the neutral is not in order.' }
}
/** More posts than these stand upright; more than those beside the verdict get a row of their own. */
const mostLying = 7
const mostBeside = 4
/** A picture wider than this would shrink its letters; then it stands. */
const widestLying = 740

/** One mode: name, ladder, count, verdict, then what is found and the one-line picture. */
export function ModeRow({ mode }: { mode: Audited }) {
  const posts = ladderOf(mode)
  const { lead, say } = verdictOf(mode)
  const { circuit, current, exceptions } = mode
  const findings = [...mode.findings].sort(byGravity)
  const amps =
    current !== undefined && current.most >= 0.05 ? `${inAmps(current.most)} on the ground wire` : undefined
  const lying = oneLineOf(mode, 'lying', widestLying)
  const standing = oneLineOf(mode, 'standing', 358)
  const wide = lying.width <= widestLying
  return (
    <li
      className={`audit-mode ${posts.length > mostBeside ? 'audit-long' : ''} ${mode.passes ? '' : 'audit-fails'}`}
    >
      <div className="audit-mode-name">
        <h3>{mode.name}</h3>
        {mode.detail !== '' && <p className="text-note text-ink-2">{mode.detail}</p>}
      </div>
      <div className="audit-ladder">
        <p className="sr-only">{ladderWords(posts)}</p>
        {posts.length <= mostLying && <LyingLadder posts={posts} amps={amps} />}
        <div className={posts.length <= mostLying ? 'audit-narrow' : ''}>
          <StandingLadder posts={posts} />
        </div>
      </div>
      <p className="audit-count">
        <span className="sr-only">Bonds: </span>
        <span>{mode.count}</span>
      </p>
      <div className="audit-verdict">
        <Tick state={mode.passes ? 'yes' : 'no'} />
        <p>
          <span className="sr-only">{mode.passes ? 'Passes. ' : 'Fails. '}</span>
          <b>{lead}</b>
          {say.startsWith(':') ? say : ` ${say}`}
        </p>
      </div>
      <div className="audit-more">
        {findings.map((finding) => (
          <FindingText key={`${finding.kind} ${finding.parts.join()}`} finding={finding} />
        ))}
        {exceptions.map((exception) => (
          <ExceptionText key={`${exception.kind} ${exception.parts.join()}`} exception={exception} />
        ))}
        {current !== undefined && current.paths.length > 0 && <CurrentTable current={current} />}
        <Help summary="One-line picture of this mode">
          <p className="sr-only">{oneLineWords(circuit.wiring.system, lying)}</p>
          {wide && <OneLinePicture picture={lying} className="audit-wide" />}
          {wide ? (
            <OneLinePicture picture={standing} className="audit-narrow" />
          ) : (
            <OneLinePicture picture={oneLineOf(mode, 'standing', widestLying)} className="" />
          )}
          <p className="audit-key">
            Thick: live. Thin: there, without power. Dashed green beside a line: a grounding conductor.
            Crossed box: the part a finding names.
          </p>
        </Help>
      </div>
    </li>
  )
}
