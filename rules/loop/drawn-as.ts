/** Which wiring of the circuit model stands for a cause, and what the picture can't say of it. */
import type { Edit } from '../circuit/wiring/edits.ts'
import { join } from '../circuit/wiring/edits.ts'
import { electricalCauses } from '../circuit/wiring/context.ts'
import type { ElectricalCause } from '../circuit/wiring/context.ts'

export type DrawnAs = {
  wiring: ElectricalCause
  /** Made to that wiring as well. */
  edits: readonly Edit[]
  /** What draws current, Ω at 120 V; 12 Ω draws the 10 A of a known load. */
  loadOhms: number
  note: string | undefined
}
export type Undrawn = { because: string }

const usualLoadOhms = 12
const as = (wiring: ElectricalCause, note?: string, more: Partial<DrawnAs> = {}): DrawnAs => ({
  wiring,
  edits: [],
  loadOhms: usualLoadOhms,
  note,
  ...more,
})

const others: Readonly<Record<string, DrawnAs | Undrawn>> = {
  'bond-lost-on-transfer': as('floating-neutral', 'Drawn in the mode that loses the bond.'),
  'unswitched-neutral': as(
    'double-bond',
    'Drawn while the source runs: its own bond and the one behind the unswitched neutral are both in circuit.',
  ),
  'averaging-meter': as('sound', 'The wiring is sound here: it is the meter that shows too little.'),
  'leakage-to-ground': as(
    'sound',
    'Drawn with 8 kΩ from hot to metal in what is plugged in.',
    // 15 mA at 120 V: a Class A GFCI trips from 6 mA on (UL 943).
    { edits: [join('leak', 'receptacle.hot', 'receptacle.ground', 8000)] },
  ),
  'neutral-touch-downstream': as('sound', undefined, {
    edits: [join('astray', 'receptacle.neutral', 'receptacle.ground', 0.5)],
  }),
  'overloaded-circuit': as('sound', 'Drawn with loads of about 24 A on the circuit.', { loadOhms: 5 }),
  'short-circuit': as('sound', 'The wiring is sound: the fault has a good way back.'),
  'gfci-faulty': as('sound', 'The wiring is sound here. A worn-out GFCI changes no current.'),
  'gfci-unsuited': as(
    'sound',
    'The wiring is sound here. What the GFCI makes of this source’s current is not drawn.',
  ),
  'breaker-unsuitable': as(
    'sound',
    'Drawn with a breaker of the usual size in order. One too large, worn out or behind a weak source stays on.',
  ),
  backfeed: { because: 'Two sources that feed the same wires need two loops; this picture draws one.' },
  'neutrals-crossed': { because: 'It takes two circuits side by side; this picture draws one.' },
  'shared-neutral-overloaded': { because: 'It takes two circuits on one neutral; this picture draws one.' },
  'stray-earth-voltage': {
    because: 'The current comes from outside this installation, not round this loop.',
  },
  'dc-ground-fault': {
    because: 'The current is on the battery or solar side; this picture draws the AC side.',
  },
}

const isElectrical = (cause: string): cause is ElectricalCause =>
  (electricalCauses as readonly string[]).includes(cause)

/** How a cause is drawn, or why it isn't; undefined for a cause that nobody here knows. */
export function drawnAs(cause: string): DrawnAs | Undrawn | undefined {
  if (isElectrical(cause)) return as(cause)
  // Names come from articles: "constructor" is none of ours.
  return Object.hasOwn(others, cause) ? others[cause] : undefined
}
