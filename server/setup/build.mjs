/** `npm run build`: the pages, their worker, and what stays of the builds before. */
import { needClient } from './client.mjs'
import { sayWhy } from './fault.mjs'
import { stopAll, stopOnSignals } from './stop.mjs'

stopOnSignals()
try {
  await needClient()
} catch (error) {
  sayWhy(error)
  await stopAll(1)
}
