import type { Migration } from 'kysely'
import * as editions from './2026-12-01-editions.ts'
import * as people from './2026-12-02-people.ts'
import * as articles from './2026-12-03-articles.ts'
import * as sheets from './2026-12-04-sheets.ts'

/** Every migration, by the name under which a database remembers it. Add at the end; never change one that ran. */
export const migrations: Readonly<Record<string, Migration>> = {
  '2026-12-01-editions': editions,
  '2026-12-02-people': people,
  '2026-12-03-articles': articles,
  '2026-12-04-sheets': sheets,
}
