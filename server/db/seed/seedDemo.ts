import { randomUUID } from 'node:crypto'
import { demoJobs } from '#shared/catalogue/demo.ts'
import { readDocument } from '#shared/document/readDocument.ts'
import { hashPassword } from '../../auth/passwords.ts'
import { inTransaction, type Database, type Transaction } from '../client.ts'
import { jobs } from '../schema/jobs.ts'
import { members } from '../schema/members.ts'
import { sections } from '../schema/sections.ts'
import { users } from '../schema/users.ts'
import { demoAccounts, demoPassword } from './demoAccounts.ts'

/** In the place of a request's fingerprint: what the seed made, no request can have asked for. */
const createdFrom = 'demo'

type DemoPerson = (typeof demoAccounts)[number] & { id: string }

/** Fills a new database with invented people and jobs. `at` in UTC ms. */
export async function seedDemo(database: Database, at: number): Promise<void> {
  const passwordHash = await hashPassword(demoPassword)
  inTransaction(database, (tx) => {
    const people = demoAccounts.map((account) => ({ ...account, id: randomUUID() }))
    for (const { id, name, initials, email, role } of people) {
      tx.insert(users)
        .values({
          id,
          name,
          initials,
          email,
          role,
          passwordHash,
          active: true,
          demo: true,
          createdFrom: null,
          createdAt: at,
        })
        .run()
    }
    // The first stands on top of the list, which shows the latest change first.
    demoJobs.forEach((job, place) => seedJob(tx, job, people, at + demoJobs.length - place))
  })
}

function seedJob(tx: Transaction, job: (typeof demoJobs)[number], people: DemoPerson[], at: number): void {
  const maker = people.find(({ jobRole }) => jobRole === 'designer')
  if (maker === undefined) throw new Error('the demo has no designer')
  const jobId = randomUUID()
  tx.insert(jobs)
    .values({
      id: jobId,
      title: job.title,
      number: job.number,
      revision: 1,
      createdBy: maker.id,
      createdFrom,
      createdAt: at,
      changedAt: at,
    })
    .run()
  for (const { id, jobRole } of people) {
    if (jobRole !== null) tx.insert(members).values({ jobId, userId: id, role: jobRole }).run()
  }
  job.sections.forEach(({ title, document }, place) => {
    const read = readDocument(document)
    if (read.status === 'bad') {
      throw new Error(
        `demo section "${title}": ${read.issues.map(({ path, message }) => `${path}: ${message}`).join('; ')}`,
      )
    }
    tx.insert(sections)
      .values({
        id: randomUUID(),
        jobId,
        title,
        document: read.document,
        revision: 1,
        createdBy: maker.id,
        createdFrom,
        // Sections are listed in the order in which they were made.
        createdAt: at + place,
        changedBy: maker.id,
        changedAt: at + place,
      })
      .run()
  })
}
