import { index, integer, sqliteTable, text } from 'drizzle-orm/sqlite-core'
import { sheets } from './sheets.ts'
import { users } from './users.ts'

export const links = sqliteTable(
  'links',
  {
    id: text('id').primaryKey(),
    sheetId: text('sheet_id')
      .notNull()
      .references(() => sheets.id),
    /** SHA-256 of the token: a leaked database opens no sheet. */
    tokenHash: text('token_hash').notNull().unique(),
    recipient: text('recipient').notNull(),
    createdBy: text('created_by')
      .notNull()
      .references(() => users.id),
    createdFrom: text('created_from').notNull(),
    /** UTC ms */
    createdAt: integer('created_at').notNull(),
    /** UTC ms */
    expiresAt: integer('expires_at').notNull(),
    /** UTC ms */
    revokedAt: integer('revoked_at'),
    revokedBy: text('revoked_by').references(() => users.id),
  },
  (table) => [index('links_sheet').on(table.sheetId, table.createdAt, table.id)],
)

export type LinkRow = typeof links.$inferSelect
