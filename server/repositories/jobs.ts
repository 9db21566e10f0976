import { and, desc, eq, isNotNull, sql } from 'drizzle-orm'
import type { Job, JobRole, Page } from '#shared/api.ts'
import type { Reader, Transaction } from '../db/client.ts'
import { jobs, type JobRow } from '../db/schema/jobs.ts'
import { members } from '../db/schema/members.ts'
import { beyond, toPage, type PageRequest } from './page.ts'

/** A job as one person sees it. */
interface SeenJobRow {
  job: JobRow
  role: JobRole | null
  sectionCount: number
}

const sectionCount = sql<number>`(select count(*) from sections where sections.job_id = jobs.id)`

function toJob({ job, role, sectionCount }: SeenJobRow): Job {
  const { id, title, number, revision, createdAt, changedAt } = job
  return { id, title, number, revision, createdAt, changedAt, role, sectionCount }
}

/** The job with the person's role in it; null role for who is no member. */
export function findJob(reader: Reader, jobId: string, userId: string): Job | undefined {
  const row = reader
    .select({ job: jobs, role: members.role, sectionCount })
    .from(jobs)
    .leftJoin(members, and(eq(members.jobId, jobs.id), eq(members.userId, userId)))
    .where(eq(jobs.id, jobId))
    .get()
  return row && toJob(row)
}

/** Latest changed first: those in which the person is a member, or all of them. */
export function listJobs(
  reader: Reader,
  { userId, all }: { userId: string; all: boolean },
  page: PageRequest,
): Page<Job> {
  const rows = reader
    .select({ job: jobs, role: members.role, sectionCount })
    .from(jobs)
    .leftJoin(members, and(eq(members.jobId, jobs.id), eq(members.userId, userId)))
    .where(
      and(
        all ? undefined : isNotNull(members.role),
        beyond({ key: jobs.changedAt, id: jobs.id, direction: 'descending' }, page.after),
      ),
    )
    .orderBy(desc(jobs.changedAt), desc(jobs.id))
    .limit(page.limit + 1)
    .all()
  return toPage(rows, page, toJob, ({ job }) => [job.changedAt, job.id])
}

/** Who made it, and from which request. */
export function findJobOrigin(reader: Reader, jobId: string) {
  const { createdBy, createdFrom } = jobs
  return reader.select({ createdBy, createdFrom }).from(jobs).where(eq(jobs.id, jobId)).get()
}

export function insertJob(tx: Transaction, row: JobRow): void {
  tx.insert(jobs).values(row).run()
}

export function updateJob(
  tx: Transaction,
  jobId: string,
  change: Pick<JobRow, 'title' | 'number' | 'revision' | 'changedAt'>,
): void {
  tx.update(jobs).set(change).where(eq(jobs.id, jobId)).run()
}

/** Something in the job changed: it moves up in the lists. */
export function touchJob(tx: Transaction, jobId: string, changedAt: number): void {
  tx.update(jobs).set({ changedAt }).where(eq(jobs.id, jobId)).run()
}
