import { index, primaryKey, sqliteTable, text } from 'drizzle-orm/sqlite-core'
import type { JobRole } from '#shared/api.ts'
import { jobs } from './jobs.ts'
import { users } from './users.ts'

export const members = sqliteTable(
  'members',
  {
    jobId: text('job_id')
      .notNull()
      .references(() => jobs.id),
    userId: text('user_id')
      .notNull()
      .references(() => users.id),
    role: text('role').$type<JobRole>().notNull(),
  },
  (table) => [primaryKey({ columns: [table.jobId, table.userId] }), index('members_user').on(table.userId)],
)
