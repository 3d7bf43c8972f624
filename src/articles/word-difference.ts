export type Change = { kind: 'same' | 'gone' | 'new'; text: string }

// More than this would hold the page up: then whole lines are compared instead of words.
const mostSteps = 10_000_000

const words = (text: string) =>
  text.match(/\s+|[\p{L}\p{N}]+(?:[’'.,-][\p{L}\p{N}]+)*|[^\s\p{L}\p{N}]/gu) ?? []
const lines = (text: string) => text.match(/[^\n]*\n|[^\n]+$/g) ?? []

/** How long the longest common run of words is, from each pair of places on. */
function lengths(from: readonly string[], to: readonly string[]): (i: number, j: number) => number {
  const width = to.length + 1
  const table = new Uint32Array((from.length + 1) * width)
  for (let i = from.length - 1; i >= 0; i--)
    for (let j = to.length - 1; j >= 0; j--)
      table[i * width + j] =
        from[i] === to[j]
          ? table[(i + 1) * width + j + 1]! + 1
          : Math.max(table[(i + 1) * width + j]!, table[i * width + j + 1]!)
  return (i, j) => table[i * width + j]!
}

/** Undefined where that would take too long. */
function compare(from: readonly string[], to: readonly string[]): Change[] | undefined {
  let begin = 0
  while (begin < from.length && begin < to.length && from[begin] === to[begin]) begin++
  let end = 0
  while (
    end < from.length - begin &&
    end < to.length - begin &&
    from[from.length - 1 - end] === to[to.length - 1 - end]
  )
    end++
  const gone = from.slice(begin, from.length - end)
  const added = to.slice(begin, to.length - end)
  if (gone.length * added.length > mostSteps) return undefined
  const middle: Change[] = []
  const left = lengths(gone, added)
  for (let i = 0, j = 0; i < gone.length || j < added.length;) {
    if (i < gone.length && j < added.length && gone[i] === added[j]) {
      middle.push({ kind: 'same', text: gone[i]! })
      i++
      j++
    } else if (j >= added.length || (i < gone.length && left(i + 1, j) >= left(i, j + 1)))
      middle.push({ kind: 'gone', text: gone[i++]! })
    else middle.push({ kind: 'new', text: added[j++]! })
  }
  return [
    { kind: 'same', text: from.slice(0, begin).join('') },
    ...middle,
    { kind: 'same', text: from.slice(from.length - end).join('') },
  ]
}

/** Neighbors of one kind, together. */
function together(changes: readonly Change[]): Change[] {
  const runs: Change[] = []
  for (const { kind, text } of changes) {
    if (text === '') continue
    const last = runs.at(-1)
    if (last?.kind === kind) last.text += text
    else runs.push({ kind, text })
  }
  return runs
}

/**
 * What became of a text, word by word: the words that stayed, those that are gone, those that are new. Gone and same
 * together are the former text, new and same the other, to the letter.
 */
export function wordDifference(former: string, now: string): Change[] {
  const changes = compare(words(former), words(now)) ??
    compare(lines(former), lines(now)) ?? [
      { kind: 'gone', text: former },
      { kind: 'new', text: now },
    ]
  return together(changes)
}
