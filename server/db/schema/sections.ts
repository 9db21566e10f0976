import { index, integer, sqliteTable, text } from 'drizzle-orm/sqlite-core'
import type { AnalysisDocument } from '#shared/document/analysisDocument.ts'
import { jobs } from './jobs.ts'
import { users } from './users.ts'

export const sections = sqliteTable(
  'sections',
  {
    id: text('id').primaryKey(),
    jobId: text('job_id')
      .notNull()
      .references(() => jobs.id),
    title: text('title').notNull(),
    /** With every default filled in. */
    document: text('document', { mode: 'json' }).$type<AnalysisDocument>().notNull(),
    revision: integer('revision').notNull(),
    createdBy: text('created_by')
      .notNull()
      .references(() => users.id),
    createdFrom: text('created_from').notNull(),
    /** UTC ms */
    createdAt: integer('created_at').notNull(),
    changedBy: text('changed_by')
      .notNull()
      .references(() => users.id),
    /** UTC ms */
    changedAt: integer('changed_at').notNull(),
  },
  (table) => [index('sections_job').on(table.jobId, table.createdAt, table.id)],
)

export type SectionRow = typeof sections.$inferSelect
