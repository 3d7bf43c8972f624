/** What looks like a fault and may stand: named with its conditions, which the audit can't see. */
import type { Circuit } from './circuit.ts'
import type { Count } from './count.ts'
import { groundPathOf } from './ground-path.ts'
import { isProtected } from './paths.ts'
import { bondWords, listed } from './phrases.ts'
import type { SectionId } from './standards.ts'

export type Exception = {
  kind:
    | 'outbuilding'
    | 'existing-range'
    | 'no-ground-behind-gfci'
    | 'portable'
    | 'bonded-outside'
    | 'separated'
    | 'rod-with-rcd'
  parts: readonly string[]
  says: string
  /** All of them must hold. */
  conditions: readonly string[]
  sections: readonly SectionId[]
}

const outbuilding = (name: string, id: string): Exception => ({
  kind: 'outbuilding',
  parts: [id],
  says: `The bond in ${name} may stay: an old feeder without a grounding conductor.`,
  conditions: [
    'The feeder was there before the code asked for a grounding conductor, and was allowed then.',
    'No metal joins the buildings: no water pipe, duct, cable shield or fence.',
    'No ground-fault protection ahead of the feeder.',
    'Any new feeder brings a grounding conductor, and the bond comes out with it.',
  ],
  sections: ['nec-250.32'],
})

const existingRange = (name: string, id: string): Exception => ({
  kind: 'existing-range',
  parts: [id],
  says: `The frame of ${name} may stay on its neutral: an existing branch circuit.`,
  conditions: [
    'The branch circuit is an existing one of the three-wire kind.',
    'Its neutral is insulated, or uninsulated in service-entrance cable from the service equipment.',
    'Its neutral is 10 AWG copper, 8 AWG aluminum, or larger.',
    'A new circuit brings a grounding conductor.',
  ],
  sections: ['nec-250.140', 'nec-250.142'],
})

/** A portable source that feeds plug-in loads alone. */
const isPortable = ({ live, places }: Circuit): boolean =>
  live.every(
    (part) => part.kind === 'source' && (part.type === 'portable-generator' || part.type === 'power-station'),
  ) && places.every(({ kind }) => kind === 'receptacle' || kind === 'source')

/** An inverter or power station without a bond of its own: whether one outside it is allowed its instructions say. */
const isBondedOutside = ({ live }: Circuit): boolean =>
  live.some(
    (part) =>
      part.kind === 'source' &&
      (part.type === 'inverter' || part.type === 'power-station') &&
      (part.output === 'floating' || part.output === 'isolated'),
  )

const isSeparated = ({ live, places }: Circuit): boolean =>
  live.some((part) => part.kind === 'source' && part.output === 'balanced') &&
  places.every(({ kind }) => kind === 'transformer')

/** The exceptions that apply in one mode. */
export function exceptionsOf(circuit: Circuit, { counted, excepted }: Count): Exception[] {
  const { live, places } = circuit
  const found = excepted.map(({ bond: { part }, why }) =>
    (why === 'outbuilding' ? outbuilding : existingRange)(part.name, part.id),
  )
  const names = listed(live.map(({ name }) => name))
  const ids = live.map(({ id }) => id)
  const [only] = counted
  if (only !== undefined && counted.length === 1 && isBondedOutside(circuit))
    found.push({
      kind: 'bonded-outside',
      parts: ids,
      says: `The one bond of ${names} is outside it: ${bondWords(only)}.`,
      conditions: [
        'Its instructions allow its neutral to be bonded outside it. Many isolated outputs allow none.',
        'It is not balanced: Diagnosis released the bond by the test bulb at its own terminals, 2 V or less both ways.',
      ],
      sections: ['nec-250.30-1'],
    })
  if (counted.length === 1 && isPortable(circuit))
    found.push({
      kind: 'portable',
      parts: ids,
      says: `No rod is wanted at ${names}: it feeds plug-in loads alone.`,
      conditions: [
        'Only loads with cords, plugged into its own receptacles; no building wiring.',
        'Its receptacles’ grounds and its metal are tied to its frame.',
        'Of 15 kW or less and bonded: all its 125 V, 15 and 20 A receptacles have GFCI.',
      ],
      sections: ['nec-250.34', 'nec-250.34-c', 'nec-445.20'],
    })
  if (counted.length === 0 && isPortable(circuit))
    found.push({
      kind: 'portable',
      parts: ids,
      says: `No bond is wanted: ${names} feeds plug-in loads alone.`,
      conditions: [
        'Only loads with cords, plugged into its own receptacles; no building wiring.',
        'Its receptacles’ grounds and its metal are tied to its frame.',
        'A floating 125 V generator of 15 kW or less needs a 125/250 V receptacle too; a bonded one needs GFCI.',
        'One load at a time, or loads whose metal is tied together, where the output is separated.',
      ],
      sections: ['nec-250.34', 'nec-445.20', 'iec-413'],
    })
  if (counted.length === 0 && isSeparated(circuit))
    found.push({
      kind: 'separated',
      parts: ids,
      says: `No bond is wanted on ${names}: it feeds a transformer alone, and the bond is behind that.`,
      conditions: [
        'Nothing else is on these wires.',
        'Breakers there open both wires.',
        'The transformer is listed for isolation; its case is tied to the source’s.',
      ],
      sections: ['nec-250.30', 'iec-413'],
    })
  for (const place of places) {
    const path = groundPathOf(circuit, place)
    if (path === 'metal') continue
    if (
      place.kind === 'receptacle' &&
      !place.feed.ground &&
      isProtected(circuit, place) &&
      counted.length > 0
    )
      found.push({
        kind: 'no-ground-behind-gfci',
        parts: [place.id],
        says: `${place.name} has no ground, and a GFCI ahead of it.`,
        conditions: [
          'The circuit is an existing one; the receptacle replaces one without a ground.',
          'It is marked “No Equipment Ground”, and “GFCI Protected” where the GFCI is elsewhere.',
          'No grounding conductor runs on from it.',
        ],
        sections: ['nec-406.4'],
      })
    else if (path === 'soil' && live.some(({ volts }) => volts === '230') && isProtected(circuit, place))
      found.push({
        kind: 'rod-with-rcd',
        parts: [place.id],
        says: `${place.name} has earth as its way back, and an RCD that disconnects.`,
        conditions: [
          'The supply is TT by the utility’s rules.',
          'Electrode ohms × the RCD’s rated residual current are 50 V or less.',
          'The RCD covers every circuit and is tested with its button.',
        ],
        sections: ['iec-411.5'],
      })
  }
  return found
}
