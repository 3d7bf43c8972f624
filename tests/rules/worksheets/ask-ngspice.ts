import { execFileSync } from 'node:child_process'
import { mkdtempSync, rmSync, writeFileSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join } from 'node:path'

/**
 * What ngspice (Debian's package of that name) makes of a resistive circuit at direct current, which at one frequency
 * is the same: node voltages and source currents by name, in lower case.
 */
export function askNgspice(elements: readonly string[]): Map<string, number> {
  const deck = `* worksheet\n${elements.join('\n')}\n.control\nset numdgt=12\nop\nprint all\nquit 0\n.endc\n.end\n`
  const folder = mkdtempSync(join(tmpdir(), 'ngspice-'))
  try {
    writeFileSync(join(folder, 'deck.cir'), deck)
    const said = execFileSync('ngspice', ['-b', 'deck.cir'], {
      cwd: folder,
      encoding: 'utf8',
      stdio: ['ignore', 'pipe', 'ignore'],
    })
    const found = [...said.matchAll(/^(\S+) = ([-+\d.e]+)\s*$/gm)]
    if (found.length === 0) throw new Error(`ngspice said nothing:\n${said}`)
    return new Map(found.map(([, name, value]) => [name!, Number(value)]))
  } finally {
    rmSync(folder, { recursive: true })
  }
}
