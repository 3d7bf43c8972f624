import type { Circuit } from '../circuit.ts'
import type { Finding } from '../findings.ts'
import { listed } from '../phrases.ts'
import type { PowerPart, Receptacle } from '../system.ts'

const nameOf = ({ wiring }: Circuit, id: string) => wiring.parts.get(id)?.name ?? id
/** Whether a receptacle's neutral wire lands in another panel than its hot. */
const strays = (part: PowerPart): part is Receptacle & { neutralAt: string } =>
  part.kind === 'receptacle' && part.neutralAt !== undefined && part.neutralAt !== part.feed.from

function shared(circuit: Circuit, part: Receptacle & { neutralAt: string }): Finding {
  const [hot, neutral] = [nameOf(circuit, part.feed.from), nameOf(circuit, part.neutralAt)]
  const sameSource =
    circuit.reached.has(part.neutralAt) && circuit.onNeutral(circuit.wiring.point(part.neutralAt))
  return {
    kind: 'shared-neutral',
    parts: [part.id, part.neutralAt],
    says: `${part.name} takes its hot from ${hot} and its neutral from ${neutral}${sameSource ? '' : ', which this source does not feed'}.`,
    danger: sameSource
      ? 'Its current comes back by another way: a GFCI trips, and a neutral opened in one panel is live from the other.'
      : 'Its current has to find its own source over the other’s neutral or over ground, and a wire taken for dead is live.',
    change: [`Move its neutral to ${hot}, the panel its breaker is in.`],
    sections: ['nec-300.3', 'nec-200.4'],
  }
}

/** What is wrong with neutrals other than their bonds. */
export function neutralFindings(circuit: Circuit): Finding[] {
  const { live, places, carrying, onNeutral } = circuit
  const { point } = circuit.wiring
  const names = listed(live.map(({ name }) => name))
  const derived = carrying.some(({ to }) => to.kind === 'autotransformer')
  if (live.every(({ volts }) => volts === '240') && !derived)
    return [
      {
        kind: 'no-neutral',
        parts: live.map(({ id }) => id),
        says: `${names} has two hots, and nothing makes a neutral of them.`,
        danger: 'There is nothing to bond: a wire called neutral here is a hot.',
        change: [
          'Feed 240 V loads alone, by two-pole breakers, as the source’s instructions allow; or have an autotransformer listed for this source put in.',
        ],
        sections: ['nec-250.26', 'nec-250.20'],
      },
    ]
  const found = places.filter(strays).map((part) => shared(circuit, part))
  const without = places.filter(
    (part) =>
      (part.kind === 'panel' || part.kind === 'receptacle') && !strays(part) && !onNeutral(point(part.id)),
  )
  if (without.length > 0)
    found.push({
      kind: 'neutral-missing',
      parts: without.map(({ id }) => id),
      says: `No neutral of ${names} reaches ${listed(without.map(({ name }) => name))}.`,
      danger:
        'Loads between hot and neutral there share the full voltage as they please: some get far too much.',
      change: [
        `Run a neutral to ${listed(without.map(({ name }) => name))}, or leave nothing there but 240 V loads on two-pole breakers.`,
      ],
      sections: ['nec-300.3'],
    })
  const sums = places.filter((part) => part.kind === 'panel' && part.multiwire)
  if (sums.length > 0 && live.every(({ volts }) => volts === '120'))
    found.push({
      kind: 'multiwire',
      parts: sums.map(({ id }) => id),
      says: `${names} gives 120 V on both bars of ${listed(sums.map(({ name }) => name))}, where circuits share a neutral.`,
      danger: 'The shared neutral carries the sum of both hots, with no breaker on it: it can burn.',
      change: [
        'Give each circuit a neutral of its own, or feed the panel 120/240 V.',
        'Until then turn one breaker of each such pair off, and mark it.',
      ],
      sections: ['nec-710.15', 'nec-210.4'],
    })
  return found
}
