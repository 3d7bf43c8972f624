import { pino } from 'pino'
import type { DestinationStream, Logger } from 'pino'
import type { Config } from './config.ts'

export type Log = Logger

/** The server's log: one JSON object a line, on standard output unless `to` says otherwise. */
export function openLog(level: Config['logLevel'], to?: DestinationStream): Log {
  const options = {
    level,
    base: undefined,
    formatters: { level: (label: string) => ({ level: label }) },
    timestamp: () => `,"time":"${new Date().toISOString()}"`,
  }
  return to === undefined ? pino(options) : pino(options, to)
}
