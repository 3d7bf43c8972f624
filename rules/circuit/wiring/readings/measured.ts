import { factor } from '../../solve.ts'
import type { Factored } from '../../solve.ts'
import type { Network } from '../../network.ts'
import type { WiringContext } from '../context.ts'
import type { Parameters } from '../parameters.ts'
import { dead, pluggedIn, testLoadOhms } from '../states.ts'

/** A wiring solved in the states in which readings are taken; the dead ones are solved when first asked for. */
export type Measured = {
  context: WiringContext
  p: Parameters
  names: ReadonlySet<string>
  /** Running, with what is plugged in and stays in. */
  running: Factored
  /** Running with everything plugged in that the tester meets. */
  tested: Factored
  /** Running with the known load on at the receptacle. */
  loaded: Factored
  /** Off, loads unplugged; the network itself, since most of it can be left out for one reading. */
  dead: () => Network
}

const once = <T>(make: () => T): (() => T) => {
  let made: T | undefined
  return () => (made ??= make())
}

/** Solves a wiring for measuring. `network` is the wiring as it runs; `p` the parameters it was made of. */
export function measured(context: WiringContext, network: Network, p: Parameters): Measured {
  const bare = factor(network)
  const tested = bare.loaded(pluggedIn(context, p))
  const running = p.pluggedInStays ? tested : bare
  const known = { from: 'receptacle.hot', to: 'receptacle.neutral', ohms: testLoadOhms(context, p) }
  return {
    context,
    p,
    names: new Set(network.branches.map((b) => b.name)),
    running,
    tested,
    loaded: running.loaded([known]),
    dead: once(() => dead(context, network, p)),
  }
}

/** Readings and observations by id, as exact as the model is: no instrument's error, no rounding. */
export type Found = Record<string, number | string>
