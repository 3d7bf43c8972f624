import { createServer } from 'node:net'

/** Tries to listen. Returns the port, or the error's code. */
function tryPort(host, port) {
  return new Promise((resolve) => {
    const probe = createServer()
    probe.once('error', (error) => resolve(error.code))
    probe.listen({ host, port, exclusive: true }, () => {
      const found = probe.address().port
      probe.close(() => resolve(found))
    })
  })
}

/** A port on loopback that nobody uses; `wanted` if that is one. */
export async function freePort(wanted) {
  if (wanted !== undefined && (await tryPort('127.0.0.1', wanted)) === wanted) return wanted
  return tryPort('127.0.0.1', 0)
}

/** Why a port can't be served on: an error code. Undefined when it can. */
export async function faultOfPort(host, port) {
  const result = await tryPort(host, port)
  return typeof result === 'string' ? result : undefined
}
