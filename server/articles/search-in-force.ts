import { ArticlesFile, DiagnosisFile, ProceduresFile } from '../../rules/edition/schema.ts'
import { buildIndex } from '../../rules/search/search.ts'
import type { SearchIndex } from '../../rules/search/search.ts'
import type { Db } from '../database.ts'
import { editionInForce, openFile } from '../editions/editions.queries.ts'

async function build(db: Db, number: number, qualified: boolean): Promise<SearchIndex> {
  const audiences = qualified ? (['everyone', 'qualified'] as const) : (['everyone'] as const)
  const [diagnosis, procedures, shelves] = await Promise.all([
    openFile(db, number, 'diagnosis').then((file) => DiagnosisFile.parse(file)),
    Promise.all(
      audiences.map(async (who) => ProceduresFile.parse(await openFile(db, number, `procedures-${who}`))),
    ),
    Promise.all(
      audiences.map(async (who) => ArticlesFile.parse(await openFile(db, number, `articles-${who}`))),
    ),
  ])
  const articles = shelves.flatMap((shelf) => shelf.articles)
  return buildIndex(articles, diagnosis.causes, diagnosis.tests, procedures)
}

type InForce = { edition: number; index: SearchIndex }

/**
 * The index over what the asker may read of the edition in force, built once an edition and audience. Undefined when
 * there is none.
 */
export function indexInForce(db: Db): (qualified: boolean) => Promise<InForce | undefined> {
  const last = new Map<boolean, { edition: number; index: Promise<SearchIndex> }>()
  return async (qualified) => {
    const inForce = await editionInForce(db)
    if (inForce === undefined) return undefined
    if (last.get(qualified)?.edition !== inForce.number)
      last.set(qualified, { edition: inForce.number, index: build(db, inForce.number, qualified) })
    const { edition, index } = last.get(qualified)!
    try {
      return { edition, index: await index }
    } catch (error) {
      last.delete(qualified)
      throw error
    }
  }
}
