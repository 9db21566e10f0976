import { Router } from 'express'
import { newSheetSchema } from '#shared/api.ts'
import { signedIn } from '../auth/identify.ts'
import type { Context } from '../context.ts'
import { listSheets } from '../repositories/sheets.ts'
import { requireDesigner } from '../services/access.ts'
import { parseDocument } from '../services/documents.ts'
import { readSection } from '../services/sections.ts'
import { readSheet, saveSheet } from '../services/sheets.ts'
import { parseBody, parseId, parsePage } from './payload.ts'

export function sheetRoutes(context: Context): Router {
  const { database } = context
  const router = Router()

  router.get('/sections/:sectionId/sheets', (request, response) => {
    const person = signedIn(response)
    const section = readSection(database, person, parseId(request.params.sectionId, 'section'))
    response.json(listSheets(database, section.id, parsePage(request)))
  })

  router.post('/sections/:sectionId/sheets', async (request, response) => {
    const person = signedIn(response)
    const section = readSection(database, person, parseId(request.params.sectionId, 'section'))
    requireDesigner(section.job, 'save a calculation sheet')
    const { document, ...rest } = parseBody(newSheetSchema, request)
    const asked = { ...rest, document: parseDocument(document) }
    const { item, fresh } = await saveSheet(context, person, section.id, asked)
    response.status(fresh ? 201 : 200).json(item)
  })

  router.get('/sheets/:sheetId', (request, response) => {
    const person = signedIn(response)
    response.json(readSheet(database, person, parseId(request.params.sheetId, 'sheet')))
  })

  return router
}
