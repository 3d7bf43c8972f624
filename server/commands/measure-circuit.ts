import { performance } from 'node:perf_hooks'
import { complex, lusolve } from 'mathjs'
import { expect, forgetExpected } from '../../rules/circuit/expect.ts'
import { meterOf, reads } from '../../rules/circuit/instruments/meter.ts'
import type { Network } from '../../rules/circuit/network.ts'
import { nodalEquations } from '../../rules/circuit/nodal.ts'
import { factor } from '../../rules/circuit/solve.ts'
import { electricalCauses } from '../../rules/circuit/wiring/context.ts'
import type { WiringContext } from '../../rules/circuit/wiring/context.ts'
import { canOccur } from '../../rules/circuit/wiring/occurs.ts'
import { chanceFrom, sampleContext, sampleParameters } from '../../rules/circuit/wiring/sample.ts'
import { wire } from '../../rules/circuit/wiring/wire.ts'

/** Microseconds for one, at the median of many rounds over all of them. */
function each<T>(rounds: number, all: readonly T[], work: (one: T) => unknown): number {
  const times = Array.from({ length: rounds }, () => {
    const start = performance.now()
    for (const one of all) work(one)
    return ((performance.now() - start) / all.length) * 1000
  })
  return times.sort((a, b) => a - b)[Math.floor(rounds / 2)] ?? NaN
}

/** The network's equations as mathjs wants them: rows of its complex numbers. */
function mathjsMatrix(network: Network) {
  const { matrix, injected } = nodalEquations(network)
  const n = injected.length / 2
  const entry = (array: Float64Array, i: number) => complex(array[2 * i] ?? 0, array[2 * i + 1] ?? 0)
  return {
    rows: Array.from({ length: n }, (_, i) => Array.from({ length: n }, (_, j) => entry(matrix, i * n + j))),
    column: Array.from({ length: n }, (_, i) => [entry(injected, i)]),
  }
}

function wirings(): Network[] {
  return electricalCauses.flatMap((cause) =>
    Array.from({ length: 4 }, (_, k) => {
      const chance = chanceFrom(`measured ${cause} ${k}`)
      const context = sampleContext(chance, cause)
      return wire(context, cause, sampleParameters(chance, context, cause))
    }),
  )
}

const row = (what: string, figure: string, ratio: string) =>
  console.log(`${what.padEnd(58)}${figure.padStart(12)}   ${ratio}`)

/** The circuit model: one network solved, with mathjs on the same equations beside it, and a whole prediction. */
export function measureCircuit(): void {
  const networks = wirings()
  const nodes = networks.map((network) => nodalEquations(network).nodes.size - 1)
  const ours = each(200, networks, factor)
  const equations = networks.map(mathjsMatrix)
  // mathjs takes complex entries; its types know numbers alone.
  const theirs = each(5, equations, ({ rows, column }) => lusolve(rows as never, column as never))
  const factored = networks.map(factor)
  const meter = meterOf(10_000_000)
  const reading = each(200, factored, (one) => reads(one, 'receptacle.hot', 'receptacle.ground', meter))

  const context: WiringContext = { source: 'all-in-one-inverter', system: '120/240', wiring: 'panel' }
  const causes = electricalCauses.filter((cause) => canOccur(cause, context))
  const whole = each(60, [context], () => {
    forgetExpected()
    for (const cause of causes) expect(context, cause, meter.ohms)
  })

  const most = Math.max(...nodes)
  console.log(`\n${networks.length} wirings of ${Math.min(...nodes)} to ${most} nodes\n`)
  row('circuit model', 'median', 'against ours')
  row('one network solved, from its branches to every node', `${ours.toFixed(1)} µs`, '1.0')
  row('mathjs on the same equations', `${theirs.toFixed(0)} µs`, (theirs / ours).toFixed(0))
  row('another reading of a solved one', `${reading.toFixed(2)} µs`, (reading / ours).toFixed(2))
  row(
    `a whole prediction, ${causes.length} causes, every reading`,
    `${(whole / 1000).toFixed(1)} ms`,
    (whole / ours).toFixed(0),
  )
}
