import { index, integer, sqliteTable, text } from 'drizzle-orm/sqlite-core'
import { users } from './users.ts'

export const jobs = sqliteTable(
  'jobs',
  {
    id: text('id').primaryKey(),
    title: text('title').notNull(),
    number: text('number').notNull(),
    revision: integer('revision').notNull(),
    createdBy: text('created_by')
      .notNull()
      .references(() => users.id),
    createdFrom: text('created_from').notNull(),
    /** UTC ms */
    createdAt: integer('created_at').notNull(),
    /** UTC ms, latest change of the job or any of its sections. */
    changedAt: integer('changed_at').notNull(),
  },
  (table) => [index('jobs_changed').on(table.changedAt, table.id)],
)

export type JobRow = typeof jobs.$inferSelect
