/** The real application on a temporary database, and people who ask it things. */
import { randomUUID } from 'node:crypto'
import type { Express } from 'express'
import request, { type Test } from 'supertest'
import type { JobRole, OfficeRole } from '#shared/api.ts'
import { createApp } from '#server/app.ts'
import { hashPassword } from '#server/auth/passwords.ts'
import type { SignedIn } from '#server/auth/sessions.ts'
import { readConfig, type Config } from '#server/config.ts'
import { createContext, type Context, type ContextParts } from '#server/context.ts'
import { inTransaction } from '#server/db/client.ts'
import { insertUser } from '#server/repositories/users.ts'

export const host = 'columns.test'
export const origin = `http://${host}`
/** Of everyone in these tests. */
export const password = 'correct horse battery'

/** 55 ms and 19 MB each: made once. */
let passwordHash: Promise<string> | undefined

export interface Visitor {
  get: (path: string) => Test
  post: (path: string) => Test
  put: (path: string) => Test
  patch: (path: string) => Test
  delete: (path: string) => Test
}

export interface Person extends Visitor {
  id: string
  email: string
  name: string
  initials: string
  cookie: string
  signedIn: SignedIn
}

export interface Api {
  app: Express
  context: Context
  /** Asks without a session, from our own page. */
  nobody: Visitor
  addPerson: (name: string, role?: OfficeRole) => Promise<Person>
  close: () => Promise<void>
}

export async function startApi(
  parts: ContextParts = {},
  settings: Partial<Config> = {},
  clientFolder: string | null = null,
): Promise<Api> {
  const config: Config = { ...readConfig({ GIRDWELL_LOG: 'silent' }), ...settings }
  const context = createContext(config, { databaseFile: ':memory:', ...parts })
  const app = createApp(context, clientFolder)

  async function addPerson(name: string, role: OfficeRole = 'member'): Promise<Person> {
    passwordHash ??= hashPassword(password)
    const person = {
      id: randomUUID(),
      name,
      initials: name
        .split(' ')
        .map((word) => word[0])
        .join(''),
      email: `${name.toLowerCase().replaceAll(' ', '.')}@columns.test`,
      role,
      active: true,
    }
    const row = { ...person, passwordHash: await passwordHash, demo: false, createdFrom: null, createdAt: 1 }
    inTransaction(context.database, (tx) => insertUser(tx, row))
    const [cookie] = (await context.sessions.open(person.id)).split(';')
    return { ...person, cookie, signedIn: person, ...askFrom(app, { Cookie: cookie }) }
  }

  return { app, context, nobody: askFrom(app, {}), addPerson, close: () => context.close() }
}

function askFrom(app: Express, headers: Record<string, string>): Visitor {
  const dress = (test: Test) => test.set({ Host: host, Origin: origin, ...headers })
  return {
    get: (path) => dress(request(app).get(path)),
    post: (path) => dress(request(app).post(path)),
    put: (path) => dress(request(app).put(path)),
    patch: (path) => dress(request(app).patch(path)),
    delete: (path) => dress(request(app).delete(path)),
  }
}

export interface Office extends Api {
  administrator: Person
  designer: Person
  secondDesigner: Person
  checker: Person
  viewer: Person
  stranger: Person
  jobId: string
}

/** An office with one job and a person of every role in it. */
export async function startOffice(...given: Parameters<typeof startApi>): Promise<Office> {
  const api = await startApi(...given)
  const administrator = await api.addPerson('Ada Minter', 'administrator')
  const designer = await api.addPerson('Dora Signe')
  const jobId = randomUUID()
  await designer
    .post('/api/jobs')
    .send({ id: jobId, title: 'Tern Creek Crossing', number: 'TC-1' })
    .expect(201)
  const join = async (name: string, role: JobRole) => {
    const person = await api.addPerson(name)
    await administrator.put(`/api/jobs/${jobId}/members/${person.id}`).send({ role }).expect(200)
    return person
  }
  return {
    ...api,
    administrator,
    designer,
    secondDesigner: await join('Dan Second', 'designer'),
    checker: await join('Cleo Check', 'checker'),
    viewer: await join('Vera View', 'viewer'),
    stranger: await api.addPerson('Stan Strange'),
    jobId,
  }
}
