/** The network that is drawn: the cause's typical wiring, with what was turned on and off. */
import type { Network, Node } from '../circuit/network.ts'
import { hasPanel, ohmsScale } from '../circuit/wiring/context.ts'
import type { WiringContext } from '../circuit/wiring/context.ts'
import { canOccur } from '../circuit/wiring/occurs.ts'
import { applyEdit, join, remove } from '../circuit/wiring/edits.ts'
import type { Edit } from '../circuit/wiring/edits.ts'
import { feedOf } from '../circuit/wiring/healthy.ts'
import { typicalOf } from '../circuit/wiring/parameters.ts'
import type { Parameters } from '../circuit/wiring/parameters.ts'
import { edited, editsOf, rangesWith } from '../circuit/wiring/wire.ts'
import { drawnAs } from './drawn-as.ts'
import type { DrawnAs } from './drawn-as.ts'
import type { LoopOptions } from './loop-options.ts'

/** Ohms of what is turned on in the picture, beside the model's own typical ones. */
const drawnOhms = { bond: 0.02, rod: 25, touch: 0.01 } as const

export type Drawn = {
  context: WiringContext
  as: DrawnAs
  p: Parameters
  network: Network
  /** Where the one bond belongs. */
  bondPlace: 'source' | 'panel'
  /** Which terminal of the receptacle the hot wire lands on. */
  hotAt: Node
}

const has = ({ branches }: Network, name: string) => branches.some((branch) => branch.name === name)
const neutralAndCase = (place: 'source' | 'panel'): [Node, Node] =>
  place === 'source' ? ['source.neutral', 'source.case'] : ['panel.neutral', 'panel.ground']

/** Follows a conductor of the circuit from where it begins to the terminal it ends on. */
function terminalOf({ branches }: Network, begin: Node): Node {
  let at = begin
  for (const stretch of ['branch', 'last', 'slot'])
    at =
      branches.find((one) => one.name.startsWith(`${stretch}.`) && isWire(one.name) && one.from === at)?.to ??
      at
  return at
}
/** `branch.hot`, but not the capacitances of its cable. */
const isWire = (name: string): boolean =>
  /^(?:feeder|branch|last|slot)\.(?:hot2?|neutral|ground)$/.test(name)

function baseOf(context: WiringContext, as: DrawnAs): { p: Parameters; network: Network } {
  const typical = typicalOf(rangesWith(context, as.wiring))
  // The house's loads are drawn where they are the point; elsewhere they would only blur the loop.
  const quiet = as.wiring === 'shared-neutral-lost' ? {} : { houseAmps: 0, houseAmpsOther: 0 }
  // A standing fault is drawn on the circuit, where its breaker would see it.
  const where = as.wiring === 'standing-ground-fault' ? { faultAt: 'branch' as const } : {}
  const p: Parameters = { ...typical, houseAmpsAcross: 0, ...quiet, ...where }
  return { p, network: edited(context, p, [...editsOf(context, as.wiring, p), ...as.edits]) }
}

/** Two legs in series are drawn with the panel on which they meet. */
const drawnContext = (context: WiringContext, as: DrawnAs): WiringContext =>
  as.wiring === 'shared-neutral-lost' ? { ...context, wiring: 'panel' } : context

/**
 * What the cause's own wiring has: the state the picture opens with.
 * @returns undefined where the cause is not drawn, or can't occur in this context
 */
export function loopDefaults(context: WiringContext, cause: string): Omit<LoopOptions, 'state'> | undefined {
  const as = drawnAs(cause)
  if (as === undefined || 'because' in as || !canOccur(as.wiring, context)) return undefined
  const { network } = baseOf(drawnContext(context, as), as)
  return {
    bond: has(network, 'bond'),
    rod: has(network, 'panel.rod') || has(network, 'source.rod'),
    secondBond: has(network, 'bond.second'),
  }
}

function turned(
  network: Network,
  context: WiringContext,
  bondPlace: 'source' | 'panel',
  options: LoopOptions,
): Edit[] {
  const edits: Edit[] = []
  const turn = (name: string, on: boolean, between: [Node, Node], ohms: number) => {
    if (has(network, name) === on) return
    edits.push(on ? join(name, ...between, ohms) : remove(name))
  }
  turn('bond', options.bond, neutralAndCase(bondPlace), drawnOhms.bond)
  if (hasPanel(context))
    turn(
      'bond.second',
      options.secondBond,
      neutralAndCase(bondPlace === 'source' ? 'panel' : 'source'),
      drawnOhms.bond,
    )
  const rods = ['panel.rod', 'source.rod'].filter((name) => has(network, name))
  if (!options.rod) edits.push(...rods.map(remove))
  else if (rods.length === 0)
    edits.push(
      hasPanel(context)
        ? join('panel.rod', 'panel.ground', 'earth', drawnOhms.rod)
        : join('source.rod', 'source.case', 'earth', drawnOhms.rod),
    )
  return edits
}

/**
 * The wiring of a cause as it is drawn.
 * @returns undefined where the cause is not drawn, or can't occur in this context
 */
export function drawnWiring(given: WiringContext, cause: string, options: LoopOptions): Drawn | undefined {
  const as = drawnAs(cause)
  if (as === undefined || 'because' in as || !canOccur(as.wiring, given)) return undefined
  const context = drawnContext(given, as)
  const { p, network } = baseOf(context, as)
  const bondPlace = hasPanel(context) ? p.bondAt : 'source'
  const hotAt = terminalOf(network, `${feedOf(context)}.hot`)
  const edits = turned(network, context, bondPlace, options)
  if (options.state === 'load')
    edits.push(join('load', 'receptacle.hot', 'receptacle.neutral', as.loadOhms * ohmsScale(context)))
  // Where hot is on metal already, there is nothing to add.
  else if (!has(network, 'fault') && hotAt !== 'receptacle.ground')
    edits.push(join('touch', hotAt, 'receptacle.ground', drawnOhms.touch))
  const branches = edits.reduce(applyEdit, [...network.branches])
  return { context, as, p, network: { ...network, branches }, bondPlace, hotAt }
}
