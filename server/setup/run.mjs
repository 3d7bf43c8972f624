import { spawn } from 'node:child_process'
import { Fault } from './fault.mjs'
import { root } from './places.mjs'

const running = new Set()

/** Ends every command that `run` has not seen the end of. */
export function endCommands() {
  for (const child of running) child.kill('SIGTERM')
}

/**
 * Runs a command in the checkout to its end.
 * @param show pass its output on as it comes; else it is shown only when the command fails
 * @returns its exit code and what it wrote
 */
export function tryToRun(command, args, { show = false, env = process.env, cwd = root } = {}) {
  return new Promise((resolve, reject) => {
    const child = spawn(command, args, { cwd, env, stdio: show ? 'inherit' : ['ignore', 'pipe', 'pipe'] })
    running.add(child)
    let output = ''
    child.stdout?.on('data', (chunk) => (output += chunk))
    child.stderr?.on('data', (chunk) => (output += chunk))
    child.once('error', (error) => {
      running.delete(child)
      reject(error)
    })
    child.once('close', (code, signal) => {
      running.delete(child)
      resolve({ code: code ?? 1, signal, output })
    })
  })
}

/** Like `tryToRun`, and a failure stops the set-up with what the command wrote. */
export async function run(command, args, options) {
  const { code, output } = await tryToRun(command, args, options)
  if (code !== 0)
    throw new Fault(`${output.trimEnd()}\n${command} ${args.join(' ')} ended with ${code}.`.trimStart())
  return output
}
