import { and, asc, eq } from 'drizzle-orm'
import type { JobRole, Member, Page } from '#shared/api.ts'
import type { Reader, Transaction } from '../db/client.ts'
import { members } from '../db/schema/members.ts'
import { users } from '../db/schema/users.ts'
import { beyond, toPage, type PageRequest } from './page.ts'

export function listMembers(reader: Reader, jobId: string, page: PageRequest): Page<Member> {
  const rows = reader
    .select({
      userId: users.id,
      name: users.name,
      initials: users.initials,
      email: users.email,
      role: members.role,
    })
    .from(members)
    .innerJoin(users, eq(users.id, members.userId))
    .where(
      and(
        eq(members.jobId, jobId),
        beyond({ key: users.name, id: users.id, direction: 'ascending' }, page.after),
      ),
    )
    .orderBy(asc(users.name), asc(users.id))
    .limit(page.limit + 1)
    .all()
  return toPage(
    rows,
    page,
    (row): Member => row,
    (row) => [row.name, row.userId],
  )
}

/** Makes someone a member, or changes the role of one. */
export function putMember(tx: Transaction, jobId: string, userId: string, role: JobRole): void {
  tx.insert(members)
    .values({ jobId, userId, role })
    .onConflictDoUpdate({ target: [members.jobId, members.userId], set: { role } })
    .run()
}

/** False when there was no such member. */
export function removeMember(tx: Transaction, jobId: string, userId: string): boolean {
  const { changes } = tx
    .delete(members)
    .where(and(eq(members.jobId, jobId), eq(members.userId, userId)))
    .run()
  return changes > 0
}
