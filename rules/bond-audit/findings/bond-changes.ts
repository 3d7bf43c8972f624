/** What to do about a bond: how one is taken out, and where one belongs. */
import type { Circuit } from '../circuit.ts'
import { firstPanels, utilityReaches } from '../paths.ts'
import { listed } from '../phrases.ts'
import type { Bond } from '../wiring.ts'

/** Switches with a solid neutral between a source and what is live, so that switching it would part the two. */
const solidSwitches = ({ wiring }: Circuit, id: string) =>
  wiring.leaving(id).flatMap(({ to }) => (to.kind === 'switch' && to.neutral === 'solid' ? [to] : []))

/** Ways to get rid of a bond that is one too many, the easiest that is allowed first. */
export function takeOut(circuit: Circuit, { part, how }: Bond): string[] {
  const { name } = part
  const live = circuit.live.some(({ id }) => id === part.id)
  const parted = solidSwitches(circuit, part.id).map(
    (one) =>
      `Or have ${one.name} replaced by transfer equipment that switches the neutral: then ${name} is a source of its own, bonded once in itself.`,
  )
  switch (how) {
    case 'screw':
      return part.kind === 'panel' && !part.feed.ground
        ? [`${name}: run a grounding conductor to it first, then take the bond screw or strap out.`]
        : [`${name}: take the bond screw or strap out. Keep neutrals and grounds on separate bars.`]
    case 'jumper':
      return [
        `${name}: take the jumper out, then look for what it was to hide. The ground path there may be open.`,
      ]
    case 'existing-range':
      return [`${name}: use the grounding conductor that comes with it, and take the frame off the neutral.`]
    case 'relay':
      return live || part.kind !== 'source' || !part.relay.includes('passing-through')
        ? [`${name}: turn its bond relay off, as its instructions allow.`, ...parted]
        : [
            `${name}: set its bond relay to close on its own power alone, open while another source passes through.`,
          ]
    case 'source':
      return [
        `${name}: have its bond taken out, only as its instructions allow and where it feeds nothing else that needs it.`,
        ...parted,
      ]
    case 'transformer':
    case 'autotransformer':
      return [`${name}: leave its bond out, as its instructions allow, where the panel behind it has one.`]
  }
}

const gate =
  'A bond is installed only after Diagnosis has released it: the test bulb at the source’s own terminals, and instructions that allow it.'

/** Where the one bond belongs that is missing. The bond is held back until the readings release it. */
export function whereItBelongs(circuit: Circuit): string[] {
  const { live, carrying, wiring } = circuit
  const sources = live.flatMap((part) => (part.kind === 'source' ? [part] : []))
  if (sources.some(({ type }) => type === 'utility')) {
    const mains = carrying
      .filter(({ to }) => to.kind === 'panel' && to.role === 'main')
      .map(({ to }) => to.name)
    return [
      `The bond belongs in ${mains.length > 0 ? listed(mains) : 'the service disconnect'}, at the service disconnect.`,
    ]
  }
  const names = listed(live.map(({ name }) => name))
  const panels = firstPanels(circuit)
    .filter(({ id }) => !utilityReaches(wiring, id))
    .map(({ name }) => name)
  const relays = sources.filter(({ output }) => output === 'relay').map(({ name }) => name)
  const isolated = sources.some(({ output }) => output === 'isolated')
  const parting = carrying
    .filter(({ to }) => to.kind === 'switch' && to.neutral === 'switched')
    .map(({ to }) => to.name)
  const places =
    panels.length > 0 ? `${names} or in ${listed(panels)}, its first disconnect; never both` : names
  const easier = [
    ...(relays.length > 0
      ? [`${listed(relays)}: turn on its own bond relay for its own power, if its instructions allow it.`]
      : []),
    // A source without a bond of its own can use the building's, if its neutral stays joined to it.
    ...(parting.length > 0 && relays.length === 0
      ? [
          `${listed(parting)}: transfer equipment that leaves the neutral joined lets the building’s own bond serve ${names}.`,
        ]
      : []),
  ]
  return [
    ...easier,
    `${easier.length > 0 ? 'Or one' : 'One'} bond in ${places}.`,
    isolated ? `${gate} Many isolated outputs allow none: then keep it off building wiring.` : gate,
  ]
}
