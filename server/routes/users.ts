import { Router } from 'express'
import { newUserSchema, userPatchSchema } from '#shared/api.ts'
import { administrator } from '../auth/identify.ts'
import type { Context } from '../context.ts'
import { listUsers } from '../repositories/users.ts'
import { changeUser, invite } from '../services/accounts.ts'
import { parseBody, parseId, parsePage } from './payload.ts'

export function userRoutes(context: Context): Router {
  const router = Router()

  router.get('/users', (request, response) => {
    administrator(response)
    response.json(listUsers(context.database, parsePage(request)))
  })

  router.post('/users', async (request, response) => {
    const person = administrator(response)
    const { item, fresh } = await invite(context, person, parseBody(newUserSchema, request))
    response.status(fresh ? 201 : 200).json(item)
  })

  router.patch('/users/:userId', async (request, response) => {
    administrator(response)
    const userId = parseId(request.params.userId, 'person')
    response.json(await changeUser(context, userId, parseBody(userPatchSchema, request)))
  })

  return router
}
