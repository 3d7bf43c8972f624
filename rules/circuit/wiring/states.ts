/**
 * A wiring in the states in which it is measured: running, and dead, with what a tech lifts before taking ohms.
 * Branches are found by name; what a fault took away is not missed.
 */
import type { Branch, Network } from '../network.ts'
import { hasPanel, ohmsScale, nominalVolts } from './context.ts'
import type { WiringContext } from './context.ts'
import { resistance } from './healthy.ts'
import type { Parameters } from './parameters.ts'

/** What the known load and whatever else is held to a receptacle draws through. */
export const testLoadOhms = (context: WiringContext, p: Parameters): number =>
  nominalVolts(context) / p.testAmps

/** Something left plugged in further along the circuit, as a load; none where nothing was. */
export const pluggedIn = (context: WiringContext, p: Parameters) =>
  p.pluggedInOhms > 0
    ? [{ from: 'box.hot', to: 'box.neutral', ohms: p.pluggedInOhms * ohmsScale(context) ** 2 }]
    : []

/** A source that stands still, as an ohmmeter at its terminals meets it: a winding, megohms, or nothing. */
function still(branch: Branch & { kind: 'source' }, halves: boolean, p: Parameters): Branch[] {
  if (p.offLooks === 'open') return []
  const ohms = p.offLooks === 'winding' ? p.windingOhms : p.electronicOffOhms
  return [resistance(branch.name, branch.from, branch.to, halves ? ohms / 2 : ohms)]
}

/** A relay that makes the bond sits in the source, and lets go with it. */
const letsGo = (b: Branch, p: Parameters): boolean =>
  p.bondBy === 'relay' && b.name.startsWith('bond') && b.to === 'source.case'

/** Loads that are unplugged or switched off before ohms are taken. */
const unplugged = (b: Branch): boolean =>
  b.kind === 'resistance' && (b.name.startsWith('house.') || b.name.startsWith('stuck.'))

/** The same wiring with the source off, loads unplugged, at 0 Hz: what an ohmmeter sees. */
export function dead(context: WiringContext, network: Network, p: Parameters): Network {
  const halves = network.branches.some((b) => b.name === 'source.half')
  const left = p.leftInOhms * ohmsScale(context) ** 2
  const branches = network.branches
    .filter((b) => !unplugged(b) && !letsGo(b, p))
    .flatMap((b) => (b.kind === 'source' ? still(b, halves, p) : [b]))
  if (left > 0)
    branches.push(
      p.leftIn === 'at-panel' && hasPanel(context)
        ? resistance('left-in', 'panel.hot', 'panel.neutral', left)
        : resistance('left-in', 'box.hot', 'box.neutral', left),
    )
  return { hertz: 0, branches }
}

/** A network without the branches of these names. */
export const lifted = ({ hertz, branches }: Network, names: readonly string[]): Network => ({
  hertz,
  branches: branches.filter((b) => !names.includes(b.name)),
})
/** Main open and feeder neutral lifted, as for ohms at the panel. */
export const mainOpen = ['feeder.hot', 'feeder.hot2', 'feeder.neutral'] as const
/** Everything off the source's terminals: its feeder, or the cord that plugs into it. */
export const disconnected = (context: WiringContext): readonly string[] =>
  hasPanel(context) ? [...mainOpen, 'feeder.ground'] : ['branch.hot', 'branch.neutral', 'branch.ground']
