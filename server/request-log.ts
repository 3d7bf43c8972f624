import type { IncomingMessage, ServerResponse } from 'node:http'
import { pinoHttp } from 'pino-http'
import type { Log } from './log.ts'

/** What a log line may hold of an address: what is searched for stands behind the question mark, and a link lets in. */
const pathOf = (request: { url?: string; originalUrl?: string }) =>
  (request.originalUrl ?? request.url ?? '')
    .replace(/[?#].*$/s, '')
    .replace(/(\/(?:links|shared|sheets(?=\/[\w-]{40}))\/)[^/]+/gi, '$1…')

/** One line a request: method, path, status, milliseconds. No header, cookie, query or body is ever written. */
export const requestLog = (log: Log) =>
  pinoHttp<IncomingMessage, ServerResponse>({
    logger: log,
    quietReqLogger: true,
    serializers: {
      req: (request: { method: string; raw: IncomingMessage }) => ({
        method: request.method,
        path: pathOf(request.raw),
      }),
      res: (response: { statusCode: number }) => ({ status: response.statusCode }),
    },
    customLogLevel: (request, response, error) => {
      if (error !== undefined || response.statusCode >= 500) return 'error'
      // Asked every few seconds by whoever watches over the server.
      return pathOf(request) === '/api/health' ? 'debug' : 'info'
    },
  })
