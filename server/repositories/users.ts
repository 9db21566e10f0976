import { and, asc, count, eq } from 'drizzle-orm'
import type { Page, User } from '#shared/api.ts'
import type { Reader, Transaction } from '../db/client.ts'
import { users, type UserRow } from '../db/schema/users.ts'
import { beyond, toPage, type PageRequest } from './page.ts'

export function toUser({ id, name, initials, email, role, active }: User): User {
  return { id, name, initials, email, role, active }
}

export function findUser(reader: Reader, id: string): UserRow | undefined {
  return reader.select().from(users).where(eq(users.id, id)).get()
}

export function findUserByEmail(reader: Reader, email: string): UserRow | undefined {
  return reader.select().from(users).where(eq(users.email, email)).get()
}

export function listUsers(reader: Reader, page: PageRequest): Page<User> {
  const rows = reader
    .select()
    .from(users)
    .where(beyond({ key: users.name, id: users.id, direction: 'ascending' }, page.after))
    .orderBy(asc(users.name), asc(users.id))
    .limit(page.limit + 1)
    .all()
  return toPage(rows, page, toUser, (row) => [row.name, row.id])
}

export function countUsers(reader: Reader): number {
  return reader.select({ n: count() }).from(users).get()?.n ?? 0
}

export function countActiveAdministrators(reader: Reader): number {
  const active = and(eq(users.role, 'administrator'), eq(users.active, true))
  return reader.select({ n: count() }).from(users).where(active).get()?.n ?? 0
}

/** Accounts that anyone who read the demo password can sign in with. */
export function listOpenDemoAccounts(reader: Reader): UserRow[] {
  return reader
    .select()
    .from(users)
    .where(and(eq(users.demo, true), eq(users.active, true)))
    .all()
}

export function insertUser(tx: Transaction, row: UserRow): void {
  tx.insert(users).values(row).run()
}

export function updateUser(tx: Transaction, id: string, change: Partial<Omit<UserRow, 'id'>>): void {
  tx.update(users).set(change).where(eq(users.id, id)).run()
}
