import { Article } from '../../rules/edition/schema.ts'

/** Reads `key: value` lines and `key:` with `- item` lines: all that an article's head needs. */
function readHead(head: string): Record<string, string | string[]> {
  const fields: Record<string, string | string[]> = {}
  let open: string[] | undefined
  for (const line of head.split('\n').filter((l) => l.trim() !== '')) {
    const item = /^\s*-\s+(.*)$/.exec(line)
    if (item?.[1] !== undefined) {
      if (open === undefined) throw new Error(`front matter: a list item without its key: ${line}`)
      open.push(unquoted(item[1]))
      continue
    }
    const pair = /^([a-z]+):\s*(.*)$/.exec(line)
    if (pair?.[1] === undefined) throw new Error(`front matter: not a key or an item: ${line}`)
    const value = (pair[2] ?? '').trim()
    if (value === '' || value === '[]') fields[pair[1]] = open = []
    else {
      fields[pair[1]] = unquoted(value)
      open = undefined
    }
  }
  return fields
}

const unquoted = (value: string) => value.trim().replace(/^(['"])(.*)\1$/, '$2')

/**
 * An article from a Markdown file with front matter between two lines of three dashes.
 * @throws Error when the head is missing or says something an article can't have
 */
export function parseArticle(file: string): Article {
  const parts = /^---\n([\s\S]*?)\n---\n([\s\S]*)$/.exec(file.replaceAll('\r\n', '\n'))
  if (parts?.[1] === undefined || parts[2] === undefined)
    throw new Error('an article begins with front matter')
  return Article.parse({ ...readHead(parts[1]), body: parts[2].trim() })
}
