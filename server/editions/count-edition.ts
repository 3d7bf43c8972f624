import { ArticlesFile, DiagnosisFile } from '../../rules/edition/schema.ts'
import type { Db } from '../database.ts'
import type { EditionInForce } from './editions.contract.ts'
import { openFile } from './editions.queries.ts'

/** The counts as whoever may read only what is for everyone gets them, and as the qualified do. */
type Counts = Readonly<Record<'everyone' | 'qualified', EditionInForce['counts']>>

/** Withdrawn articles are only still there by their links. */
const readable = ({ articles }: ArticlesFile) => articles.filter((one) => one.withdrawn === undefined).length

async function count(db: Db, number: number): Promise<Counts> {
  const [diagnosis, forEveryone, forQualified] = await Promise.all([
    openFile(db, number, 'diagnosis').then((file) => DiagnosisFile.parse(file)),
    openFile(db, number, 'articles-everyone').then((file) => ArticlesFile.parse(file)),
    openFile(db, number, 'articles-qualified').then((file) => ArticlesFile.parse(file)),
  ])
  const everyone = {
    causes: diagnosis.causes.length,
    tests: diagnosis.tests.length,
    rules: diagnosis.groups.reduce((sum, group) => sum + group.rules.length, 0),
    articles: readable(forEveryone),
  }
  return { everyone, qualified: { ...everyone, articles: everyone.articles + readable(forQualified) } }
}

/** Counts what an edition holds, once: it never changes. */
export function editionCounts(db: Db): (number: number) => Promise<Counts> {
  const known = new Map<number, Counts>()
  return async (number) => {
    const counts = known.get(number) ?? (await count(db, number))
    known.set(number, counts)
    return counts
  }
}
