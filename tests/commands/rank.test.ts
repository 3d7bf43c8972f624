import { spawn } from 'node:child_process'
import { mkdtemp, rm, writeFile } from 'node:fs/promises'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { fileURLToPath } from 'node:url'
import { afterAll, beforeAll, describe, expect, test } from 'vitest'
import { starter } from '../edition.ts'

const root = fileURLToPath(new URL('../../', import.meta.url))
let folder = ''
beforeAll(async () => {
  folder = await mkdtemp(join(tmpdir(), 'tracelamp-rank-'))
})
afterAll(() => rm(folder, { recursive: true, force: true }))

type Run = { code: number | null; lines: Record<string, unknown>[]; words: string }

/** Runs the command as people do, through npm, from another folder; returns what it printed. */
function rank(args: string[], input = ''): Promise<Run> {
  return new Promise((done, fail) => {
    const run = spawn('npm', ['run', '-s', 'rank', '--prefix', root, '--', ...args], {
      cwd: folder,
      env: { ...process.env, INIT_CWD: folder },
    })
    let [out, words] = ['', '']
    run.stdout.on('data', (chunk: Buffer) => (out += chunk.toString()))
    run.stderr.on('data', (chunk: Buffer) => (words += chunk.toString()))
    run.on('error', fail)
    run.on('close', (code) => {
      const lines = out
        .split('\n')
        .filter((l) => l !== '')
        .map((l) => JSON.parse(l) as Record<string, unknown>)
      done({ code, lines, words })
    })
    run.stdin.end(input)
  })
}

const context = { source: 'generator', system: '120', wiring: 'panel' }
const sound = { id: 'a', truth: 'sound', note: 'ignored', context, findings: { 'receptacle.hn.volts': 120 } }

describe('npm run -s rank', () => {
  test('answers each line that is not blank, in order; bad lines too; a mark and CRs are ignored', async () => {
    const text = `\uFEFF${JSON.stringify(sound)}\r\n\r\n   \nnot json\n[1]\n${JSON.stringify({ ...sound, id: 'b', context: {} })}\n${JSON.stringify({ id: 'c', context })}\n`
    await writeFile(join(folder, 'cases.jsonl'), text)
    const { code, lines, words } = await rank(['cases.jsonl'])
    expect(code).toBe(0)
    expect(words).toBe('')
    expect(lines.map((l) => l['id'])).toEqual(['a', null, null, 'b', 'c'])
    expect(lines[0]).toMatchObject({ stop: false, misfit: false, bond: 'held-back' })
    expect(Object.keys(lines[0]!).sort()).toEqual(['bond', 'id', 'misfit', 'nextTests', 'ranking', 'stop'])
    expect(Object.keys(lines[1]!['error'] as object)).toEqual([''])
    expect(Object.keys(lines[2]!['error'] as object)).toEqual([''])
    expect(Object.keys(lines[3]!['error'] as object).sort()).toEqual([
      'context.source',
      'context.system',
      'context.wiring',
    ])
    const ranking = lines[4]!['ranking'] as { cause: string; share: number }[]
    expect(ranking.map((r) => r.cause).sort()).toEqual([...starter.causeIds].sort())
    expect(Math.abs(ranking.reduce((a, r) => a + r.share, 0) - 1)).toBeLessThan(1e-9)
  })

  test('reads standard input; ranking and next tests come with stop and misfit too', async () => {
    const live = {
      id: 'x',
      context,
      findings: {
        tingle: 'yes',
        'receptacle.hn.volts': 120,
        'receptacle.hg.volts': 120,
        'receptacle.ng.volts': 120,
      },
    }
    const { code, lines } = await rank(['-', '--priors', 'flat'], JSON.stringify(live))
    expect(code).toBe(0)
    expect(lines).toHaveLength(1)
    expect(lines[0]).toMatchObject({ stop: true, misfit: true })
    expect((lines[0]!['nextTests'] as unknown[]).length).toBeGreaterThan(20)
    const shares = (lines[0]!['ranking'] as { cause: string; share: number }[]).filter((r) => r.share > 0)
    expect(shares.every((r) => starter.causes.get(r.cause)?.electrical)).toBe(true)
  })

  test('an empty file is read to its end', async () => {
    await writeFile(join(folder, 'empty.jsonl'), '')
    expect(await rank(['empty.jsonl'])).toMatchObject({ code: 0, lines: [] })
  })

  test.each([
    ['no file', []],
    ['a file that isn’t there', ['nowhere.jsonl']],
    ['unknown priors', ['cases.jsonl', '--priors', 'mine']],
    ['an unknown option', ['cases.jsonl', '--fast']],
    ['two files', ['cases.jsonl', 'empty.jsonl']],
  ])('exit 2 and nothing on standard output: %s', async (_, args) => {
    const { code, lines, words } = await rank(args)
    expect(code).toBe(2)
    expect(lines).toEqual([])
    expect(words).not.toBe('')
  })
})
