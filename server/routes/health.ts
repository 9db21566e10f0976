import { Router } from 'express'
import type { Health } from '#shared/api.ts'
import type { Context } from '../context.ts'
import { readPulse } from '../repositories/pulse.ts'
import { version } from '../version.ts'

export function healthRoutes({ database, log }: Context): Router {
  const router = Router()

  router.get('/health', (_request, response) => {
    try {
      readPulse(database)
    } catch (cause) {
      log.error({ err: cause }, 'the database does not answer')
      response.status(503).json({ status: 'failed', version, database: 'failed' })
      return
    }
    response.json({ status: 'ok', version, database: 'ok' } satisfies Health)
  })

  return router
}
