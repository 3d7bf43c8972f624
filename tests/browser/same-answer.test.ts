import { readFile } from 'node:fs/promises'
import { fileURLToPath } from 'node:url'
import type { Browser } from 'playwright-core'
import { createServer } from 'vite'
import type { ViteDevServer } from 'vite'
import { afterAll, beforeAll, expect, test } from 'vitest'
import { answerCase } from '../../server/commands/answer.ts'
import { parseLine } from '../../server/commands/read-cases.ts'
import { starter } from '../edition.ts'
import { openBrowser } from './browser.ts'

const root = fileURLToPath(new URL('../../', import.meta.url))
/** Runs in the page; as text, because the test runner rewrites imports it can see. */
const answerAll = `
  import { openEdition } from '/rules/edition/open.ts'
  import { answerCase } from '/server/commands/answer.ts'
  globalThis.answerAll = async (file, raws) => {
    const edition = openEdition(file)
    const answers = []
    for (const raw of raws) answers.push(await answerCase(edition, raw, 'field'))
    return JSON.stringify(answers)
  }`
type Answering = { answerAll: (file: unknown, raws: readonly unknown[]) => Promise<string> }

let vite: ViteDevServer
let browser: Browser

beforeAll(async () => {
  vite = await createServer({
    root,
    server: { port: 0, host: '127.0.0.1' },
    appType: 'custom',
    logLevel: 'error',
    cacheDir: 'node_modules/.vite-same-answer',
    optimizeDeps: { include: ['json-rules-engine', 'zod/mini'], noDiscovery: true },
  })
  await vite.listen()
  vite.middlewares.use('/blank', (_req, res) => {
    res.setHeader('content-type', 'text/html').end('<!doctype html><title>blank</title>')
  })
  browser = await openBrowser()
})
afterAll(async () => {
  await browser?.close()
  await vite?.close()
})

test('the browser gives the same answer as Node, to the digit', async () => {
  const cases: unknown[] = []
  for (const name of ['field.jsonl', 'nonsense.jsonl', 'sample-a.jsonl', 'sample-b.jsonl']) {
    const text = await readFile(new URL(`../cases/${name}`, import.meta.url), 'utf8')
    const lines = text.trim().split('\n').map(parseLine)
    cases.push(...(name.startsWith('sample') ? lines.filter((_, i) => i % 4 === 0) : lines))
  }
  const inNode = await Promise.all(cases.map((raw) => answerCase(starter, raw, 'field')))

  const page = await browser.newPage()
  const address = vite.resolvedUrls?.local[0] ?? ''
  await page.goto(`${address}blank`)
  await page.addScriptTag({ type: 'module', content: answerAll })
  await page.waitForFunction(() => 'answerAll' in globalThis)
  const inBrowser = await page.evaluate(
    ([file, raws]) => (globalThis as unknown as Answering).answerAll(file, raws),
    [starter.file, cases] as const,
  )
  expect(cases.length).toBeGreaterThan(100)
  const differs = (JSON.parse(inBrowser) as unknown[]).flatMap((answer, i) => {
    const [there, here] = [JSON.stringify(answer), JSON.stringify(inNode[i])]
    const at = [...here].findIndex((c, k) => there[k] !== c)
    return there === here
      ? []
      : [{ case: i, here: here.slice(at - 60, at + 60), there: there.slice(at - 60, at + 60) }]
  })
  expect(differs).toEqual([])
})
