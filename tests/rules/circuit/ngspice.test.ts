import { describe, expect, test } from 'vitest'
import { overLimitOhms } from '../../../rules/findings/sheet.ts'
import { minus } from '../../../rules/circuit/complex.ts'
import { magnitude } from '../../../rules/circuit/network.ts'
import type { Complex } from '../../../rules/circuit/network.ts'
import { factor } from '../../../rules/circuit/solve.ts'
import type { Factored } from '../../../rules/circuit/solve.ts'
import { anyNetworks, someWirings } from './some-networks.ts'
import { askSpice } from './spice.ts'
import type { SpiceAnswer } from './spice.ts'

/**
 * The circuit model against ngspice, which shares no line with it: sources stand there as they are, where ours turns
 * them into currents, and meters and loads are parts of the network, where ours adds them by superposition.
 */
const part = 1e-3
const [leastVolts, leastAmps] = [1e-3, 1e-6]

/** Every value of ours that is further from ngspice's than allowed, phase included. */
function differences(name: string, ours: Factored, theirs: SpiceAnswer): string[] {
  const wrong = (what: string, a: Complex, b: Complex, least: number) =>
    magnitude(minus(a, b)) <= Math.max(part * magnitude(b), least)
      ? []
      : [`${name}, ${what}: ${JSON.stringify(a)} against ${JSON.stringify(b)}`]
  return [
    ...[...theirs.volts].flatMap(([node, volts]) => wrong(node, ours.volts(node), volts, leastVolts)),
    ...[...theirs.amps].flatMap(([branch, amps]) => wrong(branch, ours.amps(branch), amps, leastAmps)),
  ]
}

describe('against ngspice', () => {
  const wirings = someWirings(12)

  test('264 wirings of every cause, as they run', () => {
    const answers = askSpice(wirings.map(({ network }) => ({ network })))
    expect(answers).toHaveLength(264)
    const wrong = wirings.flatMap(({ name, network }, i) => differences(name, factor(network), answers[i]!))
    expect(wrong).toEqual([])
  })

  test('the same with a meter held to them, and with a load beside it', () => {
    const answers = askSpice(wirings)
    const wrong = wirings.flatMap(({ name, network, loads }, i) =>
      differences(name, factor(network).loaded(loads), answers[i]!),
    )
    expect(wrong).toEqual([])
  })

  test('the same dead, as an ohmmeter between neutral and ground meets them', () => {
    const drive = { from: 'receptacle.neutral', to: 'receptacle.ground' }
    const answers = askSpice(wirings.map(({ dead }) => ({ network: dead, drive })))
    wirings.forEach(({ name, dead }, i) => {
      const { volts } = answers[i]!
      const theirs = volts.get(drive.from)!.re - volts.get(drive.to)!.re
      const ours = factor(dead).port(drive.from, drive.to).impedance.re
      // Where only the leak joins them an ohmmeter shows over limit, and ngspice has a leak of its own.
      if (theirs > overLimitOhms) expect(ours, name).toBeGreaterThan(overLimitOhms)
      else
        expect(Math.abs(ours - theirs), `${name}: ${ours} Ω against ${theirs} Ω`).toBeLessThan(theirs * part)
    })
  })

  test('100 networks that are no wiring', () => {
    const networks = anyNetworks(100)
    const answers = askSpice(networks)
    const wrong = networks.flatMap(({ name, network }, i) => differences(name, factor(network), answers[i]!))
    expect(wrong).toEqual([])
  })
})
