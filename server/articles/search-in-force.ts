import { ArticlesFile, DiagnosisFile, ProceduresFile } from '../../rules/edition/schema.ts'
import { buildIndex } from '../../rules/search/search.ts'
import type { SearchIndex } from '../../rules/search/search.ts'
import type { Db } from '../database.ts'
import { editionInForce, openFile } from '../editions/editions.queries.ts'

async function build(db: Db, number: number): Promise<SearchIndex> {
  const [diagnosis, procedures, shelf] = await Promise.all([
    openFile(db, number, 'diagnosis').then((file) => DiagnosisFile.parse(file)),
    openFile(db, number, 'procedures-everyone').then((file) => ProceduresFile.parse(file)),
    openFile(db, number, 'articles-everyone').then((file) => ArticlesFile.parse(file)),
  ])
  return buildIndex(shelf.articles, diagnosis.causes, diagnosis.tests, [procedures])
}

/** The index over what everyone may read of the edition in force, built once an edition. Undefined when there is none. */
export function indexInForce(db: Db): () => Promise<{ edition: number; index: SearchIndex } | undefined> {
  let last: { edition: number; index: Promise<SearchIndex> } | undefined
  return async () => {
    const inForce = await editionInForce(db)
    if (inForce === undefined) return undefined
    if (last?.edition !== inForce.number) last = { edition: inForce.number, index: build(db, inForce.number) }
    const { edition, index } = last
    try {
      return { edition, index: await index }
    } catch (error) {
      last = undefined
      throw error
    }
  }
}
