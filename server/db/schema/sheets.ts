import { index, integer, sqliteTable, text, uniqueIndex } from 'drizzle-orm/sqlite-core'
import type { AnalysisDocument } from '#shared/document/analysisDocument.ts'
import type { MomentCurvatureResult } from '#shared/document/analysisResult.ts'
import { jobs } from './jobs.ts'
import { sections } from './sections.ts'
import { users } from './users.ts'

/**
 * A calculation sheet, written once: triggers refuse UPDATE and DELETE (see guards.ts). Names and titles are
 * copied, so that a title block reads for ever as it was signed.
 */
export const sheets = sqliteTable(
  'sheets',
  {
    id: text('id').primaryKey(),
    sectionId: text('section_id')
      .notNull()
      .references(() => sections.id),
    jobId: text('job_id')
      .notNull()
      .references(() => jobs.id),
    sectionTitle: text('section_title').notNull(),
    jobTitle: text('job_title').notNull(),
    jobNumber: text('job_number').notNull(),
    number: text('number').notNull(),
    /** 1 is A, 27 is AA. */
    revisionIndex: integer('revision_index').notNull(),
    document: text('document', { mode: 'json' }).$type<AnalysisDocument>().notNull(),
    result: text('result', { mode: 'json' }).$type<MomentCurvatureResult>().notNull(),
    digest: text('digest').notNull(),
    solverVersion: text('solver_version').notNull(),
    savedBy: text('saved_by')
      .notNull()
      .references(() => users.id),
    savedByName: text('saved_by_name').notNull(),
    savedByInitials: text('saved_by_initials').notNull(),
    createdFrom: text('created_from').notNull(),
    /** UTC ms */
    savedAt: integer('saved_at').notNull(),
  },
  (table) => [
    uniqueIndex('sheets_revision').on(table.sectionId, table.number, table.revisionIndex),
    index('sheets_section').on(table.sectionId, table.savedAt, table.id),
  ],
)

export type SheetRow = typeof sheets.$inferSelect
