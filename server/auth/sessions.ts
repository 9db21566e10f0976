/** Sign-in sessions. The only file that knows the auth library: another one, or node:crypto, would replace it here. */
import { createHash, randomBytes } from 'node:crypto'
import { DrizzleSQLiteAdapter } from '@lucia-auth/adapter-drizzle'
import { Lucia, TimeSpan } from 'lucia'
import type { Database } from '../db/client.ts'
import { signInSessions } from '../db/schema/signInSessions.ts'
import { users, type UserRow } from '../db/schema/users.ts'

/** Who is asking. Holds nothing secret. */
export type SignedIn = Pick<UserRow, 'id' | 'name' | 'initials' | 'email' | 'role' | 'active'>

declare module 'lucia' {
  interface Register {
    Lucia: Lucia<Record<never, never>, Omit<SignedIn, 'id'>>
    DatabaseUserAttributes: Omit<UserRow, 'id'>
  }
}

export const sessionCookieName = 'girdwell_session'
/** Renewed whenever it is used in its second half. */
const sessionLife = new TimeSpan(14, 'd')

export interface OpenSession {
  user: SignedIn
  /** Value for Set-Cookie when the session was just renewed. */
  renewedCookie: string | null
}

export interface Sessions {
  /** Makes a session and answers the value for Set-Cookie. */
  open: (userId: string) => Promise<string>
  /** Finds the session a Cookie header names; null when there is none, it ended, or its owner was deactivated. */
  find: (cookieHeader: string | undefined) => Promise<OpenSession | null>
  /** Ends the session a Cookie header names, and answers the Set-Cookie that clears it. */
  close: (cookieHeader: string | undefined) => Promise<string>
  closeAll: (userId: string) => Promise<void>
  removeExpired: () => Promise<void>
}

export function createSessions(database: Database, { secure }: { secure: boolean }): Sessions {
  const lucia = new Lucia(new DrizzleSQLiteAdapter(database, signInSessions, users), {
    sessionExpiresIn: sessionLife,
    sessionCookie: { name: sessionCookieName, attributes: { secure, sameSite: 'lax', path: '/' } },
    // The adapter reads the whole row, password hash included; what is not listed here goes no further.
    getUserAttributes: ({ name, initials, email, role, active }) => ({ name, initials, email, role, active }),
  })
  const readToken = (cookieHeader: string | undefined) =>
    cookieHeader === undefined ? null : lucia.readSessionCookie(cookieHeader)

  return {
    async open(userId) {
      const token = randomBytes(32).toString('base64url')
      await lucia.createSession(userId, {}, { sessionId: toSessionId(token) })
      return lucia.createSessionCookie(token).serialize()
    },
    async find(cookieHeader) {
      const token = readToken(cookieHeader)
      if (token === null) return null
      const { user, session } = await lucia.validateSession(toSessionId(token))
      if (user === null) return null
      if (!user.active) {
        await lucia.invalidateUserSessions(user.id)
        return null
      }
      const { id, name, initials, email, role, active } = user
      return {
        user: { id, name, initials, email, role, active },
        renewedCookie: session.fresh ? lucia.createSessionCookie(token).serialize() : null,
      }
    },
    async close(cookieHeader) {
      const token = readToken(cookieHeader)
      if (token !== null) await lucia.invalidateSession(toSessionId(token))
      return lucia.createBlankSessionCookie().serialize()
    },
    closeAll: (userId) => lucia.invalidateUserSessions(userId),
    removeExpired: () => lucia.deleteExpiredSessions(),
  }
}

/** The library would store the token itself; given the hash as id, it stores the hash. */
function toSessionId(token: string): string {
  return createHash('sha256').update(token).digest('hex')
}
