/**
 * Reads the starter knowledge from rules/starter: for seeding a database, for the command line and for tests.
 * The folder holds data only; this is the one place that knows how its files make up an edition.
 */
import { readFile, readdir } from 'node:fs/promises'
import { join } from 'node:path'
import { fileURLToPath } from 'node:url'
import { ArticlesFile, DiagnosisFile, ProceduresFile } from '../../rules/edition/schema.ts'
import type { Audience } from '../../rules/edition/audience.ts'
import type { Article } from '../../rules/edition/schema.ts'
import { parseArticle } from './front-matter.ts'

const folder = fileURLToPath(new URL('../../rules/starter/', import.meta.url))

const text = (path: string) => readFile(join(folder, path), 'utf8')
const json = async (path: string): Promise<unknown> => JSON.parse(await text(path))
const list = async (path: string) => (await json(path)) as Record<string, unknown>[]
const filesIn = async (dir: string, end: string) =>
  (await readdir(join(folder, dir)))
    .filter((name) => name.endsWith(end))
    .sort()
    .map((name) => `${dir}/${name}`)

export type Starter = {
  diagnosis: DiagnosisFile
  procedures: Record<Audience, ProceduresFile>
  articles: Record<Audience, ArticlesFile>
}

type TestWithProcedure = Record<string, unknown> & { procedure: Record<string, unknown> }

async function readTests() {
  const tests = (await Promise.all((await filesIn('tests', '.json')).map(list))).flat() as TestWithProcedure[]
  return {
    ranking: tests.map(({ procedure: _, ...test }) => test),
    procedures: tests.map(({ id, procedure }) => ({ test: id, ...procedure })),
  }
}

/** The starter's diagnosis file alone: all the command line needs. */
export async function readStarterDiagnosis(): Promise<DiagnosisFile> {
  const [vocabulary, readings, observations, causes, edges, stops, tests, ruleFiles] = await Promise.all([
    json('vocabulary.json') as Promise<Record<string, unknown>>,
    json('readings.json'),
    json('observations.json'),
    json('causes.json'),
    json('edges.json'),
    json('stops.json'),
    readTests(),
    filesIn('rules', '.json'),
  ])
  const groups = (await Promise.all(ruleFiles.map(list))).flat()
  return DiagnosisFile.parse({
    format: 1,
    facts: 1,
    ...vocabulary,
    readings,
    observations,
    causes,
    tests: tests.ranking,
    groups,
    edges,
    stops,
  })
}

/** The whole starter, checked against the edition's schema. Throws when a file is not what it should be. */
export async function readStarter(): Promise<Starter> {
  const [diagnosis, tests, causeFiles, articleFiles] = await Promise.all([
    readStarterDiagnosis(),
    readTests(),
    filesIn('causes', '.json'),
    filesIn('articles', '.md'),
  ])
  const causes = (await Promise.all(causeFiles.map(list))).flat()
  const articles = await Promise.all(articleFiles.map(async (path) => parseArticle(await text(path))))
  const procedures = (audience: Audience) =>
    ProceduresFile.parse({
      format: 1,
      audience,
      tests: tests.procedures.filter((p) => (p as { audience?: unknown }).audience === audience),
      causes: causes.filter((c) => c['audience'] === audience),
    })
  const shelf = (audience: Audience) =>
    ArticlesFile.parse({
      format: 1,
      audience,
      articles: articles.filter((a: Article) => a.audience === audience),
    })
  return {
    diagnosis,
    procedures: { everyone: procedures('everyone'), qualified: procedures('qualified') },
    articles: { everyone: shelf('everyone'), qualified: shelf('qualified') },
  }
}
