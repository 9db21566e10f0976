/** Who may do what in a job. A job that a person may not see does not exist for that person. */
import type { Job } from '#shared/api.ts'
import type { SignedIn } from '../auth/sessions.ts'
import type { Reader } from '../db/client.ts'
import { ForbiddenError, NotFoundError } from '../errors.ts'
import { findJob } from '../repositories/jobs.ts'

/** Members see their jobs, administrators every job. `what` names the thing asked for: the job or a part of it. */
export function seeJob(reader: Reader, person: SignedIn, jobId: string, what = 'job'): Job {
  const job = findJob(reader, jobId, person.id)
  if (job === undefined || (job.role === null && person.role !== 'administrator')) {
    throw new NotFoundError(what)
  }
  return job
}

/** Edits sections, saves sheets, makes links. An administrator does so only as a designer of the job. */
export function requireDesigner(job: Job, deed: string): void {
  if (job.role !== 'designer') throw new ForbiddenError(`Only a designer of this job may ${deed}.`)
}

/** Names the job, revokes links: its designers, and administrators. */
export function requireDesignerOrAdministrator(job: Job, person: SignedIn, deed: string): void {
  if (job.role === 'designer' || person.role === 'administrator') return
  throw new ForbiddenError(`Only a designer of this job or an administrator may ${deed}.`)
}

/** Sees to whom a sheet was opened: everyone but viewers. */
export function requireLinkReader(job: Job): void {
  if (job.role === 'viewer')
    throw new ForbiddenError('A viewer of this job does not see the links of a sheet.')
}
