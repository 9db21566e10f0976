import { and, desc, eq } from 'drizzle-orm'
import type { Page, SheetSummary } from '#shared/api.ts'
import { toRevisionLetters } from '#shared/revisionLetters.ts'
import type { Reader, Transaction } from '../db/client.ts'
import { sheets, type SheetRow } from '../db/schema/sheets.ts'
import { beyond, toPage, type PageRequest } from './page.ts'

/** Everything but document and result, which are large. */
const summary = {
  id: sheets.id,
  sectionId: sheets.sectionId,
  number: sheets.number,
  revisionIndex: sheets.revisionIndex,
  digest: sheets.digest,
  solverVersion: sheets.solverVersion,
  savedAt: sheets.savedAt,
  savedByName: sheets.savedByName,
  savedByInitials: sheets.savedByInitials,
}

export function toSheetSummary(row: Pick<SheetRow, keyof typeof summary>): SheetSummary {
  const { id, sectionId, number, digest, solverVersion, savedAt } = row
  return {
    id,
    sectionId,
    number,
    revision: toRevisionLetters(row.revisionIndex),
    digest,
    solverVersion,
    savedAt,
    savedBy: { name: row.savedByName, initials: row.savedByInitials },
  }
}

/** Latest first. */
export function listSheets(reader: Reader, sectionId: string, page: PageRequest): Page<SheetSummary> {
  const rows = reader
    .select(summary)
    .from(sheets)
    .where(
      and(
        eq(sheets.sectionId, sectionId),
        beyond({ key: sheets.savedAt, id: sheets.id, direction: 'descending' }, page.after),
      ),
    )
    .orderBy(desc(sheets.savedAt), desc(sheets.id))
    .limit(page.limit + 1)
    .all()
  return toPage(rows, page, toSheetSummary, (row) => [row.savedAt, row.id])
}

export function findSheet(reader: Reader, id: string): SheetRow | undefined {
  return reader.select().from(sheets).where(eq(sheets.id, id)).get()
}

/** The sheet of a number that holds: the one with the highest revision. */
export function findLatestOfNumber(
  reader: Reader,
  sectionId: string,
  number: string,
): Pick<SheetRow, 'id' | 'revisionIndex'> | undefined {
  return reader
    .select({ id: sheets.id, revisionIndex: sheets.revisionIndex })
    .from(sheets)
    .where(and(eq(sheets.sectionId, sectionId), eq(sheets.number, number)))
    .orderBy(desc(sheets.revisionIndex))
    .limit(1)
    .get()
}

export function insertSheet(tx: Transaction, row: SheetRow): void {
  tx.insert(sheets).values(row).run()
}
