import { complex, lusolve, matrix } from 'mathjs'
import type { Complex as MathComplex } from 'mathjs'
import { describe, expect, test } from 'vitest'
import { minus, plus } from '../../../rules/circuit/complex.ts'
import { earth, magnitude } from '../../../rules/circuit/network.ts'
import type { Branch, Complex, Network } from '../../../rules/circuit/network.ts'
import { leakSiemens, nodalEquations } from '../../../rules/circuit/nodal.ts'
import { factor } from '../../../rules/circuit/solve.ts'
import { at60, c, r, v } from './build.ts'
import { anyNetworks, someWirings } from './some-networks.ts'

const far = (a: Complex, b: Complex) => magnitude(minus(a, b))

/** Node volts by mathjs' own elimination, over the same matrix. */
function byMathjs(network: Network): Map<string, Complex> {
  const { nodes, matrix: y, injected } = nodalEquations(network)
  const n = nodes.size - 1
  const entry = (array: Float64Array, i: number) => complex(array[2 * i]!, array[2 * i + 1]!)
  const rows = Array.from({ length: n }, (_, i) => Array.from({ length: n }, (_, j) => entry(y, i * n + j)))
  const answer = lusolve(
    matrix(rows),
    matrix(Array.from({ length: n }, (_, i) => [entry(injected, i)])),
  ).toArray() as (MathComplex | number)[][]
  const volts = (i: number): Complex => {
    const value = answer[i]![0]!
    return typeof value === 'number' ? { re: value, im: 0 } : value
  }
  return new Map([...nodes].filter(([, i]) => i >= 0).map(([node, i]) => [node, volts(i)]))
}

describe('against mathjs, on the same matrices', () => {
  const networks = [...someWirings(3), ...anyNetworks(40)]
  test.each(networks.map((one) => [one.name, one.network] as const))('%s', (_, network) => {
    const ours = factor(network)
    for (const [node, theirs] of byMathjs(network))
      expect(far(ours.volts(node), theirs), node).toBeLessThan(Math.max(1e-3, 1e-3 * magnitude(theirs)))
  })
})

describe('what holds in every network', () => {
  const wirings = someWirings(4)

  test('currents into each node add up to nothing but its leak (Kirchhoff)', () => {
    for (const { name, network, loads } of wirings) {
      const net = factor(network)
      for (const node of new Set(network.branches.flatMap(({ from, to }) => [from, to]))) {
        if (node === earth) continue
        const out = network.branches.flatMap((b) =>
          b.from === node
            ? [net.amps(b.name)]
            : b.to === node
              ? [minus({ re: 0, im: 0 }, net.amps(b.name))]
              : [],
        )
        const sum = out.reduce(plus)
        const largest = Math.max(...out.map(magnitude))
        expect(magnitude(sum), `${name}, ${node}`).toBeLessThan(1e-7 + 1e-9 * largest)
      }
      expect(loads.length).toBeGreaterThan(0)
    }
  })

  test('a load held to a network is a branch of it: superposition changes nothing', () => {
    for (const { name, network, loads } of wirings) {
      const branches = loads.flatMap(({ from, to, ohms, farads }, i): Branch[] => [
        r(from, to, ohms, `load ${i}`),
        c(from, to, farads ?? 0, `load ${i} farads`),
      ])
      const built = factor({ ...network, branches: [...network.branches, ...branches] })
      const held = factor(network).loaded(loads)
      const oneByOne = loads.reduce((net, load) => net.loaded([load]), factor(network))
      for (const b of network.branches) {
        const volts = built.volts(b.from)
        expect(far(held.volts(b.from), volts), `${name}, ${b.from}`).toBeLessThan(1e-3)
        expect(far(oneByOne.volts(b.from), volts), `${name}, ${b.from}`).toBeLessThan(1e-3)
        expect(far(held.amps(b.name), built.amps(b.name)), `${name}, ${b.name}`).toBeLessThan(
          1e-6 + 1e-4 * magnitude(built.amps(b.name)),
        )
      }
      const port = (net: typeof held) => net.port('receptacle.hot', 'receptacle.ground').impedance
      expect(far(port(held), port(built))).toBeLessThan(1e-4 * magnitude(port(built)) + 1e-6)
    }
  })

  test('what a source at one side does at another, it does here from there (reciprocity)', () => {
    const [hg, ng] = [
      ['receptacle.ground', 'receptacle.hot'],
      ['receptacle.ground', 'receptacle.neutral'],
    ] as const
    for (const { name, network } of wirings) {
      const still = network.branches.map((b) => (b.kind === 'source' ? { ...b, volts: 0 } : b))
      const through = (at: readonly [string, string], look: readonly [string, string]) =>
        factor({ ...network, branches: [...still, v(...at, 1, 0, 1000), r(...look, 1000, 'look')] }).amps(
          'look',
        )
      const [there, back] = [through(hg, ng), through(ng, hg)]
      expect(far(there, back), name).toBeLessThan(1e-12 + 1e-6 * magnitude(there))
    }
  })
})

describe('what has no answer of its own gets a defined one', () => {
  test('a wire tied to nothing lies at 0 V, whatever holds it', () => {
    const net = factor(at60(v(earth, 'h', 120), r('h', 'n', 100), r('n', earth, 1), r('stub', 'end', 0.1)))
    expect(magnitude(net.volts('stub'))).toBe(0)
    expect(magnitude(net.volts('end'))).toBe(0)
    expect(magnitude(net.between('h', 'end'))).toBeCloseTo(magnitude(net.volts('h')), 6)
  })
  test('a source tied to nothing floats about earth by its leaks: half on either side', () => {
    const net = factor(at60(v('n', 'h', 120, 0, 0.05)))
    expect(magnitude(net.volts('h'))).toBeCloseTo(60, 0)
    expect(magnitude(net.between('h', 'n'))).toBeCloseTo(120, 6)
    // Not between its wires and earth: a meter there pulls it over, as it would on a bench.
    const held = net.loaded([{ from: 'n', to: earth, ohms: 1e7 }])
    expect(magnitude(held.volts('n'))).toBeLessThan(0.1)
  })
  test('a load of no resistance joins its ends; one of endless resistance is not there', () => {
    const net = factor(at60(v('n', 'h', 120, 0, 0.05), r('n', 'g', 1000), r('h', 'g', 1000)))
    expect(magnitude(net.loaded([{ from: 'n', to: 'g', ohms: 0 }]).between('n', 'g'))).toBeLessThan(1e-3)
    expect(magnitude(net.loaded([{ from: 'n', to: 'g', ohms: Infinity }]).between('n', 'g'))).toBeCloseTo(
      60,
      2,
    )
  })
  test('branches of no resistance, rings of them, and both ends on one node', () => {
    const ring = [r('a', 'b', 0), r('b', 'c', 0), r('c', 'a', 0), r('a', 'a', 5, 'self')]
    const net = factor(at60(v(earth, 'a', 120, 0, 0), ...ring, r('c', earth, 12, 'load')))
    expect(magnitude(net.amps('load'))).toBeCloseTo(10, 2)
    expect(magnitude(net.amps('self'))).toBe(0)
  })
  test('a winding and a capacitance in resonance stay finite', () => {
    const henries = 1
    const farads = 1 / ((2 * Math.PI * 60) ** 2 * henries)
    const winding: Branch = { kind: 'winding', name: 'choke', from: 'a', to: earth, ohms: 0, henries }
    const net = factor(at60(v(earth, 'h', 10), r('h', 'a', 1e6), c('a', earth, farads), winding))
    expect(magnitude(net.volts('a'))).toBeGreaterThan(9.9)
    expect(magnitude(net.volts('a'))).toBeLessThan(10.1)
  })
  test('no branches: earth alone, at 0 V', () => {
    expect(factor(at60()).volts(earth)).toEqual({ re: 0, im: 0 })
  })
  test('at 0 Hz sources give nothing and keep their ohms, capacitances are open, chokes are wire', () => {
    const choke: Branch = { kind: 'winding', name: 'choke', from: 'n', to: 'g', ohms: 2, henries: 5 }
    const net = factor({ hertz: 0, branches: [v('n', 'h', 120, 0, 0.5), choke, c('h', 'g', 1e-6)] })
    expect(magnitude(net.between('h', 'n'))).toBe(0)
    expect(net.port('h', 'g').impedance.re).toBeCloseTo(2.5, 6)
    expect(net.port('h', earth).impedance.re).toBeGreaterThan(1 / (4 * leakSiemens))
  })
})

describe('phase is kept', () => {
  test('the halves of a balanced output add up, two capacitors’ currents do not', () => {
    const halves = factor(at60(v('mid', 'h', 60), v('n', 'mid', 60), r('mid', earth, 1)))
    expect(magnitude(halves.between('h', 'n'))).toBeCloseTo(120, 3)
    const legs = factor(at60(v(earth, 'a', 120), v(earth, 'b', 120, 180), v(earth, 'c', 120, 120)))
    expect(magnitude(legs.between('a', 'b'))).toBeCloseTo(240, 3)
    expect(magnitude(legs.between('a', 'c'))).toBeCloseTo(120 * Math.sqrt(3), 3)
  })
  test('volts at right angles: 60 Ω of resistance before 80 Ω of capacitance take 72 and 96 of 120 V', () => {
    const net = factor(
      at60(v(earth, 'h', 120), r('h', 'm', 60, 'r'), c('m', earth, 1 / (2 * Math.PI * 60 * 80))),
    )
    expect(magnitude(net.between('h', 'm'))).toBeCloseTo(72, 2)
    expect(magnitude(net.volts('m'))).toBeCloseTo(96, 2)
    expect(magnitude(net.amps('r'))).toBeCloseTo(1.2, 4)
  })
  test('a branch’s current counts from its from to its to', () => {
    const net = factor(at60(v(earth, 'h', 120), r('h', earth, 120, 'down'), r(earth, 'h', 120, 'up')))
    expect(net.amps('down').re).toBeCloseTo(1, 4)
    expect(net.amps('up').re).toBeCloseTo(-1, 4)
    expect(net.amps('source h').re).toBeCloseTo(2, 4)
  })
})

describe('what can’t be is said', () => {
  const net = factor(at60(v(earth, 'h', 120)))
  test.each([
    ['a node', () => net.volts('hat'), 'no node "hat"'],
    ['a node of a port', () => net.port('h', 'hat'), 'no node "hat"'],
    ['a node of a load', () => net.loaded([{ from: 'hat', to: 'h', ohms: 1 }]), 'no node "hat"'],
    ['a branch', () => net.amps('wire'), 'no branch "wire"'],
    ['a load’s ohms', () => net.loaded([{ from: 'h', to: earth, ohms: -1 }]), '-1 Ω'],
    ['two of one name', () => factor(at60(r('a', 'b', 1), r('a', 'b', 2))), 'one name: a-b'],
    ['ohms below 0', () => factor(at60(r('a', 'b', -1))), '"a-b": ohms can\'t be -1'],
    ['ohms that are no number', () => factor(at60(r('a', 'b', NaN))), '"a-b": ohms can\'t be NaN'],
    ['endless farads', () => factor(at60(c('a', 'b', Infinity))), '"a-b": farads can\'t be Infinity'],
    ['volts that are no number', () => factor(at60(v('a', 'b', NaN))), "volts can't be NaN"],
    ['a phase that is no number', () => factor(at60(v('a', 'b', 1, NaN))), "degrees can't be NaN"],
  ])('%s', (_, ask, words) => {
    expect(ask).toThrow(words)
  })
})
