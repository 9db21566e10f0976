import { Router } from 'express'
import { jobPatchSchema, memberSchema, newJobSchema } from '#shared/api.ts'
import { administrator, signedIn } from '../auth/identify.ts'
import type { Context } from '../context.ts'
import { listJobs } from '../repositories/jobs.ts'
import { listMembers } from '../repositories/members.ts'
import { seeJob } from '../services/access.ts'
import { createJob, dismissMember, saveJob, setMember } from '../services/jobs.ts'
import { parseBody, parseId, parseIfMatch, parsePage } from './payload.ts'

export function jobRoutes(context: Context): Router {
  const { database } = context
  const router = Router()

  router.get('/jobs', (request, response) => {
    const person = signedIn(response)
    const seen = { userId: person.id, all: person.role === 'administrator' }
    response.json(listJobs(database, seen, parsePage(request)))
  })

  router.post('/jobs', (request, response) => {
    const person = signedIn(response)
    const { item, fresh } = createJob(context, person, parseBody(newJobSchema, request))
    response.status(fresh ? 201 : 200).json(item)
  })

  router.get('/jobs/:jobId', (request, response) => {
    const person = signedIn(response)
    response.json(seeJob(database, person, parseId(request.params.jobId, 'job')))
  })

  router.patch('/jobs/:jobId', (request, response) => {
    const person = signedIn(response)
    const job = seeJob(database, person, parseId(request.params.jobId, 'job'))
    const read = parseIfMatch(request)
    response.json(saveJob(context, person, job.id, read, parseBody(jobPatchSchema, request)))
  })

  router.get('/jobs/:jobId/members', (request, response) => {
    const person = signedIn(response)
    const job = seeJob(database, person, parseId(request.params.jobId, 'job'))
    response.json(listMembers(database, job.id, parsePage(request)))
  })

  router.put('/jobs/:jobId/members/:userId', (request, response) => {
    const person = administrator(response)
    const jobId = parseId(request.params.jobId, 'job')
    const userId = parseId(request.params.userId, 'person')
    response.json(setMember(context, person, jobId, userId, parseBody(memberSchema, request).role))
  })

  router.delete('/jobs/:jobId/members/:userId', (request, response) => {
    const person = administrator(response)
    const jobId = parseId(request.params.jobId, 'job')
    dismissMember(context, person, jobId, parseId(request.params.userId, 'member'))
    response.status(204).end()
  })

  return router
}
