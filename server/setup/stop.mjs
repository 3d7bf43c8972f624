import { endCommands } from './run.mjs'

const endings = []
let stopping

/** What has to be done before this process ends; done in reverse order, each once. */
export const beforeEnd = (ending) => endings.push(ending)

export const isStopping = () => stopping !== undefined

/** Stops everything that was started here and ends with `code`. Called again, it waits for the same end. */
export function stopAll(code) {
  stopping ??= (async () => {
    endCommands()
    for (const ending of endings.reverse()) {
      try {
        await ending()
      } catch (error) {
        console.error(error)
      }
    }
    process.exit(code)
  })()
  return stopping
}

/** Ctrl-C, TERM and a closed terminal stop everything; asked for, that is no failure. */
export function stopOnSignals(code = 0) {
  for (const signal of ['SIGINT', 'SIGTERM', 'SIGHUP']) process.on(signal, () => void stopAll(code))
}
