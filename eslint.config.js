/**
 * The linter, and the fence: which part may import which, and the one place for each thing that reaches outside.
 * Feature folders are read from the disk, so that a new one is fenced without an edit here.
 */
import { readdirSync } from 'node:fs'
import { createTypeScriptImportResolver } from 'eslint-import-resolver-typescript'
import importX from 'eslint-plugin-import-x'
import tseslint from 'typescript-eslint'

const folders = (path, except) =>
  readdirSync(new URL(path, import.meta.url), { withFileTypes: true })
    .filter((entry) => entry.isDirectory() && !except.includes(entry.name))
    .map((entry) => entry.name)
// app/ composes features, ui/ and offline/ serve them all; commands/ and setup/ stand above the server's features.
const pageFeatures = folders('./src', ['app', 'ui', 'offline'])
const serverFeatures = folders('./server', ['commands', 'setup'])

const zone = (target, from, message) => ({ target, from, message })
const zones = [
  zone('./rules', ['./src', './server', './migrations', './tests'], 'the pure core knows nobody'),
  zone('./server', ['./src', './tests'], 'the server does not know the browser'),
  zone(
    './server/**/*.contract.ts',
    './server/**/!(*.contract).ts',
    'a contract goes to the browser: only contracts and rules/',
  ),
  zone('./migrations', ['./src', './server', './rules', './tests'], 'a migration is frozen in time'),
  zone('./src', './server/**/!(*.contract).ts', 'from server/ only contracts'),
  zone('./src', ['./migrations', './tests'], 'the browser has no database and no tests'),
  zone('./src/ui', './src/!(ui)/**/*', 'ui/ knows no feature'),
  zone('./src/offline', './src/!(offline)/**/*', 'offline/ knows no feature'),
  ...pageFeatures.map((name) =>
    zone(
      `./src/${name}`,
      `./src/!(${name}|ui|offline)/**/!(*.api).{ts,tsx}`,
      'of another feature only its *.api.ts',
    ),
  ),
  ...serverFeatures.map((name) =>
    zone(
      `./server/${name}`,
      `./server/!(${name})/**/!(*.queries|*.contract).ts`,
      'of another feature only its *.queries.ts and *.contract.ts',
    ),
  ),
]

/**
 * Which packages an area may import, dynamic imports included.
 * @param refused a pattern without slashes (`\x2F` is one), because the linter's selectors know none in patterns
 */
const packages = (refused, message, ...also) => ({
  '@typescript-eslint/no-restricted-imports': ['error', { patterns: [{ regex: refused, message }] }],
  'no-restricted-syntax': [
    'error',
    { selector: `ImportExpression[source.value=/${refused}/]`, message },
    ...also,
  ],
})
const onlyPackages = (allowed) =>
  `^(?!\\.{1,2}\\x2F|(${allowed.map((name) => name.replace('/', '\\x2F')).join('|')})$)`
const environment = {
  object: 'process',
  property: 'env',
  message: 'The environment is read in server/config.ts.',
}
const globals = (...names) => [
  'error',
  {
    globals: names.map(([name, message]) => ({ name, message })),
    checkGlobalObject: true,
    globalObjects: ['window', 'self'],
  },
]
const onlyFetch = ['fetch', 'Ask through src/api.ts.']
const onlyDatabase = ['indexedDB', 'Keep things through src/offline/.']
const browserPackages = '^(kysely|pg|express|pino|zod|node:.*)$'

export default tseslint.config(
  { ignores: ['dist', 'dist.next', 'dist.former', 'coverage', '.data'] },
  tseslint.configs.recommended,
  {
    plugins: { 'import-x': importX },
    languageOptions: {
      globals: { window: 'readonly', self: 'readonly' },
      parserOptions: { projectService: true, tsconfigRootDir: import.meta.dirname },
    },
    settings: { 'import-x/resolver-next': [createTypeScriptImportResolver({ project: 'tsconfig.json' })] },
    linterOptions: { reportUnusedDisableDirectives: 'error' },
    rules: {
      'import-x/no-restricted-paths': ['error', { basePath: import.meta.dirname, zones }],
      'import-x/no-cycle': ['error', { ignoreExternal: true }],
      '@typescript-eslint/no-floating-promises': 'error',
      '@typescript-eslint/no-misused-promises': ['error', { checksVoidReturn: { attributes: false } }],
      '@typescript-eslint/await-thenable': 'error',
      '@typescript-eslint/consistent-type-imports': 'error',
      '@typescript-eslint/no-unused-vars': ['error', { argsIgnorePattern: '^_', varsIgnorePattern: '^_' }],
      'no-console': 'error',
      'no-restricted-properties': ['error', environment],
      'no-restricted-globals': globals(onlyFetch, onlyDatabase),
      eqeqeq: 'error',
    },
  },

  // The pure core: time, chance and place come in as arguments.
  {
    files: ['rules/**/*.ts'],
    rules: {
      'no-restricted-properties': [
        'error',
        environment,
        { object: 'Date', property: 'now', message: 'Time comes in as an argument.' },
        { object: 'Math', property: 'random', message: 'Chance comes in as an argument.' },
      ],
    },
  },
  ...[
    ['rules/**/*.ts', ['rules/ranking/**', 'rules/search/**'], ['zod/mini']],
    ['rules/ranking/**/*.ts', [], ['zod/mini', 'json-rules-engine']],
    ['rules/search/**/*.ts', [], ['zod/mini', 'minisearch']],
  ].map(([files, ignores, allowed]) => ({
    files: [files],
    ignores,
    rules: packages(
      onlyPackages(allowed),
      `This part of rules/ imports ${allowed.join(' and ')} alone.`,
      { selector: "NewExpression[callee.name='Date']", message: 'Time comes in as an argument.' },
      { selector: "CallExpression[callee.name='Date']", message: 'Time comes in as an argument.' },
      {
        selector: 'MemberExpression[property.name=/^toLocale/]',
        message: 'Words for people are made in src/, where their language is known.',
      },
    ),
  })),

  // The server.
  {
    files: ['server/**/*.ts'],
    ignores: ['server/**/*.contract.ts', 'server/**/*.queries.ts', 'server/database.ts', 'server/app.ts'],
    rules: packages('^kysely', 'Ask the database in *.queries.ts.'),
  },
  {
    files: ['server/**/*.contract.ts'],
    rules: packages(
      onlyPackages(['zod/mini']),
      'A contract imports zod/mini, rules/ and other contracts alone.',
    ),
  },
  {
    files: ['migrations/**/*.ts'],
    rules: packages(onlyPackages(['kysely']), 'A migration imports kysely alone.'),
  },
  {
    files: ['server/config.ts', 'server/commands/call-folder.ts', 'server/setup/**'],
    rules: { 'no-restricted-properties': 'off' },
  },
  { files: ['server/log.ts', 'server/setup/**', 'server/commands/**'], rules: { 'no-console': 'off' } },

  // The browser.
  {
    files: ['src/**/*.{ts,tsx}'],
    ignores: ['src/offline/**'],
    rules: {
      ...packages(
        `^idb|${browserPackages}`,
        'That is no package for the browser, or one for src/offline/ alone.',
      ),
      'no-restricted-globals': globals(onlyFetch, onlyDatabase),
    },
  },
  {
    files: ['src/offline/**/*.{ts,tsx}'],
    rules: {
      ...packages(browserPackages, 'That is no package for the browser.'),
      'no-restricted-globals': globals(onlyFetch),
    },
  },
  { files: ['src/api.ts'], rules: { 'no-restricted-globals': globals(onlyDatabase) } },

  // Tests ask a running server, and hand their environment on to what they start.
  {
    files: ['tests/**'],
    rules: {
      'no-restricted-properties': 'off',
      'no-restricted-globals': 'off',
      'no-restricted-syntax': [
        'error',
        {
          selector:
            'MemberExpression[object.name=/^(test|it|describe|suite|bench)$/][property.name=/^(only|skip|todo|skipIf|runIf|fails)$/]',
          message: 'Every test runs.',
        },
      ],
    },
  },
  // Plain scripts: not part of the TypeScript project.
  {
    files: ['**/*.{js,mjs}'],
    ...tseslint.configs.disableTypeChecked,
  },
)
