/** How often a request may be tried, against guessing. Counts are kept in memory: a restart forgives. */
import type { Request, RequestHandler } from 'express'
import { ipKeyGenerator, rateLimit } from 'express-rate-limit'
import { RequestError } from './errors.ts'

const quarterHour = 15 * 60 * 1000

interface Limit {
  /** Tries in `window`; the next is refused. */
  tries: number
  /** ms */
  window: number
  toKey: (request: Request) => string
  /** Only failures count, so that an office behind one address may sign in. */
  failuresOnly: boolean
}

function createLimit({ tries, window, toKey, failuresOnly }: Limit): RequestHandler {
  return rateLimit({
    limit: tries,
    windowMs: window,
    keyGenerator: toKey,
    skipSuccessfulRequests: failuresOnly,
    standardHeaders: 'draft-8',
    legacyHeaders: false,
    // Whether X-Forwarded-For is believed is settled by configuration; a visitor who sends one is no fault of ours.
    validate: { xForwardedForHeader: false },
    handler(_request, response, next) {
      const seconds = Number(response.getHeader('Retry-After'))
      const wait = seconds > 90 ? `${Math.ceil(seconds / 60)} minutes` : 'a minute'
      next(new RequestError(429, 'too-many-tries', `Too many tries. Wait ${wait} and try again.`))
    },
  })
}

const fromAddress = (request: Request) => ipKeyGenerator(request.ip ?? '')

function toSignInKey(request: Request): string {
  const body: unknown = request.body
  const email = typeof body === 'object' && body !== null && 'email' in body ? body.email : ''
  return `${fromAddress(request)} ${String(email).trim().toLowerCase().slice(0, 200)}`
}

/** Per account and machine, and more of them per machine, where someone tries one password on many accounts. */
export function signInLimits(): RequestHandler[] {
  return [
    createLimit({ tries: 50, window: quarterHour, toKey: fromAddress, failuresOnly: true }),
    createLimit({ tries: 10, window: quarterHour, toKey: toSignInKey, failuresOnly: true }),
  ]
}

/** Someone at an unattended screen has as few tries at the present password. */
export function passwordLimits(): RequestHandler[] {
  return [createLimit({ tries: 10, window: quarterHour, toKey: fromAddress, failuresOnly: true })]
}

export function linkLimit(): RequestHandler {
  return createLimit({ tries: 120, window: 60_000, toKey: fromAddress, failuresOnly: false })
}
