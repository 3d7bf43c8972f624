import type { Place } from './loop-state.ts'

export const listed = (names: readonly string[]): string =>
  names.length < 2 ? (names[0] ?? '') : `${names.slice(0, -1).join(', ')} and ${names.at(-1)}`

export const metalNames: Readonly<Record<Place, string>> = {
  source: 'the source’s case',
  panel: 'the panel’s metal',
  receptacle: 'metal of what is plugged in',
}
export const capital = (words: string) => words.charAt(0).toUpperCase() + words.slice(1)
