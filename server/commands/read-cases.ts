import { readFile } from 'node:fs/promises'
import { resolve } from 'node:path'
import { callFolder } from './call-folder.ts'

/** Exit code for bad usage or a file that can't be read. */
export const badUsage = 2

/**
 * The lines of a JSON Lines file, blank ones left out. `-` is standard input; a relative path counts from where
 * npm was called.
 */
async function readLines(path: string, calledFrom: string): Promise<string[]> {
  const text = path === '-' ? await readStandardInput() : await readFile(resolve(calledFrom, path), 'utf8')
  return text
    .replace(/^\uFEFF/, '')
    .split('\n')
    .map((line) => line.replace(/\r$/, ''))
    .filter((line) => line.trim() !== '')
}

async function readStandardInput(): Promise<string> {
  const chunks: Buffer[] = []
  for await (const chunk of process.stdin) chunks.push(chunk as Buffer)
  return Buffer.concat(chunks).toString('utf8')
}

/** A line as JSON; undefined is never a JSON value, so it says that the line is none. */
export function parseLine(line: string): unknown {
  try {
    return JSON.parse(line) as unknown
  } catch {
    return undefined
  }
}

type Arguments = { files: string[]; priors: 'flat' | 'field' }

/** Reads `FILE… [--priors flat|field]`. Undefined on bad usage. */
function readArguments(args: readonly string[], most: number): Arguments | undefined {
  const files: string[] = []
  let priors: string | undefined
  for (let i = 0; i < args.length; i++) {
    const arg = args[i] ?? ''
    if (arg === '--priors') priors = args[++i] ?? ''
    else if (arg.startsWith('--priors=')) priors = arg.slice('--priors='.length)
    else if (arg.startsWith('-') && arg !== '-') return undefined
    else files.push(arg)
  }
  const known = priors === undefined || priors === 'flat' || priors === 'field'
  if (!known || files.length < 1 || files.length > most) return undefined
  return { files, priors: priors === 'flat' ? 'flat' : 'field' }
}

/**
 * The cases a command was called with: the lines of its files, and the priors. Undefined, with the reason on
 * standard error, on bad usage or a file that can't be read: the command then ends with `badUsage`.
 * @param most how many files the command takes
 */
export async function casesAsCalled(
  usage: string,
  most: number,
): Promise<{ lines: string[]; priors: 'flat' | 'field' } | undefined> {
  const args = readArguments(process.argv.slice(2), most)
  if (args === undefined) {
    console.error(`usage: ${usage}`)
    return undefined
  }
  try {
    const files = await Promise.all(args.files.map((file) => readLines(file, callFolder())))
    return { lines: files.flat(), priors: args.priors }
  } catch (cause) {
    console.error(`can't read: ${cause instanceof Error ? cause.message : String(cause)}`)
    return undefined
  }
}
