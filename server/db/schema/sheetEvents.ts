import { index, integer, sqliteTable, text } from 'drizzle-orm/sqlite-core'
import type { SheetEvent } from '#shared/api.ts'
import { sheets } from './sheets.ts'
import { users } from './users.ts'

/** What happened to a sheet, append-only: triggers refuse UPDATE and DELETE (see guards.ts). */
export const sheetEvents = sqliteTable(
  'sheet_events',
  {
    id: integer('id').primaryKey({ autoIncrement: true }),
    sheetId: text('sheet_id')
      .notNull()
      .references(() => sheets.id),
    kind: text('kind').$type<SheetEvent['kind']>().notNull(),
    byId: text('by_id')
      .notNull()
      .references(() => users.id),
    byName: text('by_name').notNull(),
    text: text('text').notNull(),
    /** UTC ms */
    at: integer('at').notNull(),
  },
  (table) => [index('sheet_events_sheet').on(table.sheetId, table.id)],
)
