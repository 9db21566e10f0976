/** Every route against every role: the table is the rule, and no route may be missing from it. */
import { randomUUID } from 'node:crypto'
import type { Response, Test } from 'supertest'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { toSeen } from '#shared/document/seenFigures.ts'
import { roundColumn } from '../helpers/apiDocuments.ts'
import { startOffice, type Office, type Visitor } from '../helpers/api.ts'

const roles = ['nobody', 'stranger', 'viewer', 'checker', 'designer', 'administrator'] as const
type Statuses = [
  nobody: number,
  stranger: number,
  viewer: number,
  checker: number,
  designer: number,
  administrator: number,
]

/** What the routes are asked about, made once. */
interface Ground {
  office: Office
  sectionId: string
  sheetId: string
  /** A link nobody revokes, to be read; and a new one for every asker who may revoke. */
  token: string
  makeLink: () => Promise<string>
  makePerson: () => Promise<string>
  seen: ReturnType<typeof toSeen>
}
let ground: Ground

type Row = [route: string, statuses: Statuses, ask: (visitor: Visitor) => Test | Promise<Response>]
const everyone = (status: number): Statuses => [status, status, status, status, status, status]
const accounts = (status: number): Statuses => [401, status, status, status, status, status]
const administrators = (status: number): Statuses => [401, 403, 403, 403, 403, status]
/** Members of the job and administrators; for strangers it does not exist. */
const readers: Statuses = [401, 404, 200, 200, 200, 200]
/** Designers only; an administrator sees the job, so the answer is no rather than nothing. */
const designers = (status: number): Statuses => [401, 404, 403, 403, status, 403]

const job = () => `/api/jobs/${ground.office.jobId}`
const section = () => `/api/sections/${ground.sectionId}`
const sheet = () => `/api/sheets/${ground.sheetId}`
const nextMonth = () => Date.now() + 30 * 24 * 3600 * 1000
const newPerson = () => ({
  id: randomUUID(),
  name: 'New Person',
  initials: 'NP',
  email: `${randomUUID()}@columns.test`,
  password: 'long enough for them',
  role: 'member',
})

const table: Row[] = [
  ['GET /health', everyone(200), (who) => who.get('/api/health')],
  ['GET /link/:token', everyone(200), (who) => who.get(`/api/link/${ground.token}`)],
  ['POST /sign-in', everyone(400), (who) => who.post('/api/sign-in').send({})],
  ['GET /session', accounts(200), (who) => who.get('/api/session')],
  [
    'PATCH /account',
    accounts(200),
    (who) => who.patch('/api/account').send({ name: 'Same Name', initials: 'SN' }),
  ],
  ['POST /account/password', accounts(400), (who) => who.post('/api/account/password').send({})],
  ['GET /users', administrators(200), (who) => who.get('/api/users')],
  ['POST /users', administrators(201), (who) => who.post('/api/users').send(newPerson())],
  [
    'PATCH /users/:userId',
    administrators(200),
    (who) => who.patch(`/api/users/${ground.office.viewer.id}`).send({ role: 'member' }),
  ],
  ['GET /jobs', accounts(200), (who) => who.get('/api/jobs')],
  [
    'POST /jobs',
    accounts(201),
    (who) => who.post('/api/jobs').send({ id: randomUUID(), title: 'Another', number: '' }),
  ],
  ['GET /jobs/:jobId', readers, (who) => who.get(job())],
  [
    'PATCH /jobs/:jobId',
    [401, 404, 403, 403, 200, 200],
    (who) => who.patch(job()).set('If-Match', '"1"').send({ title: 'Tern Creek Crossing', number: 'TC-1' }),
  ],
  ['GET /jobs/:jobId/members', readers, (who) => who.get(`${job()}/members`)],
  [
    'PUT /jobs/:jobId/members/:userId',
    administrators(200),
    async (who) => who.put(`${job()}/members/${await ground.makePerson()}`).send({ role: 'viewer' }),
  ],
  [
    'DELETE /jobs/:jobId/members/:userId',
    administrators(204),
    async (who) => {
      const userId = await ground.makePerson()
      await ground.office.administrator.put(`${job()}/members/${userId}`).send({ role: 'viewer' }).expect(200)
      return who.delete(`${job()}/members/${userId}`)
    },
  ],
  ['GET /jobs/:jobId/sections', readers, (who) => who.get(`${job()}/sections`)],
  [
    'POST /jobs/:jobId/sections',
    designers(201),
    (who) =>
      who.post(`${job()}/sections`).send({ id: randomUUID(), title: 'Pier 4', document: roundColumn() }),
  ],
  ['GET /sections/:sectionId', readers, (who) => who.get(section())],
  [
    'PUT /sections/:sectionId',
    designers(200),
    (who) =>
      who
        .put(section())
        .set('If-Match', '"1"')
        .send({ title: 'Pier 3', document: roundColumn(90) }),
  ],
  ['GET /sections/:sectionId/sheets', readers, (who) => who.get(`${section()}/sheets`)],
  [
    'POST /sections/:sectionId/sheets',
    designers(201),
    (who) =>
      who
        .post(`${section()}/sheets`)
        .send({ id: randomUUID(), number: 'C-2', document: roundColumn(), seen: ground.seen }),
  ],
  ['GET /sheets/:sheetId', readers, (who) => who.get(sheet())],
  ['GET /sheets/:sheetId/links', [401, 404, 403, 200, 200, 200], (who) => who.get(`${sheet()}/links`)],
  [
    'POST /sheets/:sheetId/links',
    designers(201),
    (who) =>
      who.post(`${sheet()}/links`).send({ id: randomUUID(), recipient: 'K. Oduya', expiresAt: nextMonth() }),
  ],
  [
    'POST /links/:linkId/revoke',
    [401, 404, 403, 403, 200, 200],
    async (who) => who.post(`/api/links/${await ground.makeLink()}/revoke`),
  ],
  // Last: it ends the sessions that the rows above need.
  ['POST /sign-out', everyone(204), (who) => who.post('/api/sign-out')],
]

beforeAll(async () => {
  const office = await startOffice()
  const { context, designer, jobId } = office
  const sectionId = randomUUID()
  await designer
    .post(`/api/jobs/${jobId}/sections`)
    .send({ id: sectionId, title: 'Pier 3', document: roundColumn() })
    .expect(201)
  const reply = await context.verifier.analyse(roundColumn())
  if (reply.status === 'bad-document') throw new Error(JSON.stringify(reply.issues))
  const seen = toSeen(reply.result)
  const sheetId = randomUUID()
  await designer
    .post(`/api/sections/${sectionId}/sheets`)
    .send({ id: sheetId, number: 'C-1', document: roundColumn(), seen })
    .expect(201)
  const postLink = async () => {
    const asked = { id: randomUUID(), recipient: 'K. Oduya', expiresAt: nextMonth() }
    const { body } = await designer.post(`/api/sheets/${sheetId}/links`).send(asked).expect(201)
    return body as { id: string; token: string }
  }
  ground = {
    office,
    sectionId,
    sheetId,
    seen,
    token: (await postLink()).token,
    makeLink: async () => (await postLink()).id,
    makePerson: async () => (await office.addPerson(`Person ${randomUUID()}`)).id,
  }
})
afterAll(() => ground.office.close())

describe.each(table)('%s', (_route, statuses, ask) => {
  it.each(roles.map((role, place) => [role, statuses[place]] as const))(
    'answers %s with %i',
    async (role, status) => {
      const answer = await ask(ground.office[role])
      expect(answer.status, JSON.stringify(answer.body)).toBe(status)
      const codes: Record<number, string> = { 401: 'not-signed-in', 403: 'forbidden', 404: 'not-found' }
      if (status in codes) expect(answer.body.error.code).toBe(codes[status])
    },
  )
})

describe('the table', () => {
  it('has a row for every route of the application', () => {
    interface Layer {
      route?: { path: string; methods: Record<string, boolean> }
      handle: { stack?: Layer[] }
    }
    const walk = (layers: Layer[]): string[] =>
      layers.flatMap(({ route, handle }) =>
        route
          ? Object.keys(route.methods).map((method) => `${method.toUpperCase()} ${route.path}`)
          : walk(handle.stack ?? []),
      )
    const routes = walk(ground.office.app.router.stack as unknown as Layer[])
    expect(table.map(([route]) => route).sort()).toEqual([...new Set(routes)].sort())
  })
})

describe('what may not be seen', () => {
  it('is not told apart from what does not exist', async () => {
    const { stranger } = ground.office
    // Signed out by the last row of the table.
    const again = await ground.office.context.sessions.open(stranger.id)
    const ask = async (path: string) => {
      const { body } = await stranger.get(path).set('Cookie', again.split(';')[0]).expect(404)
      return body.error.message
    }
    expect(await ask(section())).toBe(await ask(`/api/sections/${randomUUID()}`))
    expect(await ask(sheet())).toBe(await ask(`/api/sheets/${randomUUID()}`))
    expect(await ask(job())).toBe(await ask(`/api/jobs/${randomUUID()}`))
    expect(await ask(job())).toBe(await ask('/api/jobs/no-id'))
    const { body } = await stranger.get('/api/jobs').set('Cookie', again.split(';')[0]).expect(200)
    expect(body.items.every((item: { title: string }) => item.title === 'Another')).toBe(true)
  })
})
