import type { RequestHandler, Response } from 'express'
import { ForbiddenError, NotSignedInError } from '../errors.ts'
import type { Sessions, SignedIn } from './sessions.ts'

/** Finds out who is asking and remembers it for the routes; who is nobody goes on as nobody. */
export function identify(sessions: Sessions): RequestHandler {
  return async (request, response, next) => {
    const open = await sessions.find(request.headers.cookie)
    if (open?.renewedCookie) response.append('Set-Cookie', open.renewedCookie)
    response.locals.signedIn = open?.user
    next()
  }
}

/** Who is asking; throws for nobody. Services take what this returns, so a route cannot forget to ask. */
export function signedIn(response: Response): SignedIn {
  // Express types what it carries along as `any`; `identify` above is the only writer of this.
  const user = response.locals.signedIn as SignedIn | undefined
  if (user === undefined) throw new NotSignedInError()
  return user
}

/** Who is asking, when that is an administrator of the office; throws otherwise. */
export function administrator(response: Response): SignedIn {
  const user = signedIn(response)
  if (user.role !== 'administrator') {
    throw new ForbiddenError('Only an administrator of the office may do this.')
  }
  return user
}
