import { sql, type SQL } from 'drizzle-orm'
import type { SQLiteColumn } from 'drizzle-orm/sqlite-core'
import type { Page } from '#shared/api.ts'

/** Where the next page of a list begins: the sort key and id of the last item of this one. */
export type Cursor = [key: string | number, id: string]

export interface PageRequest {
  limit: number
  after: Cursor | null
}

type Sort = { key: SQLiteColumn; id: SQLiteColumn; direction: 'ascending' | 'descending' }

/** Rows beyond the cursor; undefined for the first page. */
export function beyond({ key, id, direction }: Sort, after: Cursor | null): SQL | undefined {
  if (after === null) return undefined
  return direction === 'ascending'
    ? sql`(${key}, ${id}) > (${after[0]}, ${after[1]})`
    : sql`(${key}, ${id}) < (${after[0]}, ${after[1]})`
}

/** A page out of rows that were asked for with a limit of one more. */
export function toPage<Row, Item>(
  rows: Row[],
  { limit }: PageRequest,
  toItem: (row: Row) => Item,
  toCursor: (row: Row) => Cursor,
): Page<Item> {
  const shown = rows.slice(0, limit)
  const more = rows.length > limit
  return {
    items: shown.map(toItem),
    nextCursor: more ? encodeCursor(toCursor(shown[shown.length - 1])) : null,
  }
}

function encodeCursor(cursor: Cursor): string {
  return Buffer.from(JSON.stringify(cursor)).toString('base64url')
}
