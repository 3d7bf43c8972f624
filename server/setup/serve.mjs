import { spawn } from 'node:child_process'
import { join } from 'node:path'
import { Fault } from './fault.mjs'
import { untilUp } from './health.mjs'
import { root } from './places.mjs'
import { step } from './progress.mjs'
import { beforeEnd, isStopping, stopAll } from './stop.mjs'

const tsx = (...args) => [join(root, 'node_modules/tsx/dist/cli.mjs'), ...args]
const once = ['--import', 'tsx', 'server/index.ts']
const watching = tsx('watch', '--clear-screen=false', '--include=rules/starter/**', 'server/index.ts')

/**
 * Starts the server process and waits until it answers. When it ends by itself, everything ends.
 * @param watch start it anew whenever its files change
 */
export async function startServer({ env, address, watch = false }) {
  const child = spawn(process.execPath, watch ? watching : once, {
    cwd: root,
    stdio: ['inherit', 'inherit', 'inherit', 'ipc'],
    env: { ...process.env, ...env },
  })
  const ended = new Promise((resolve) => child.once('exit', (code, signal) => resolve(signal ?? code)))
  let hasEnded = false
  let isServing = false
  void ended.then((how) => {
    hasEnded = true
    if (!isServing || isStopping()) return
    console.error(`The server ended (${how}).`)
    void stopAll(1)
  })
  beforeEnd(async () => {
    child.kill('SIGTERM')
    const impatient = setTimeout(() => child.kill('SIGKILL'), 10_000)
    await ended
    clearTimeout(impatient)
  })
  isServing = await step('Starting the server', () => untilUp(address, () => hasEnded || isStopping()))
  if (!isServing && !isStopping()) throw new Fault('The server did not start; its reason stands above.')
}

/**
 * Serves the pages with hot reload, and hands what is asked of /api to the server at `api`. The worker's address too:
 * one that a built Tracelamp left in the browser at this address would otherwise show its own pages for ever.
 */
export async function startPages({ host, port, api }) {
  const { createServer } = await import('vite')
  const pages = await createServer({
    root,
    server: { host, port, strictPort: true, proxy: { '/api': { target: api }, '/sw.js': { target: api } } },
  })
  await pages.listen()
  beforeEnd(() => pages.close())
}
