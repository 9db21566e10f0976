import { and, desc, eq } from 'drizzle-orm'
import type { Page, SheetLink } from '#shared/api.ts'
import type { Reader, Transaction } from '../db/client.ts'
import { links, type LinkRow } from '../db/schema/links.ts'
import { users } from '../db/schema/users.ts'
import { beyond, toPage, type PageRequest } from './page.ts'

/** Never the token's hash. */
const shown = {
  id: links.id,
  sheetId: links.sheetId,
  recipient: links.recipient,
  createdAt: links.createdAt,
  createdBy: users.name,
  expiresAt: links.expiresAt,
  revokedAt: links.revokedAt,
}

/** Latest first. */
export function listLinks(reader: Reader, sheetId: string, page: PageRequest): Page<SheetLink> {
  const rows = reader
    .select(shown)
    .from(links)
    .innerJoin(users, eq(users.id, links.createdBy))
    .where(
      and(
        eq(links.sheetId, sheetId),
        beyond({ key: links.createdAt, id: links.id, direction: 'descending' }, page.after),
      ),
    )
    .orderBy(desc(links.createdAt), desc(links.id))
    .limit(page.limit + 1)
    .all()
  return toPage(
    rows,
    page,
    (row): SheetLink => row,
    (row) => [row.createdAt, row.id],
  )
}

export function findLink(reader: Reader, id: string): SheetLink | undefined {
  return reader
    .select(shown)
    .from(links)
    .innerJoin(users, eq(users.id, links.createdBy))
    .where(eq(links.id, id))
    .get()
}

/** Who made it, and from which request. */
export function findLinkOrigin(reader: Reader, id: string) {
  const { createdBy, createdFrom } = links
  return reader.select({ createdBy, createdFrom }).from(links).where(eq(links.id, id)).get()
}

export function findLinkByTokenHash(reader: Reader, tokenHash: string): SheetLink | undefined {
  return reader
    .select(shown)
    .from(links)
    .innerJoin(users, eq(users.id, links.createdBy))
    .where(eq(links.tokenHash, tokenHash))
    .get()
}

export function insertLink(tx: Transaction, row: LinkRow): void {
  tx.insert(links).values(row).run()
}

export function replaceToken(tx: Transaction, id: string, tokenHash: string): void {
  tx.update(links).set({ tokenHash }).where(eq(links.id, id)).run()
}

export function setRevoked(tx: Transaction, id: string, revokedAt: number, revokedBy: string): void {
  tx.update(links).set({ revokedAt, revokedBy }).where(eq(links.id, id)).run()
}
