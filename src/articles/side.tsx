import type { ReactNode } from 'react'
import { Link } from 'react-router-dom'
import { Rail } from '../ui/rail.tsx'
import { Stamp } from '../ui/stamp.tsx'
import { addressOf } from './hit-row.tsx'
import type { Knowledge } from './knowledge.ts'
import type { UsedIn } from './used-in.ts'

type SideProps = {
  knowledge: Knowledge
  /** Lines under the stamp: who may read it, when it was reviewed. */
  facts?: readonly (readonly [name: string, value: ReactNode])[]
  usedIn: readonly UsedIn[]
}

const shown = 8

function Links({ usedIn }: { usedIn: readonly UsedIn[] }) {
  return (
    <ul className="used-in">
      {usedIn.map((one) => (
        <li key={`${one.kind} ${one.id}`}>
          <Link to={addressOf(one.kind, one.id)}>
            {one.label}: {one.title}
          </Link>
        </li>
      ))}
    </ul>
  )
}

/** Beside an article, cause or test: the edition it belongs to, and what links to it. */
export function Side({ knowledge, facts = [], usedIn }: SideProps) {
  const { info } = knowledge
  return (
    <div className="knowledge-side">
      <Rail title="In this edition">
        <p className="mt-2">
          <Stamp hash={info.hash} number={info.number} line="in force" />
        </p>
        {facts.length > 0 && (
          <dl className="facts">
            {facts.map(([name, value]) => (
              <div key={name}>
                <dt>{name}</dt>
                <dd>{value}</dd>
              </div>
            ))}
          </dl>
        )}
      </Rail>
      {usedIn.length > 0 && (
        <Rail title="Used in" className="screen-only">
          <Links usedIn={usedIn.slice(0, shown)} />
          {usedIn.length > shown && (
            <details className="more text-small">
              <summary>{usedIn.length - shown} more</summary>
              <Links usedIn={usedIn.slice(shown)} />
            </details>
          )}
        </Rail>
      )}
    </div>
  )
}
