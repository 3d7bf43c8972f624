import * as z from 'zod/mini'
import { mend, oneOf, quantity } from '../quantity.ts'
import { Build, MetalOf, noSuchWire, wireOhms } from '../wire.ts'
import type { Units, Wire } from '../wire.ts'
import type { FaultPath } from './clearing.ts'

const size = z.string({ error: 'Choose a size.' })

/** From the source to the panel; length 0 where the load is plugged into the source. */
export const Feeder = z.object({
  length: quantity('the length one way', 0, 5000),
  size,
  neutralSize: size,
  groundSize: size,
  metal: MetalOf,
  build: Build,
})
/** From the panel to the place of the fault. */
export const Branch = z.object({
  length: quantity('the length one way', 0, 5000),
  size,
  groundSize: size,
  metal: MetalOf,
  build: Build,
})
/**
 * Where neutral meets ground: in the panel, in the source with a grounding conductor between, in the source with
 * nothing but two ground rods between, or nowhere.
 */
export const Bond = oneOf(['panel', 'source', 'rods', 'none'])
export type Bond = z.infer<typeof Bond>

export const Rods = z.object({
  panelOhms: quantity('ohms of the rod at the panel', 0.1, 100_000),
  sourceOhms: quantity('ohms of the rod at the source', 0.1, 100_000),
})

export type Wiring = {
  units: Units
  feeder: z.infer<typeof Feeder>
  branch: z.infer<typeof Branch>
  bond: Bond
  celsius: number
  contactOhms: number
  rods: z.infer<typeof Rods>
}

type Payload = { value: Wiring; issues: unknown[] }

/** Says at the field which conductor the tables do not have. */
export function checkSizes(payload: Payload): void {
  const { units, feeder, branch } = payload.value
  const look = (
    at: 'feeder' | 'branch',
    name: string,
    given: string,
    wire: Pick<Wire, 'metal' | 'build'>,
  ) => {
    const wrong = noSuchWire({ units, size: given, metal: wire.metal, build: wire.build })
    if (wrong !== undefined) mend(payload, [at, name], wrong)
  }
  if (feeder.length > 0) {
    look('feeder', 'size', feeder.size, feeder)
    look('feeder', 'neutralSize', feeder.neutralSize, feeder)
    look('feeder', 'groundSize', feeder.groundSize, feeder)
  }
  look('branch', 'size', branch.size, branch)
  look('branch', 'groundSize', branch.groundSize, branch)
}

/** Ohms of each conductor, one way. */
export type LoopOhms = {
  feederHot: number
  feederNeutral: number
  feederGround: number
  branchHot: number
  branchGround: number
}

/**
 * Ohms of the conductors that a fault can take.
 * @throws RangeError for a size that `checkSizes` would have refused
 */
export function loopOhms({ units, feeder, branch, celsius }: Wiring): LoopOhms {
  const ohms = (of: { length: number; metal: Wire['metal']; build: Wire['build'] }, given: string) => {
    if (of.length === 0) return 0
    const found = wireOhms({
      units,
      size: given,
      metal: of.metal,
      build: of.build,
      length: of.length,
      celsius,
    })
    if (found === undefined) throw new RangeError(`no ohms for ${given}`)
    return found
  }
  return {
    feederHot: ohms(feeder, feeder.size),
    feederNeutral: ohms(feeder, feeder.neutralSize),
    feederGround: ohms(feeder, feeder.groundSize),
    branchHot: ohms(branch, branch.size),
    branchGround: ohms(branch, branch.groundSize),
  }
}

/** The way of the fault, by where the bond is; undefined without one. */
export function faultPath(
  wiring: Pick<Wiring, 'bond' | 'contactOhms' | 'rods'>,
  ohms: LoopOhms,
): FaultPath | undefined {
  const outOhms = ohms.feederHot + ohms.branchHot + wiring.contactOhms
  const { panelOhms, sourceOhms } = wiring.rods
  switch (wiring.bond) {
    case 'panel':
      return { outOhms, backOhms: ohms.branchGround + ohms.feederNeutral, touchOhms: ohms.branchGround }
    case 'source': {
      const back = ohms.branchGround + ohms.feederGround
      return { outOhms, backOhms: back, touchOhms: back }
    }
    case 'rods':
      return {
        outOhms,
        backOhms: ohms.branchGround + panelOhms + sourceOhms,
        touchOhms: ohms.branchGround + panelOhms,
      }
    case 'none':
      return undefined
  }
}
