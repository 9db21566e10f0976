/** People and their accounts: signing in, changing one's own, and what an administrator does to others'. */
import type { AccountPatch, NewUser, PasswordChange, SignIn, User, UserPatch } from '#shared/api.ts'
import { hashPassword, verifyAgainstNobody, verifyPassword } from '../auth/passwords.ts'
import type { SignedIn } from '../auth/sessions.ts'
import type { Context } from '../context.ts'
import { inTransaction, type Reader } from '../db/client.ts'
import type { UserRow } from '../db/schema/users.ts'
import { InvalidError, NotFoundError, RequestError } from '../errors.ts'
import {
  countActiveAdministrators,
  findUser,
  findUserByEmail,
  insertUser,
  toUser,
  updateUser,
} from '../repositories/users.ts'
import { isRetry, type Created } from './creation.ts'
import { toFingerprint } from './fingerprint.ts'

/** One answer for an unknown address, a closed account and a wrong password. */
export async function checkCredentials(
  { database }: Pick<Context, 'database'>,
  asked: SignIn,
): Promise<User> {
  const user = findUserByEmail(database, asked.email)
  const right =
    user?.active === true
      ? await verifyPassword(user.passwordHash, asked.password)
      : await verifyAgainstNobody(asked.password)
  if (user === undefined || !right) {
    throw new RequestError(401, 'wrong-credentials', 'The e-mail address or the password is not right.')
  }
  return toUser(user)
}

/** Changes the password and ends every session of the person; the caller opens a new one. */
export async function changePassword(
  { database, sessions }: Pick<Context, 'database' | 'sessions'>,
  person: SignedIn,
  { current, next }: PasswordChange,
): Promise<void> {
  const user = readUser(database, person.id)
  if (!(await verifyPassword(user.passwordHash, current))) {
    throw new InvalidError('The password was not changed.', [
      { path: 'current', code: 'wrong', message: 'This is not your present password' },
    ])
  }
  const passwordHash = await hashPassword(next)
  inTransaction(database, (tx) => updateUser(tx, person.id, { passwordHash, demo: false }))
  await sessions.closeAll(person.id)
}

export function changeAccount(
  { database }: Pick<Context, 'database'>,
  person: SignedIn,
  patch: AccountPatch,
): User {
  return inTransaction(database, (tx) => {
    updateUser(tx, person.id, patch)
    return toUser(readUser(tx, person.id))
  })
}

export async function invite(
  { database, now }: Pick<Context, 'database' | 'now'>,
  administrator: SignedIn,
  asked: NewUser,
): Promise<Created<User>> {
  const { id, name, initials, email, role, password } = asked
  // The password stays out: a fast hash of it would be stored otherwise.
  const createdFrom = toFingerprint({ by: administrator.id, name, initials, email, role })
  const passwordHash = await hashPassword(password)
  return inTransaction(database, (tx) => {
    const existing = findUser(tx, id)
    const expected = { createdBy: administrator.id, createdFrom }
    const origin = existing && { createdBy: administrator.id, createdFrom: existing.createdFrom }
    if (existing !== undefined && isRetry(origin, expected, 'person')) {
      return { item: toUser(existing), fresh: false }
    }
    if (findUserByEmail(tx, email) !== undefined) {
      throw new InvalidError('The person was not added.', [
        { path: 'email', code: 'taken', message: 'Someone in this office has this address already' },
      ])
    }
    const user: UserRow = {
      id,
      name,
      initials,
      email,
      passwordHash,
      role,
      active: true,
      demo: false,
      createdFrom,
      createdAt: now(),
    }
    insertUser(tx, user)
    return { item: toUser(user), fresh: true }
  })
}

/** Role, access or password of someone. Closing an account or giving it a new password signs the person out. */
export async function changeUser(
  { database, sessions }: Pick<Context, 'database' | 'sessions'>,
  userId: string,
  { role, active, password }: UserPatch,
): Promise<User> {
  const passwordHash = password === undefined ? undefined : await hashPassword(password)
  const changed = inTransaction(database, (tx) => {
    const before = readUser(tx, userId)
    if (before.demo && !before.active && active === true && passwordHash === undefined) {
      throw new InvalidError('The account was not opened.', [
        {
          path: 'password',
          code: 'required',
          message: 'A demo account needs a new password to be opened again',
        },
      ])
    }
    const newPassword = passwordHash === undefined ? {} : { passwordHash, demo: false }
    const change = { ...(role && { role }), ...(active !== undefined && { active }), ...newPassword }
    if (Object.keys(change).length > 0) updateUser(tx, userId, change)
    if (countActiveAdministrators(tx) === 0) {
      throw new InvalidError('The office would be left without an administrator.', [
        {
          path: active === false ? 'active' : 'role',
          code: 'last-administrator',
          message: 'This is the last administrator; make someone else one first',
        },
      ])
    }
    return toUser(readUser(tx, userId))
  })
  if (!changed.active || passwordHash !== undefined) await sessions.closeAll(userId)
  return changed
}

function readUser(reader: Reader, id: string): UserRow {
  const user = findUser(reader, id)
  if (user === undefined) throw new NotFoundError('person')
  return user
}
