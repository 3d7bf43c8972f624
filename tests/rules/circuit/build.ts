import type { Branch, Network, Node } from '../../../rules/circuit/network.ts'

/** Branches for a test, named by what they join where nothing else is said. */
export const r = (from: Node, to: Node, ohms: number, name = `${from}-${to}`): Branch => ({
  kind: 'resistance',
  name,
  from,
  to,
  ohms,
})
export const c = (from: Node, to: Node, farads: number, name = `${from}-${to}`): Branch => ({
  kind: 'capacitance',
  name,
  from,
  to,
  farads,
})
/** A source that makes `to` the more positive, behind 1 mΩ unless told. */
export const v = (from: Node, to: Node, volts: number, degrees = 0, ohms = 0.001): Branch => ({
  kind: 'source',
  name: `source ${to}`,
  from,
  to,
  volts,
  degrees,
  ohms,
})
export const at60 = (...branches: Branch[]): Network => ({ hertz: 60, branches })
export const at50 = (...branches: Branch[]): Network => ({ hertz: 50, branches })
