import { asc, eq } from 'drizzle-orm'
import type { SheetEvent } from '#shared/api.ts'
import type { Reader, Transaction } from '../db/client.ts'
import { sheetEvents } from '../db/schema/sheetEvents.ts'

/** As they happened. A sheet has few: they come whole, with the sheet. */
export function listSheetEvents(reader: Reader, sheetId: string): SheetEvent[] {
  return reader
    .select({
      kind: sheetEvents.kind,
      at: sheetEvents.at,
      by: sheetEvents.byName,
      text: sheetEvents.text,
    })
    .from(sheetEvents)
    .where(eq(sheetEvents.sheetId, sheetId))
    .orderBy(asc(sheetEvents.id))
    .all()
}

export function appendSheetEvent(tx: Transaction, event: Omit<typeof sheetEvents.$inferInsert, 'id'>): void {
  tx.insert(sheetEvents).values(event).run()
}
