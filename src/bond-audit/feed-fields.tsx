import { gauges, isPower, millimeters } from '../../rules/bond-audit/system.ts'
import type { Feed, Run, System } from '../../rules/bond-audit/system.ts'
import { CheckRow } from '../ui/tick.tsx'
import { Choice, NumberField } from './fields.tsx'
import { joinedWords } from './part-words.ts'

/** Parts to choose from, by name. */
export const partChoices = ({ parts }: System, except: string): [string, string][] =>
  parts.filter((part) => isPower(part) && part.id !== except).map(({ id, name }) => [id, name])

type RunFieldsProps = { run: Run | undefined; units: System['units']; onRun: (run: Run | undefined) => void }

/** Length and wires of a run: what the current on the ground wire is computed from. */
export function RunFields({ run, units, onRun }: RunFieldsProps) {
  const us = units === 'us'
  const sizes = (us ? gauges : millimeters).map((size): [string, string] => [
    size,
    `${size} ${us ? 'AWG' : 'mm²'}`,
  ])
  const usual: Run = us
    ? { length: 30, neutral: '10', ground: '10', metal: 'copper' }
    : { length: 10, neutral: '6', ground: '6', metal: 'copper' }
  return (
    <>
      <CheckRow checked={run !== undefined} onChange={(known) => onRun(known ? usual : undefined)}>
        Length and wire sizes are known
      </CheckRow>
      {run !== undefined && (
        <div className="audit-run">
          <NumberField
            label="Length one way"
            unit={us ? 'ft' : 'm'}
            value={run.length}
            least={0}
            most={5000}
            onValue={(length) => onRun({ ...run, length })}
          />
          <Choice
            label="Metal"
            value={run.metal}
            of={[
              ['copper', 'Copper'],
              ['aluminum', 'Aluminum'],
            ]}
            onChoose={(metal) => onRun({ ...run, metal })}
          />
          <Choice
            label="Neutral"
            value={run.neutral}
            of={sizes}
            onChoose={(neutral) => onRun({ ...run, neutral })}
          />
          <Choice
            label="Ground"
            value={run.ground}
            of={sizes}
            onChoose={(ground) => onRun({ ...run, ground })}
          />
        </div>
      )}
    </>
  )
}

type FeedFieldsProps = {
  /** The part it feeds. */
  partId: string
  label: string
  feed: Feed
  system: System
  error?: string | undefined
  onFeed: (feed: Feed) => void
}

/** What feeds a part, and which wires come along. */
export function FeedFields({ partId, label, feed, system, error, onFeed }: FeedFieldsProps) {
  const { run: _run, ...bare } = feed
  return (
    <fieldset className="audit-feed">
      <legend>{label}</legend>
      <Choice
        label="Fed from"
        value={feed.from}
        of={partChoices(system, partId)}
        error={error}
        onChoose={(from) => onFeed({ ...feed, from })}
      />
      <Choice
        label="By"
        value={feed.joined}
        of={joinedWords}
        onChoose={(joined) => onFeed({ ...feed, joined })}
      />
      <div>
        <CheckRow checked={feed.neutral} onChange={(neutral) => onFeed({ ...feed, neutral })}>
          A neutral comes along
        </CheckRow>
        <CheckRow checked={feed.ground} onChange={(ground) => onFeed({ ...feed, ground })}>
          A grounding conductor or metal raceway comes along
        </CheckRow>
        <CheckRow checked={feed.gfci} onChange={(gfci) => onFeed({ ...feed, gfci })}>
          A GFCI or ground-fault breaker where it starts
        </CheckRow>
        <RunFields
          run={feed.run}
          units={system.units}
          onRun={(run) => onFeed(run === undefined ? bare : { ...feed, run })}
        />
      </div>
    </fieldset>
  )
}
