import { createHash, randomUUID } from 'node:crypto'
import request from 'supertest'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { longestLinkLife, type CreatedLink } from '#shared/api.ts'
import { toSeen } from '#shared/document/seenFigures.ts'
import { createLog } from '#server/log.ts'
import { roundColumn } from '../helpers/apiDocuments.ts'
import { startOffice, type Office } from '../helpers/api.ts'

const start = Date.UTC(2026, 10, 2, 9)
const day = 24 * 3600 * 1000
let clock = start
const logged: string[] = []
let office: Office
let sheetId: string

beforeAll(async () => {
  office = await startOffice({
    now: () => clock,
    log: createLog('info', { write: (line) => logged.push(line) }),
  })
  const sectionId = randomUUID()
  const document = roundColumn()
  await office.designer
    .post(`/api/jobs/${office.jobId}/sections`)
    .send({ id: sectionId, title: 'Pier 3', document })
    .expect(201)
  const reply = await office.context.verifier.analyse(document)
  if (reply.status !== 'solved') throw new Error(JSON.stringify(reply))
  sheetId = randomUUID()
  await office.designer
    .post(`/api/sections/${sectionId}/sheets`)
    .send({ id: sheetId, number: 'C-1', document, seen: toSeen(reply.result) })
    .expect(201)
})
afterAll(() => office.close())

const askLink = (change: Partial<{ id: string; recipient: string; expiresAt: number }> = {}) =>
  office.designer
    .post(`/api/sheets/${sheetId}/links`)
    .send({ id: randomUUID(), recipient: 'K. Oduya, checker', expiresAt: clock + 30 * day, ...change })
const makeLink = async (change = {}): Promise<CreatedLink> => (await askLink(change).expect(201)).body
/** From a browser that knows nothing of us. */
const visit = (token: string) => request(office.app).get(`/api/link/${token}`)

describe('a link', () => {
  it('shows the sheet without an account, and nothing of the office behind it', async () => {
    const { token, expiresAt } = await makeLink()
    const { body, headers } = await visit(token).expect(200)
    const stored = (await office.designer.get(`/api/sheets/${sheetId}`).expect(200)).body
    const { events, job, ...content } = stored
    expect(events.length).toBeGreaterThan(0)
    expect(body).toEqual({
      sheet: { ...content, job: { title: job.title, number: job.number } },
      recipient: 'K. Oduya, checker',
      expiresAt,
    })
    expect(JSON.stringify(body)).not.toContain(office.jobId)
    expect(headers['set-cookie']).toBeUndefined()
  })

  it('is neither indexed, passed on, nor kept in a cache', async () => {
    const { token } = await makeLink()
    const { headers } = await visit(token).expect(200)
    expect(headers['x-robots-tag']).toContain('noindex')
    expect(headers['referrer-policy']).toBe('no-referrer')
    expect(headers['cache-control']).toBe('no-store')
  })

  it('has a token of 256 bits whose hash alone is stored', async () => {
    const { id, token } = await makeLink()
    expect(Buffer.from(token, 'base64url')).toHaveLength(32)
    const sqlite = office.context.database.$client
    const row = sqlite.prepare('select * from links where id = ?').get(id) as Record<string, unknown>
    expect(row.token_hash).toBe(createHash('sha256').update(token).digest('hex'))
    expect(sqlite.serialize().includes(token)).toBe(false)
    const { body } = await office.designer.get(`/api/sheets/${sheetId}/links`).expect(200)
    expect(JSON.stringify(body)).not.toContain(token)
    expect(JSON.stringify(body)).not.toContain(row.token_hash)
  })

  it('leaves its token out of the log', async () => {
    const { token } = await makeLink()
    await visit(token).expect(200)
    await visit(`${token}?from=mail`).expect(200)
    expect(logged.some((line) => line.includes('/api/link/[token]'))).toBe(true)
    expect(logged.join('')).not.toContain(token)
    expect(logged.join('')).not.toContain(office.designer.cookie.split('=')[1])
  })

  it('that nobody made is not found, whatever it looks like', async () => {
    for (const token of ['A'.repeat(43), 'short', 'x'.repeat(300), '..%2f..', "'%20or%201=1"]) {
      const { body } = await visit(token).expect(404)
      expect(body.error.code).toBe('not-found')
    }
  })

  it('opens nothing else', async () => {
    const { token } = await makeLink()
    for (const path of [`/api/sheets/${sheetId}`, '/api/jobs', `/api/sheets/${sheetId}/links`]) {
      await request(office.app).get(path).set('Cookie', `girdwell_session=${token}`).expect(401)
    }
  })
})

describe('the end of a link', () => {
  it('comes at its expiry, with a word on whom to ask', async () => {
    const { token } = await makeLink({ expiresAt: clock + day })
    clock += day - 1
    await visit(token).expect(200)
    clock += 1
    const { body } = await visit(token).expect(410)
    expect(body.error).toMatchObject({ code: 'link-ended', ended: 'expired' })
    expect(body.error.message).toBe('This link has expired. Ask Dora Signe, who sent it, for a new one.')
    expect(JSON.stringify(body)).not.toContain('C-1')
  })

  it('comes with revoking, at once and for good', async () => {
    const { id, token } = await makeLink()
    const { body: revoked } = await office.secondDesigner.post(`/api/links/${id}/revoke`).expect(200)
    expect(revoked.revokedAt).toBe(clock)
    clock += 60_000
    const again = await office.designer.post(`/api/links/${id}/revoke`).expect(200)
    expect(again.body.revokedAt).toBe(revoked.revokedAt)
    const { body } = await visit(token).expect(410)
    expect(body.error).toMatchObject({ code: 'link-ended', ended: 'revoked' })
    const { body: sheet } = await office.designer.get(`/api/sheets/${sheetId}`).expect(200)
    const events = sheet.events.filter((event: { kind: string }) => event.kind === 'link-revoked')
    expect(events).toEqual([
      {
        kind: 'link-revoked',
        at: revoked.revokedAt,
        by: 'Dan Second',
        text: 'Link for K. Oduya, checker revoked',
      },
    ])
  })

  it.each([
    ['in the past', () => clock - 1],
    ['now', () => clock],
    ['beyond a year', () => clock + longestLinkLife + 1],
  ])('may not be %s', async (_when, expiresAt) => {
    const { body } = await askLink({ expiresAt: expiresAt() }).expect(400)
    expect(body.error.issues[0].path).toBe('expiresAt')
  })
})

describe('making a link twice with the same id', () => {
  it('makes one, whose token replaces the one that was lost', async () => {
    const asked = { id: randomUUID(), expiresAt: clock + day }
    const first = await makeLink(asked)
    const { body } = await askLink(asked).expect(200)
    expect(body.id).toBe(first.id)
    await visit(body.token).expect(200)
    await visit(first.token).expect(404)
    const rows = office.context.database.$client
      .prepare('select count(*) from links where id = ?')
      .pluck()
      .get(asked.id)
    expect(rows).toBe(1)
  })

  it('much later, or after it was revoked, does not bring it back', async () => {
    const asked = { id: randomUUID(), expiresAt: clock + 30 * day }
    const { token } = await makeLink(asked)
    clock += 11 * 60_000
    await askLink(asked).expect(409)
    await visit(token).expect(200)
    const soon = { id: randomUUID(), expiresAt: clock + day }
    await makeLink(soon)
    await office.designer.post(`/api/links/${soon.id}/revoke`).expect(200)
    const { body } = await askLink(soon).expect(409)
    expect(body.error.code).toBe('id-taken')
  })
})

describe('visits', () => {
  it('are counted: after 120 in a minute the next waits', async () => {
    const apart = await startOffice()
    const ask = () => request(apart.app).get(`/api/link/${'A'.repeat(43)}`)
    for (let times = 0; times < 120; times += 1) await ask().expect(404)
    const { body } = await ask().expect(429)
    expect(body.error.code).toBe('too-many-tries')
    await apart.close()
  })
})
