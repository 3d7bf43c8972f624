import { readFile } from 'node:fs/promises'
import { resolve } from 'node:path'

/** Exit code for bad usage or a file that can't be read. */
export const badUsage = 2

/**
 * The lines of a JSON Lines file, blank ones left out. `-` is standard input; a relative path counts from where
 * npm was called.
 */
export async function readLines(path: string, calledFrom: string): Promise<string[]> {
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

export type Arguments = { files: string[]; priors: 'flat' | 'field' }

/** Reads `FILE… [--priors flat|field]`. Undefined on bad usage. */
export function readArguments(args: readonly string[], most: number): Arguments | undefined {
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
