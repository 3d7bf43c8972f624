/** How many slips a word of this length may hold and still be read: none in a short word, where one makes another. */
const slipsAllowed = (length: number): number => (length < 4 ? 0 : length < 8 ? 1 : 2)

/**
 * Slips between two words: a letter too many, missing, wrong, or two neighbors in each other's place.
 * Stops counting above `most` and answers `most + 1`.
 */
export function slipsBetween(a: string, b: string, most: number): number {
  if (Math.abs(a.length - b.length) > most) return most + 1
  let before: number[] = []
  let last = Array.from({ length: b.length + 1 }, (_, j) => j)
  for (let i = 1; i <= a.length; i++) {
    const row = [i]
    let least = i
    for (let j = 1; j <= b.length; j++) {
      const wrong = last[j - 1]! + (a[i - 1] === b[j - 1] ? 0 : 1)
      let slips = Math.min(wrong, last[j]! + 1, row[j - 1]! + 1)
      if (i > 1 && j > 1 && a[i - 1] === b[j - 2] && a[i - 2] === b[j - 1])
        slips = Math.min(slips, before[j - 2]! + 1)
      row.push(slips)
      least = Math.min(least, slips)
    }
    if (least > most) return most + 1
    before = last
    last = row
  }
  return Math.min(last[b.length]!, most + 1)
}

type Candidate = {
  word: string
  slips: number
  /** Begins with the letter that was typed. */
  sameFirst: boolean
  /** A letter left out, doubled or moved: commoner than one letter taken for another. */
  sameLetters: boolean
  times: number
}
const sorted = (word: string) => [...word].sort().join('')

function isNearer(a: Candidate, b: Candidate): boolean {
  if (a.slips !== b.slips) return a.slips < b.slips
  if (a.sameFirst !== b.sameFirst) return a.sameFirst
  if (a.sameLetters !== b.sameLetters) return a.sameLetters
  if (a.times !== b.times) return a.times > b.times
  return a.word < b.word
}

/**
 * The known word that a mistyped one most likely stands for, or undefined. Fewest slips first, then the same first
 * letter, then the kind of slip, then the commoner word, then by alphabet: the same answer wherever it runs.
 * @param known word → how often it occurs
 */
export function readAs(word: string, known: ReadonlyMap<string, number>): string | undefined {
  const most = slipsAllowed(word.length)
  if (most === 0) return undefined
  let best: Candidate | undefined
  for (const [candidate, times] of known) {
    if (candidate.length < 3) continue
    const slips = slipsBetween(word, candidate, best?.slips ?? most)
    if (slips > (best?.slips ?? most)) continue
    const sameFirst = candidate[0] === word[0]
    const sameLetters = candidate.length !== word.length || sorted(candidate) === sorted(word)
    const one = { word: candidate, slips, sameFirst, sameLetters, times }
    if (best === undefined || isNearer(one, best)) best = one
  }
  return best?.word
}
