import { Router } from 'express'
import { newSectionSchema, sectionWriteSchema } from '#shared/api.ts'
import { signedIn } from '../auth/identify.ts'
import type { Context } from '../context.ts'
import { listSections } from '../repositories/sections.ts'
import { requireDesigner, seeJob } from '../services/access.ts'
import { parseDocument } from '../services/documents.ts'
import { createSection, readSection, saveSection } from '../services/sections.ts'
import { parseBody, parseId, parseIfMatch, parsePage } from './payload.ts'

export function sectionRoutes(context: Context): Router {
  const { database } = context
  const router = Router()

  router.get('/jobs/:jobId/sections', (request, response) => {
    const person = signedIn(response)
    const job = seeJob(database, person, parseId(request.params.jobId, 'job'))
    response.json(listSections(database, job.id, parsePage(request)))
  })

  router.post('/jobs/:jobId/sections', (request, response) => {
    const person = signedIn(response)
    const job = seeJob(database, person, parseId(request.params.jobId, 'job'))
    requireDesigner(job, 'add a section')
    const { id, title, document } = parseBody(newSectionSchema, request)
    const asked = { id, title, document: parseDocument(document) }
    const { item, fresh } = createSection(context, person, job.id, asked)
    response.status(fresh ? 201 : 200).json(item)
  })

  router.get('/sections/:sectionId', (request, response) => {
    const person = signedIn(response)
    response.json(readSection(database, person, parseId(request.params.sectionId, 'section')))
  })

  router.put('/sections/:sectionId', (request, response) => {
    const person = signedIn(response)
    const { id, job } = readSection(database, person, parseId(request.params.sectionId, 'section'))
    requireDesigner(job, 'change its sections')
    const read = parseIfMatch(request)
    const { title, document } = parseBody(sectionWriteSchema, request)
    response.json(saveSection(context, person, id, read, { title, document: parseDocument(document) }))
  })

  return router
}
