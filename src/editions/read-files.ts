/**
 * Reads an edition's files. Apart, because the schema weighs more than a first page has to carry; it is brought when
 * the first file is asked for, and ahead of that by `src/app/routes.tsx`.
 */
import { openEdition } from '../../rules/edition/open.ts'
import { ArticlesFile, ProceduresFile } from '../../rules/edition/schema.ts'

export { openEdition }
export const readProcedures = (file: unknown): ProceduresFile => ProceduresFile.parse(file)
export const readArticles = (file: unknown): ArticlesFile => ArticlesFile.parse(file)
