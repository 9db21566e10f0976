import { Router, type RequestHandler } from 'express'
import { accountPatchSchema, passwordSchema, signInSchema } from '#shared/api.ts'
import { signedIn } from '../auth/identify.ts'
import type { Context } from '../context.ts'
import { changeAccount, changePassword, checkCredentials } from '../services/accounts.ts'
import { toUser } from '../repositories/users.ts'
import { parseBody } from './payload.ts'

export interface AccountLimits {
  signIn: RequestHandler[]
  password: RequestHandler[]
}

export function accountRoutes(context: Context, limits: AccountLimits): Router {
  const { sessions } = context
  const router = Router()

  router.post('/sign-in', ...limits.signIn, async (request, response) => {
    const user = await checkCredentials(context, parseBody(signInSchema, request))
    // Signing in again replaces the session that this browser had.
    await sessions.close(request.headers.cookie)
    response.setHeader('Set-Cookie', await sessions.open(user.id))
    response.json(user)
  })

  router.post('/sign-out', async (request, response) => {
    response.setHeader('Set-Cookie', await sessions.close(request.headers.cookie))
    response.status(204).end()
  })

  router.get('/session', (_request, response) => {
    response.json(toUser(signedIn(response)))
  })

  router.patch('/account', (request, response) => {
    const person = signedIn(response)
    response.json(changeAccount(context, person, parseBody(accountPatchSchema, request)))
  })

  router.post('/account/password', ...limits.password, async (request, response) => {
    const person = signedIn(response)
    await changePassword(context, person, parseBody(passwordSchema, request))
    response.setHeader('Set-Cookie', await sessions.open(person.id))
    response.status(204).end()
  })

  return router
}
