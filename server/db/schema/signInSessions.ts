import { index, integer, sqliteTable, text } from 'drizzle-orm/sqlite-core'
import { users } from './users.ts'

export const signInSessions = sqliteTable(
  'sign_in_sessions',
  {
    /** SHA-256 of the cookie's token: a leaked database opens no session. */
    id: text('id').primaryKey(),
    userId: text('user_id')
      .notNull()
      .references(() => users.id, { onDelete: 'cascade' }),
    /** UTC seconds, not ms: the auth library writes it so. */
    expiresAt: integer('expires_at').notNull(),
  },
  (table) => [index('sign_in_sessions_user').on(table.userId)],
)
