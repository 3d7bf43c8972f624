import { execFileSync } from 'node:child_process'
import { mkdtempSync, rmSync, writeFileSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { leakSiemens } from '../../../rules/circuit/nodal.ts'
import { earth } from '../../../rules/circuit/network.ts'
import type { Branch, Complex, Network, Node } from '../../../rules/circuit/network.ts'
import type { Load } from '../../../rules/circuit/solve.ts'

/** What ngspice makes of a network: volts of every node, amps of every branch from its `from` to its `to`. */
export type SpiceAnswer = { volts: Map<Node, Complex>; amps: Map<string, Complex> }

/** A network as ngspice gets it: loads are plain branches there, and one ampere may be driven through a port. */
export type SpiceCase = { network: Network; loads?: readonly Load[]; drive?: { from: Node; to: Node } }

/** The elements of one branch between two numbered nodes; an ammeter of 0 V is put in ahead of it. */
function elements(branch: Branch, k: number, from: string, to: string): string[] {
  const inside = `x${k}`
  const ammeter = `Vm${k} ${from} ${inside} DC 0 AC 0`
  if (branch.kind === 'resistance') return [ammeter, `R${k} ${inside} ${to} ${branch.ohms}`]
  if (branch.kind === 'capacitance') return [ammeter, `C${k} ${inside} ${to} ${branch.farads}`]
  if (branch.kind === 'winding')
    return [ammeter, `R${k} ${inside} y${k} ${branch.ohms}`, `L${k} y${k} ${to} ${branch.henries}`]
  return [
    ammeter,
    `V${k} y${k} ${inside} DC 0 AC ${branch.volts} ${branch.degrees}`,
    `R${k} y${k} ${to} ${branch.ohms}`,
  ]
}

function netlist({ network, loads = [], drive }: SpiceCase) {
  const numbers = new Map<Node, number>([[earth, 0]])
  const number = (node: Node): string => {
    if (!numbers.has(node)) numbers.set(node, numbers.size)
    return node === earth ? '0' : `n${numbers.get(node)}`
  }
  const lines = network.branches.flatMap((b, k) => elements(b, k, number(b.from), number(b.to)))
  loads.forEach(({ from, to, ohms, farads }, k) => {
    if (Number.isFinite(ohms)) lines.push(`Rload${k} ${number(from)} ${number(to)} ${ohms}`)
    if (farads !== undefined && farads > 0) lines.push(`Cload${k} ${number(from)} ${number(to)} ${farads}`)
  })
  if (drive) lines.push(`Idrive ${number(drive.to)} ${number(drive.from)} DC 1 AC 1`)
  for (const node of numbers.keys())
    if (node !== earth) lines.push(`Rleak${number(node)} ${number(node)} 0 ${1 / leakSiemens}`)
  return { text: `* a wiring\n${lines.join('\n')}\n.end\n`, number, nodes: [...numbers.keys()] }
}

function readAnswer(text: string, { network }: SpiceCase, list: ReturnType<typeof netlist>): SpiceAnswer {
  const values = new Map<string, Complex>()
  for (const [, name, re, im] of text.matchAll(/^(\S+) = ([-+\d.e]+)(?:,([-+\d.e]+))?\s*$/gm))
    values.set(String(name), { re: Number(re), im: Number(im ?? 0) })
  const value = (name: string): Complex => {
    const one = values.get(name)
    if (!one) throw new Error(`ngspice said nothing of ${name}:\n${text.slice(0, 2000)}`)
    return one
  }
  const zero = { re: 0, im: 0 }
  return {
    volts: new Map(list.nodes.map((node) => [node, node === earth ? zero : value(list.number(node))])),
    amps: new Map(network.branches.map(({ name }, k) => [name, value(`vm${k}#branch`)])),
  }
}

/** Solves many networks in one run of ngspice (Debian's package of that name). */
export function askSpice(cases: readonly SpiceCase[]): SpiceAnswer[] {
  const folder = mkdtempSync(join(tmpdir(), 'spice-'))
  try {
    const lists = cases.map(netlist)
    lists.forEach(({ text }, i) => writeFileSync(join(folder, `${i}.cir`), text))
    const steps = cases.map(({ network: { hertz } }, i) =>
      [
        `source ${i}.cir`,
        hertz === 0 ? 'op' : `ac lin 1 ${hertz} ${hertz}`,
        `echo @@${i}@@`,
        'print all',
        'destroy all',
        'remcirc',
      ].join('\n'),
    )
    const control = `* all of them\n.control\nset numdgt=14\n${steps.join('\n')}\nquit 0\n.endc\n.end\n`
    writeFileSync(join(folder, 'all.cir'), control)
    const said = execFileSync('ngspice', ['-b', 'all.cir'], {
      cwd: folder,
      encoding: 'utf8',
      maxBuffer: 1e9,
      stdio: ['ignore', 'pipe', 'pipe'],
    })
    const parts = said.split(/^@@(\d+)@@\s*$/m)
    return cases.map((one, i) => {
      const list = lists[i]
      const text = parts[2 * i + 2]
      if (!list || parts[2 * i + 1] !== String(i) || text === undefined)
        throw new Error(`ngspice did not solve network ${i}:\n${said.slice(-2000)}`)
      return readAnswer(text, one, list)
    })
  } finally {
    rmSync(folder, { recursive: true })
  }
}
