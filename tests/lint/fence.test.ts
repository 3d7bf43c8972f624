import { ESLint } from 'eslint'
import { expect, test } from 'vitest'

// The planted files are not on the disk, so the rules that need types can't run on them.
const linter = new ESLint({
  overrideConfig: {
    languageOptions: { parserOptions: { projectService: false } },
    rules: {
      '@typescript-eslint/no-floating-promises': 'off',
      '@typescript-eslint/no-misused-promises': 'off',
      '@typescript-eslint/await-thenable': 'off',
    },
  },
})

/** The names of the rules that a file with this text breaks. */
async function brokenRules(filePath: string, text: string): Promise<string[]> {
  const [result] = await linter.lintText(text, { filePath })
  expect(result, `${filePath} is not linted`).toBeDefined()
  expect(result!.messages.filter((m) => m.fatal === true)).toEqual([])
  return result!.messages.map((m) => m.ruleId ?? '')
}

const paths = 'import-x/no-restricted-paths'

/** Arrows that must not be: from a planted file to one that is there. */
const forbidden: [why: string, from: string, to: string][] = [
  ['the core imports the server', 'rules/ranking/planted.ts', '../../server/problem.ts'],
  ['the core imports a page', 'rules/ranking/planted.ts', '../../src/api.ts'],
  ['the core imports a migration', 'rules/edition/planted.ts', '../../migrations/index.ts'],
  ['the server imports a page', 'server/planted.ts', '../src/api.ts'],
  ['the server imports a test', 'server/planted.ts', '../tests/server/database.ts'],
  ['a page imports a query', 'src/editions/planted.ts', '../../server/editions/editions.queries.ts'],
  ['a page imports the server', 'src/editions/planted.ts', '../../server/app.ts'],
  ['a page imports a migration', 'src/editions/planted.ts', '../../migrations/index.ts'],
  ['a feature imports the inside of another', 'src/articles/planted.ts', '../triage/dangers.ts'],
  ['a feature imports the shell', 'src/articles/planted.ts', '../app/routes.tsx'],
  ['ui/ imports a feature', 'src/ui/planted.ts', '../triage/dangers.ts'],
  ['offline/ imports ui/', 'src/offline/planted.ts', '../ui/icon.tsx'],
  [
    'a server feature imports the inside of another',
    'server/articles/planted.ts',
    '../editions/put-in-force.ts',
  ],
  ['a contract imports a query', 'server/editions/planted.contract.ts', './editions.queries.ts'],
  ['a migration imports the server', 'migrations/planted.ts', '../server/database.ts'],
  ['a migration imports the core', 'migrations/planted.ts', '../rules/edition/schema.ts'],
]

test.each(forbidden)('%s: the fence holds, dynamic imports too', async (_why, from, to) => {
  expect(await brokenRules(from, `import * as it from '${to}'\nexport default it\n`)).toContain(paths)
  expect(await brokenRules(from, `export const it = () => import('${to}')\n`)).toContain(paths)
  expect(await brokenRules(from, `export * from '${to}'\n`)).toContain(paths)
})

const allowed: [why: string, from: string, to: string][] = [
  ['the server imports the core', 'server/planted.ts', '../rules/edition/open.ts'],
  ['a page imports a contract', 'src/editions/planted.ts', '../../server/editions/editions.contract.ts'],
  ['a page imports the core', 'src/triage/planted.ts', '../../rules/ranking/diagnose.ts'],
  ['a feature imports ui/', 'src/articles/planted.ts', '../ui/icon.tsx'],
  [
    'a server feature imports another’s queries',
    'server/articles/planted.ts',
    '../editions/editions.queries.ts',
  ],
  ['the shell composes features', 'src/app/planted.ts', '../triage/dangers.ts'],
]

test.each(allowed)('%s: the gate is open', async (_why, from, to) => {
  expect(await brokenRules(from, `import * as it from '${to}'\nexport default it\n`)).toEqual([])
  expect(await brokenRules(from, `export const it = () => import('${to}')\n`)).toEqual([])
})

/** Packages that belong to one place. */
const packages: [from: string, name: string, at: string][] = [
  ['server/editions/put-in-force.ts', 'kysely', 'server/editions/editions.queries.ts'],
  ['server/editions/planted.contract.ts', 'zod', 'server/config.ts'],
  ['src/triage/planted.ts', 'idb', 'src/offline/planted.ts'],
  ['src/triage/planted.ts', 'node:fs', 'server/planted.ts'],
  ['rules/edition/planted.ts', 'json-rules-engine', 'rules/ranking/planted.ts'],
  ['rules/ranking/planted.ts', 'minisearch', 'rules/search/planted.ts'],
  ['rules/ranking/planted.ts', 'node:fs', 'server/planted.ts'],
  ['rules/ranking/planted.ts', 'zod', 'server/config.ts'],
  ['migrations/planted.ts', 'pg', 'server/database.ts'],
]

test.each(packages)('%s may not import %s, which belongs in %s', async (from, name, at) => {
  const still = `import * as it from '${name}'\nexport default it\n`
  const moving = `export const it = () => import('${name}')\n`
  expect(await brokenRules(from, still)).toContain('@typescript-eslint/no-restricted-imports')
  expect(await brokenRules(from, moving)).toContain('no-restricted-syntax')
  expect(await brokenRules(at, still)).toEqual([])
  expect(await brokenRules(at, moving)).toEqual([])
})

const outside: [text: string, from: string, rule: string, at: string | undefined][] = [
  ['export const it = process.env.PORT', 'server/app.ts', 'no-restricted-properties', 'server/config.ts'],
  ["export const it = fetch('/api')", 'src/triage/planted.ts', 'no-restricted-globals', 'src/api.ts'],
  ["export const it = window.fetch('/api')", 'src/offline/planted.ts', 'no-restricted-globals', 'src/api.ts'],
  ["export const it = indexedDB.open('x')", 'src/api.ts', 'no-restricted-globals', 'src/offline/planted.ts'],
  ["console.log('x')", 'server/app.ts', 'no-console', 'server/log.ts'],
  ["console.log('x')", 'src/ui/planted.ts', 'no-console', 'server/setup/planted.mjs'],
  [
    'export const it = Date.now()',
    'rules/ranking/planted.ts',
    'no-restricted-properties',
    'server/planted.ts',
  ],
  [
    'export const it = Math.random()',
    'rules/search/planted.ts',
    'no-restricted-properties',
    'server/planted.ts',
  ],
  ['export const it = new Date()', 'rules/edition/planted.ts', 'no-restricted-syntax', 'server/planted.ts'],
  [
    'export const it = (1).toLocaleString()',
    'rules/ranking/planted.ts',
    'no-restricted-syntax',
    'src/ui/planted.ts',
  ],
  [
    "import { test } from 'vitest'\ntest.only('x', () => {})",
    'tests/rules/planted.test.ts',
    'no-restricted-syntax',
    undefined,
  ],
  [
    "import { test } from 'vitest'\ntest.skip('x', () => {})",
    'tests/rules/planted.test.ts',
    'no-restricted-syntax',
    undefined,
  ],
]

test.each(outside)('%s does not stand in %s', async (text, from, rule, at) => {
  expect(await brokenRules(from, text)).toContain(rule)
  if (at !== undefined) expect(await brokenRules(at, text)).toEqual([])
})
