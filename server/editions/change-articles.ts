import type { Audience } from '../../rules/edition/audience.ts'
import { ArticlesFile, DiagnosisFile } from '../../rules/edition/schema.ts'
import type { Article } from '../../rules/edition/schema.ts'
import type { Tx } from '../database.ts'
import { Problem } from '../problem.ts'
import { editionHash, fileOf } from './edition-bytes.ts'
import type { EditionFile } from './edition-bytes.ts'
import { editionInForce, lockEditions, readFiles } from './editions.queries.ts'
import type { ArticlesChange, ArticlesInForce } from './editions.queries.ts'
import { putInForceWithin } from './put-in-force.ts'

const audiences: readonly Audience[] = ['everyone', 'qualified']

const contentOf = (files: readonly EditionFile[], name: EditionFile['name']): unknown => {
  const file = files.find((one) => one.name === name)
  if (file === undefined) throw new Error(`the edition in force lacks ${name}`)
  return JSON.parse(file.bytes.toString('utf8')) as unknown
}

/** The files again, those with articles made anew. The others keep their bytes, and so what devices have kept. */
const withArticles = (files: readonly EditionFile[], articles: readonly Article[]): EditionFile[] => [
  ...files.filter((file) => !file.name.startsWith('articles-')),
  ...audiences.map((audience) =>
    fileOf(
      `articles-${audience}`,
      audience,
      ArticlesFile.parse({
        format: 1,
        audience,
        articles: articles.filter((article) => article.audience === audience),
      }),
    ),
  ),
]

/**
 * Puts in force the edition in force with other articles, within a transaction.
 * @param change is told what is in force, which nobody else can change until the transaction ends
 * @returns the edition in force afterwards
 */
export async function changeArticles(
  tx: Tx,
  change: (inForce: ArticlesInForce) => ArticlesChange,
): Promise<{ number: number }> {
  await lockEditions(tx)
  const before = await editionInForce(tx)
  if (before === undefined) throw new Problem('unavailable', 'No edition is in force yet.')
  const files = await readFiles(tx, before.number)
  const { articles, note, reason } = change({
    number: before.number,
    articles: audiences.flatMap(
      (audience) => ArticlesFile.parse(contentOf(files, `articles-${audience}`)).articles,
    ),
    diagnosis: DiagnosisFile.parse(contentOf(files, 'diagnosis')),
  })
  const next = withArticles(files, articles)
  const { inForce } = await putInForceWithin(tx, { hash: editionHash(next), files: next }, { note, reason })
  return inForce
}
