/** Small pieces of the audit's sentences. */
import type { Bond } from './wiring.ts'

/** "A", "A and B", "A, B and C". */
export function listed(names: readonly string[]): string {
  const last = names.at(-1) ?? ''
  return names.length < 2 ? last : `${names.slice(0, -1).join(', ')} and ${last}`
}

const words = ['No', 'One', 'Two', 'Three', 'Four', 'Five', 'Six', 'Seven', 'Eight', 'Nine']
/** "Two", "Eleven" as "11": how many, at the start of a sentence. */
export const howMany = (n: number): string => words[n] ?? String(n)

/** A bond by what it is: "the bond screw in House panel". */
export function bondWords({ part, how }: Bond): string {
  switch (how) {
    case 'source':
      return `the bond inside ${part.name}`
    case 'relay':
      return `the bond relay of ${part.name}`
    case 'screw':
      return `the bond screw in ${part.name}`
    case 'jumper':
      return `the jumper at ${part.name}`
    case 'existing-range':
      return `the frame of ${part.name}, on its neutral`
    case 'transformer':
    case 'autotransformer':
      return `the bond of ${part.name}`
  }
}
