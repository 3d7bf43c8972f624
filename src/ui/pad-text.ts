export type PadKey = '0' | '1' | '2' | '3' | '4' | '5' | '6' | '7' | '8' | '9' | '.' | 'erase' | 'clear'

const longest = 7

/** What a key of the pad makes of the text in a field. A second point and an eighth sign change nothing. */
export function pressPadKey(text: string, key: PadKey): string {
  if (key === 'clear') return ''
  if (key === 'erase') return text.slice(0, -1)
  if (key === '.') return text.includes('.') ? text : `${text === '' ? '0' : text}.`
  if (text.length >= longest) return text
  return text === '0' ? key : text + key
}
