import { Link } from 'react-router-dom'
import type { EditionInForce } from '../../server/editions/editions.contract.ts'
import type { Edition } from '../../rules/edition/open.ts'
import { HazardMark } from '../ui/hazard-mark.tsx'
import { Rail } from '../ui/rail.tsx'
import { sizeOf } from './moment.ts'

const hazards = ['closed', 'closed-can-energize', 'open-dead', 'open-live'] as const
const fileWords: Readonly<Record<EditionInForce['files'][number]['name'], string>> = {
  diagnosis: 'Findings, causes, tests and rules',
  'procedures-everyone': 'Procedures for everyone',
  'procedures-qualified': 'Procedures for qualified people',
  'articles-everyone': 'Articles for everyone',
  'articles-qualified': 'Articles for qualified people',
}

/** The counts of an edition, in large figures. */
export function Counts({ counts }: { counts: EditionInForce['counts'] }) {
  const figures = [
    [counts.causes, 'causes'],
    [counts.tests, 'tests'],
    [counts.rules, 'rules'],
    [counts.articles, 'articles'],
  ] as const
  return (
    <ul className="figures">
      {figures.map(([figure, words]) => (
        <li key={words}>
          <b>{figure}</b> <span>{words}</span>
        </li>
      ))}
    </ul>
  )
}

/** What the rules are about: each group of them, and how many outcomes it tells apart. */
export function RuleGroups({ edition }: { edition: Edition }) {
  return (
    <Rail title="Rules, by what they read" className="edition-wide">
      <ul className="tally">
        {edition.file.groups.map((group) => (
          <li key={group.id}>
            <span>{group.title}</span>
            <b>{group.rules.length}</b>
          </li>
        ))}
      </ul>
    </Rail>
  )
}

/** Tests by how much is opened and whether something may be live. */
export function TestsByHazard({ edition }: { edition: Edition }) {
  return (
    <Rail title="Tests, by hazard">
      <ul className="tally">
        {hazards.map((hazard) => (
          <li key={hazard}>
            <HazardMark hazard={hazard} />
            <b>{edition.file.tests.filter((test) => test.hazard === hazard).length}</b>
          </li>
        ))}
      </ul>
      <p className="mt-3 text-small">
        <Link to="/articles">All articles, causes and tests</Link>
      </p>
    </Rail>
  )
}

/** The files an edition consists of, and the hash of each. */
export function Files({ info }: { info: EditionInForce }) {
  return (
    <Rail title="Files" className="edition-wide">
      <ul className="files">
        {info.files.map((file) => (
          <li key={file.name}>
            <span>
              {fileWords[file.name]} <small>{sizeOf(file.bytes)}</small>
            </span>
            <code>{file.hash}</code>
          </li>
        ))}
      </ul>
    </Rail>
  )
}
