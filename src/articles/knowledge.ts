import type { EditionInForce } from '../../server/editions/editions.contract.ts'
import type { Edition } from '../../rules/edition/open.ts'
import type { Article, CauseProcedure, ProceduresFile, TestProcedure } from '../../rules/edition/schema.ts'
import { useArticles, useEdition, useProcedures } from '../editions/edition.api.ts'
import { useQualified } from '../people/people.api.ts'

/** All that the pages of this folder read, once it is there. */
export type Knowledge = {
  edition: Edition
  info: EditionInForce
  /** By slug; those for qualified people only where such a person is signed in. */
  articles: ReadonlyMap<string, Article>
  tests: ReadonlyMap<string, TestProcedure>
  causes: ReadonlyMap<string, CauseProcedure>
  procedures: readonly ProceduresFile[]
  qualified: boolean
}

export type KnowledgeState =
  | { status: 'pending' }
  | { status: 'error'; error: Error | undefined; retry: () => void }
  | { status: 'success'; knowledge: Knowledge }

/** The edition with its articles and procedures: all that whoever is signed in may read. */
export function useKnowledge(): KnowledgeState {
  const qualified = useQualified()
  const opened = useEdition()
  const shelf = useArticles(qualified === true)
  const procedures = useProcedures(qualified === true)
  const parts = [opened, shelf, procedures]
  const failed = parts.find((part) => part.status === 'error')
  if (failed !== undefined)
    return {
      status: 'error',
      error: failed.error,
      retry: () => {
        for (const part of parts) if (part.status === 'error') part.retry()
      },
    }
  const waits = parts.some((part) => part.status === 'pending')
  const { edition, info } = opened
  if (qualified === undefined || waits || edition === undefined || info === undefined)
    return { status: 'pending' }
  return {
    status: 'success',
    knowledge: {
      edition,
      info,
      articles: shelf.articles,
      tests: procedures.tests,
      causes: procedures.causes,
      procedures: procedures.files,
      qualified,
    },
  }
}
