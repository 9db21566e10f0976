import { randomUUID } from 'node:crypto'
import type { IncomingMessage, ServerResponse } from 'node:http'
import { pino, type Logger } from 'pino'
import { pinoHttp } from 'pino-http'
import type { Config } from './config.ts'

export type { Logger }

export function createLog(
  level: Config['logLevel'],
  destination?: { write: (line: string) => void },
): Logger {
  const options = { level, redact: ['*.headers.cookie', '*.headers["set-cookie"]', '*.password', '*.token'] }
  return destination ? pino(options, destination) : pino(options)
}

/** One line a request, with an id that the answer carries too. Headers are left out: they hold the cookie. */
export function logRequests(log: Logger) {
  return pinoHttp({
    logger: log,
    genReqId(_request: IncomingMessage, response: ServerResponse) {
      const id = randomUUID()
      response.setHeader('X-Request-Id', id)
      return id
    },
    customLogLevel: (_request, response, error) =>
      error !== undefined || response.statusCode >= 500 ? 'error' : 'info',
    serializers: {
      req: ({ id, method, url }: { id: string; method: string; url: string }) => ({
        id,
        method,
        url: withoutToken(url),
      }),
      res: ({ statusCode }: { statusCode: number }) => ({ statusCode }),
    },
  })
}

/** The token in a link's address opens the sheet, so it stays out of the log. */
export function withoutToken(url: string): string {
  return url.replace(/(\/link\/)[^/?#]+/gi, '$1[token]')
}
