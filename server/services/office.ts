/** What must hold before the server listens: an office with an administrator, and no demo account in reach of others. */
import { randomBytes, randomUUID } from 'node:crypto'
import { hashPassword } from '../auth/passwords.ts'
import { isLoopback } from '../config.ts'
import type { Context } from '../context.ts'
import { inTransaction } from '../db/client.ts'
import { demoAccounts, demoPassword } from '../db/seed/demoAccounts.ts'
import { seedDemo } from '../db/seed/seedDemo.ts'
import {
  countActiveAdministrators,
  countUsers,
  findUserByEmail,
  insertUser,
  listOpenDemoAccounts,
  updateUser,
} from '../repositories/users.ts'
import { StartError } from '../startError.ts'

/** What the person who starts the server is told. */
export interface OfficeNews {
  demo: { password: string; accounts: { email: string; words: string }[] }
  newAdministrator: { email: string; password: string } | null
}

type Uses = Pick<Context, 'config' | 'database' | 'now'>

export async function prepareOffice(uses: Uses): Promise<OfficeNews> {
  const { config, database, now } = uses
  if (config.demo && countUsers(database) === 0) await seedDemo(database, now())
  const newAdministrator = config.demo ? null : await leaveDemo(uses)
  const open = new Set(listOpenDemoAccounts(database).map((user) => user.email))
  if (open.size > 0 && !isLoopback(config.host)) {
    throw new StartError(
      `HOST ${config.host} would let others sign in with the demo accounts, whose password is known. ` +
        'Start once with GIRDWELL_DEMO=off and GIRDWELL_ADMIN_EMAIL=<your address>: this closes them and makes you the administrator. Or leave HOST at 127.0.0.1.',
    )
  }
  const accounts = demoAccounts
    .filter(({ email }) => open.has(email))
    .map(({ email, role, jobRole }) => ({ email, words: jobRole ?? role }))
  return { demo: { password: demoPassword, accounts }, newAdministrator }
}

/** Closes the demo accounts, and makes the first administrator of the office's own where there is none. */
async function leaveDemo({ config, database, now }: Uses): Promise<OfficeNews['newAdministrator']> {
  const password = randomBytes(12).toString('base64url')
  const passwordHash = await hashPassword(password)
  return inTransaction(database, (tx) => {
    for (const user of listOpenDemoAccounts(tx)) updateUser(tx, user.id, { active: false })
    if (countActiveAdministrators(tx) > 0) return null
    const email = config.adminEmail
    if (email === null) {
      throw new StartError(
        'There is no administrator of your own yet: set GIRDWELL_ADMIN_EMAIL to the address of the first one and start again.',
      )
    }
    const known = findUserByEmail(tx, email)
    if (known !== undefined) {
      updateUser(tx, known.id, { role: 'administrator', active: true, passwordHash, demo: false })
    } else {
      insertUser(tx, {
        id: randomUUID(),
        name: 'Administrator',
        initials: 'AD',
        email,
        passwordHash,
        role: 'administrator',
        active: true,
        demo: false,
        createdFrom: null,
        createdAt: now(),
      })
    }
    return { email, password }
  })
}
