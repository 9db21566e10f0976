import { Router, type RequestHandler } from 'express'
import { newLinkSchema } from '#shared/api.ts'
import { signedIn } from '../auth/identify.ts'
import type { Context } from '../context.ts'
import { NotFoundError } from '../errors.ts'
import { listLinks } from '../repositories/links.ts'
import { requireDesigner, requireLinkReader } from '../services/access.ts'
import { makeLink, openLink, revokeLink } from '../services/links.ts'
import { seeSheet } from '../services/sheets.ts'
import { parseBody, parseId, parsePage } from './payload.ts'

export function linkRoutes(context: Context): Router {
  const { database } = context
  const router = Router()

  router.get('/sheets/:sheetId/links', (request, response) => {
    const person = signedIn(response)
    const { row, job } = seeSheet(database, person, parseId(request.params.sheetId, 'sheet'))
    requireLinkReader(job)
    response.json(listLinks(database, row.id, parsePage(request)))
  })

  router.post('/sheets/:sheetId/links', (request, response) => {
    const person = signedIn(response)
    const { row, job } = seeSheet(database, person, parseId(request.params.sheetId, 'sheet'))
    requireDesigner(job, 'make a link to a sheet')
    const { item, fresh } = makeLink(context, person, row.id, parseBody(newLinkSchema, request))
    response.status(fresh ? 201 : 200).json(item)
  })

  router.post('/links/:linkId/revoke', (request, response) => {
    const person = signedIn(response)
    response.json(revokeLink(context, person, parseId(request.params.linkId, 'link')))
  })

  return router
}

function parseToken(text: string | string[]): string {
  // 32 bytes in base64url.
  if (typeof text === 'string' && /^[A-Za-z0-9_-]{43}$/.test(text)) return text
  throw new NotFoundError('link')
}

/** For visitors: no account, the token is the key. */
export function visitorRoutes(context: Context, limit: RequestHandler): Router {
  const router = Router()

  router.get('/link/:token', limit, (request, response) => {
    response.json(openLink(context, parseToken(request.params.token)))
  })

  return router
}
