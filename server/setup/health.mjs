import { get } from 'node:http'
import { setTimeout as sleep } from 'node:timers/promises'

/** Whether the server answers at this address. */
const isUp = (address) =>
  new Promise((resolve) => {
    const request = get(`${address}/api/health`, { timeout: 2_000 }, (response) => {
      response.resume()
      resolve(response.statusCode === 200)
    })
    request.on('timeout', () => request.destroy())
    request.on('error', () => resolve(false))
  })

/** Waits until the server answers, or `given up` says it never will. */
export async function untilUp(address, givenUp) {
  while (!givenUp()) {
    if (await isUp(address)) return true
    await sleep(50)
  }
  return false
}
