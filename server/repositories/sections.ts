import { and, asc, eq, sql } from 'drizzle-orm'
import type { Page, SectionSummary, StoredSection } from '#shared/api.ts'
import type { Reader, Transaction } from '../db/client.ts'
import { sections, type SectionRow } from '../db/schema/sections.ts'
import { users } from '../db/schema/users.ts'
import { beyond, toPage, type PageRequest } from './page.ts'

const summary = {
  id: sections.id,
  jobId: sections.jobId,
  title: sections.title,
  revision: sections.revision,
  changedAt: sections.changedAt,
  changedBy: users.name,
  sheetCount: sql<number>`(select count(*) from sheets where sheets.section_id = sections.id)`,
}

/** In the order in which they were made. */
export function listSections(reader: Reader, jobId: string, page: PageRequest): Page<SectionSummary> {
  const rows = reader
    .select({ ...summary, createdAt: sections.createdAt })
    .from(sections)
    .innerJoin(users, eq(users.id, sections.changedBy))
    .where(
      and(
        eq(sections.jobId, jobId),
        beyond({ key: sections.createdAt, id: sections.id, direction: 'ascending' }, page.after),
      ),
    )
    .orderBy(asc(sections.createdAt), asc(sections.id))
    .limit(page.limit + 1)
    .all()
  return toPage(
    rows,
    page,
    ({ id, jobId, title, revision, changedAt, changedBy, sheetCount }): SectionSummary => ({
      id,
      jobId,
      title,
      revision,
      changedAt,
      changedBy,
      sheetCount,
    }),
    (row) => [row.createdAt, row.id],
  )
}

export function findSection(reader: Reader, id: string): Omit<StoredSection, 'job'> | undefined {
  return reader
    .select({ ...summary, document: sections.document })
    .from(sections)
    .innerJoin(users, eq(users.id, sections.changedBy))
    .where(eq(sections.id, id))
    .get()
}

/** Who made it, and from which request. */
export function findSectionOrigin(reader: Reader, id: string) {
  const { createdBy, createdFrom } = sections
  return reader.select({ createdBy, createdFrom }).from(sections).where(eq(sections.id, id)).get()
}

export function insertSection(tx: Transaction, row: SectionRow): void {
  tx.insert(sections).values(row).run()
}

export function updateSection(
  tx: Transaction,
  id: string,
  change: Pick<SectionRow, 'title' | 'document' | 'revision' | 'changedBy' | 'changedAt'>,
): void {
  tx.update(sections).set(change).where(eq(sections.id, id)).run()
}
