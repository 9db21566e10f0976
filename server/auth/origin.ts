import type { RequestHandler } from 'express'
import { RequestError } from '../errors.ts'

const safeMethods = new Set(['GET', 'HEAD', 'OPTIONS'])

/**
 * Refuses a request that changes something unless it comes from our own page: its Origin must be the public
 * address, or, where none is configured, the host it was sent to. A missing Origin is refused too.
 */
export function checkOrigin(publicUrl: URL | null): RequestHandler {
  return (request, _response, next) => {
    if (safeMethods.has(request.method)) return next()
    const { origin, host } = request.headers
    if (origin !== undefined && isOwnOrigin(origin, publicUrl, host)) return next()
    throw new RequestError(
      403,
      'foreign-origin',
      origin === undefined
        ? 'The request does not say which page it comes from (Origin), so it was refused.'
        : `The request comes from another page (${origin.slice(0, 200)}), so it was refused.`,
    )
  }
}

function isOwnOrigin(origin: string, publicUrl: URL | null, host: string | undefined): boolean {
  if (publicUrl !== null) return origin === publicUrl.origin
  return URL.canParse(origin) && new URL(origin).host === host
}
