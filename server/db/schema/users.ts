import { integer, sqliteTable, text } from 'drizzle-orm/sqlite-core'
import type { OfficeRole } from '#shared/api.ts'

/** People of the office. Nobody is deleted: what they made keeps their name. */
export const users = sqliteTable('users', {
  id: text('id').primaryKey(),
  name: text('name').notNull(),
  initials: text('initials').notNull(),
  /** Lower case. */
  email: text('email').notNull().unique(),
  /** argon2id, with its own parameters and salt. */
  passwordHash: text('password_hash').notNull(),
  role: text('role').$type<OfficeRole>().notNull(),
  active: integer('active', { mode: 'boolean' }).notNull(),
  /** Still has the published demo password. */
  demo: integer('demo', { mode: 'boolean' }).notNull(),
  /** Fingerprint of the request that created it, so that its retry is recognised; null where no request did. */
  createdFrom: text('created_from'),
  /** UTC ms */
  createdAt: integer('created_at').notNull(),
})

export type UserRow = typeof users.$inferSelect
