import type { Job, JobPatch, JobRole, Member, NewJob } from '#shared/api.ts'
import type { SignedIn } from '../auth/sessions.ts'
import type { Context } from '../context.ts'
import { inTransaction } from '../db/client.ts'
import { ConflictError, InvalidError, NotFoundError } from '../errors.ts'
import { findJobOrigin, insertJob, updateJob } from '../repositories/jobs.ts'
import { putMember, removeMember } from '../repositories/members.ts'
import { findUser } from '../repositories/users.ts'
import { requireDesignerOrAdministrator, seeJob } from './access.ts'
import { isRetry, type Created } from './creation.ts'
import { toFingerprint } from './fingerprint.ts'

type Uses = Pick<Context, 'database' | 'now'>

/** Whoever makes a job becomes its designer. */
export function createJob({ database, now }: Uses, person: SignedIn, asked: NewJob): Created<Job> {
  const { id, title, number } = asked
  const origin = { createdBy: person.id, createdFrom: toFingerprint({ title, number }) }
  return inTransaction(database, (tx) => {
    if (isRetry(findJobOrigin(tx, id), origin, 'job')) {
      return { item: seeJob(tx, person, id), fresh: false }
    }
    const at = now()
    insertJob(tx, { id, title, number, ...origin, revision: 1, createdAt: at, changedAt: at })
    putMember(tx, id, person.id, 'designer')
    return { item: seeJob(tx, person, id), fresh: true }
  })
}

export function saveJob(
  { database, now }: Uses,
  person: SignedIn,
  jobId: string,
  read: number,
  { title, number }: JobPatch,
): Job {
  return inTransaction(database, (tx) => {
    const job = seeJob(tx, person, jobId)
    requireDesignerOrAdministrator(job, person, 'change its title and number')
    if (job.title === title && job.number === number) return job
    if (job.revision !== read) throw new ConflictError('job', read, job.revision, job)
    updateJob(tx, jobId, { title, number, revision: job.revision + 1, changedAt: now() })
    return seeJob(tx, person, jobId)
  })
}

export function setMember(
  { database }: Uses,
  administrator: SignedIn,
  jobId: string,
  userId: string,
  role: JobRole,
): Member {
  return inTransaction(database, (tx) => {
    seeJob(tx, administrator, jobId)
    const user = findUser(tx, userId)
    if (user === undefined) throw new NotFoundError('person')
    if (!user.active) {
      throw new InvalidError('The account is closed.', [
        {
          path: 'userId',
          code: 'inactive',
          message: `The account of ${user.name} is closed; open it first.`,
        },
      ])
    }
    putMember(tx, jobId, userId, role)
    return { userId, name: user.name, initials: user.initials, email: user.email, role }
  })
}

export function dismissMember(
  { database }: Uses,
  administrator: SignedIn,
  jobId: string,
  userId: string,
): void {
  inTransaction(database, (tx) => {
    seeJob(tx, administrator, jobId)
    if (!removeMember(tx, jobId, userId)) throw new NotFoundError('member')
  })
}
