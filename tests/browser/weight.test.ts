/** How much script a phone must fetch before the check can be answered. */
import { readFile } from 'node:fs/promises'
import { gzipSync } from 'node:zlib'
import { expect, test } from 'vitest'

const dist = new URL('../../dist/', import.meta.url)
type Chunk = { file: string; imports?: string[]; isEntry?: boolean; name?: string }
const manifest = JSON.parse(await readFile(new URL('.vite/manifest.json', dist), 'utf8')) as Record<
  string,
  Chunk
>

/** Everything a chunk needs before it runs: itself and what it imports statically, over and over. */
function staticGraph(...from: string[]): Set<string> {
  const found = new Set<string>()
  const add = (key: string) => {
    const chunk = manifest[key]
    if (chunk === undefined) throw new Error(`the build has no ${key}`)
    if (found.has(key)) return
    found.add(key)
    chunk.imports?.forEach(add)
  }
  from.forEach(add)
  return found
}

const check = staticGraph('index.html', 'src/triage/check.page.tsx')

test('the check’s initial script is 150 kB gzip or less', async () => {
  const sizes = await Promise.all(
    [...check].map(async (key) => gzipSync(await readFile(new URL(manifest[key]!.file, dist))).length),
  )
  const total = sizes.reduce((sum, size) => sum + size, 0)
  expect(total).toBeGreaterThan(50_000)
  expect(total).toBeLessThanOrEqual(150_000)
})

test('neither search, nor Markdown, nor the tech’s pages are part of it', async () => {
  const files = await Promise.all(
    [...check].map((key) => readFile(new URL(manifest[key]!.file, dist), 'utf8')),
  )
  const script = files.join('')
  expect(script).toContain('Before you touch anything')
  // Words that only these libraries carry.
  expect(script).not.toMatch(/MiniSearch|DOMPurify|marked\(\)/)
  for (const page of [
    'src/diagnosis/diagnosis.page.tsx',
    'src/articles/article.page.tsx',
    'src/editions/editions.page.tsx',
    'src/worksheets/worksheet.page.tsx',
  ])
    expect([...check]).not.toContain(page)
})
