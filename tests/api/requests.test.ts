import { randomUUID } from 'node:crypto'
import { mkdirSync, mkdtempSync, rmSync, writeFileSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import request from 'supertest'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { version } from '#server/version.ts'
import { roundColumn } from '../helpers/apiDocuments.ts'
import { startApi, startOffice, type Office } from '../helpers/api.ts'

let office: Office
let clientFolder: string
beforeAll(async () => {
  clientFolder = mkdtempSync(join(tmpdir(), 'girdwell-client-'))
  mkdirSync(join(clientFolder, 'assets'))
  writeFileSync(join(clientFolder, 'index.html'), '<!doctype html><title>Girdwell</title>')
  writeFileSync(join(clientFolder, 'assets', 'index-abc.js'), 'export {}\n'.repeat(500))
  office = await startOffice({}, {}, clientFolder)
})
afterAll(async () => {
  await office.close()
  rmSync(clientFolder, { recursive: true })
})

describe('a body', () => {
  const post = () => office.designer.post(`/api/jobs/${office.jobId}/sections`)
  const pad = (bytes: number) => ({ id: randomUUID(), title: 'P', document: { pad: 'x'.repeat(bytes) } })

  it('above 2 MB is refused in the shape of every error', async () => {
    const { body } = await post()
      .send(pad(2 * 1024 * 1024))
      .expect(413)
    expect(body.error).toMatchObject({ code: 'too-large', message: expect.stringContaining('2 MB') })
    expect(body.error.requestId).toMatch(/^[0-9a-f-]{36}$/)
  })

  it('just below 2 MB is read', async () => {
    const { body } = await post()
      .send(pad(2 * 1024 * 1024 - 200))
      .expect(400)
    expect(body.error.code).toBe('invalid')
  })

  it('that is not sound JSON is told so', async () => {
    const { body } = await post().set('Content-Type', 'application/json').send('{"id": ').expect(400)
    expect(body.error.code).toBe('invalid')
    expect(body.error.issues[0]).toMatchObject({ path: '(body)', code: 'json' })
  })

  it('of another kind, or none, is told what to send', async () => {
    const text = await post().set('Content-Type', 'text/plain').send('hello').expect(400)
    expect(text.body.error.issues[0]).toMatchObject({ path: '(body)', code: 'required' })
    const none = await post().expect(400)
    expect(none.body.error.issues[0].path).toBe('(body)')
  })

  it('in an unknown encoding is told so, not a fault of ours', async () => {
    const { body } = await post()
      .set({ 'Content-Type': 'application/json', 'Content-Encoding': 'rot13' })
      .send('{}')
      .expect(400)
    expect(body.error.code).toBe('invalid')
  })
})

describe('health', () => {
  it('answers version and database to anyone', async () => {
    const { body } = await request(office.app).get('/api/health').expect(200)
    expect(body).toEqual({ status: 'ok', version, database: 'ok' })
    expect(version).toMatch(/^\d+\.\d+\.\d+/)
  })

  it('is 503 when the database cannot be read', async () => {
    const apart = await startApi()
    apart.context.database.$client.close()
    const { body } = await request(apart.app).get('/api/health').expect(503)
    expect(body.database).toBe('failed')
    await apart.context.verifier.close()
  })
})

describe('lists', () => {
  interface Listed {
    items: { id: string }[]
    nextCursor: string | null
  }
  const readAll = async (ask: (query: string) => Promise<Listed>, limit: number) => {
    const pages: string[][] = []
    let cursor: string | null = ''
    while (cursor !== null && pages.length < 50) {
      const page: Listed = await ask(`?limit=${limit}${cursor === '' ? '' : `&cursor=${cursor}`}`)
      pages.push(page.items.map(({ id }) => id))
      cursor = page.nextCursor
    }
    return pages
  }
  const asDesigner = (path: string) => async (query: string) =>
    (await office.designer.get(path + query).expect(200)).body as Listed

  it('of jobs come in pages, latest changed first, none twice and none left out', async () => {
    const made: string[] = [office.jobId]
    for (let n = 0; n < 54; n += 1) {
      const id = randomUUID()
      await office.designer
        .post('/api/jobs')
        .send({ id, title: `Job ${n}`, number: '' })
        .expect(201)
      made.push(id)
    }
    const usual = await asDesigner('/api/jobs')('')
    expect(usual.items).toHaveLength(50)
    expect(usual.nextCursor).not.toBeNull()
    const pages = await readAll(asDesigner('/api/jobs'), 20)
    expect(pages.map((page) => page.length)).toEqual([20, 20, 15])
    expect(pages.flat().toSorted()).toEqual(made.toSorted())
    expect(pages[2]).toContain(office.jobId)
  })

  it('of sections keep the order in which they were made, also within one millisecond', async () => {
    const apart = await startOffice({ now: () => 1_000 })
    const made: string[] = []
    for (let n = 0; n < 5; n += 1) {
      const asked = { id: randomUUID(), title: `Pier ${n}`, document: roundColumn() }
      await apart.designer.post(`/api/jobs/${apart.jobId}/sections`).send(asked).expect(201)
      made.push(asked.id)
    }
    const ask = async (query: string) =>
      (await apart.viewer.get(`/api/jobs/${apart.jobId}/sections${query}`).expect(200)).body as Listed
    const pages = await readAll(ask, 2)
    expect(pages.map((page) => page.length)).toEqual([2, 2, 1])
    expect(pages.flat()).toEqual(made.toSorted())
    await apart.close()
  })

  it('of people and members go by name', async () => {
    const members = await office.viewer.get(`/api/jobs/${office.jobId}/members?limit=3`).expect(200)
    expect(members.body.items.map((member: { name: string }) => member.name)).toEqual([
      'Cleo Check',
      'Dan Second',
      'Dora Signe',
    ])
    const rest = await office.viewer
      .get(`/api/jobs/${office.jobId}/members?cursor=${members.body.nextCursor}`)
      .expect(200)
    expect(rest.body.items.map((member: { name: string }) => member.name)).toEqual(['Vera View'])
    expect(rest.body.nextCursor).toBeNull()
    const people = await office.administrator.get('/api/users?limit=2').expect(200)
    expect(people.body.items.map((user: { name: string }) => user.name)).toEqual(['Ada Minter', 'Cleo Check'])
    expect(JSON.stringify(people.body)).not.toContain('argon2')
  })

  it.each([
    ['limit=0', 'limit'],
    ['limit=201', 'limit'],
    ['limit=ten', 'limit'],
    ['cursor=nonsense', 'cursor'],
    ['cursor=WzFd', 'cursor'],
  ])('refuse %s', async (query, path) => {
    const { body } = await office.designer.get(`/api/jobs?${query}`).expect(400)
    expect(body.error.issues[0].path).toBe(path)
  })
})

describe('addresses', () => {
  it('under /api that are none are 404 in our shape, for anyone, by any method', async () => {
    for (const ask of [office.nobody.get, office.nobody.post, office.designer.put]) {
      const { body } = await ask('/api/nothing/here').expect(404)
      expect(body.error.code).toBe('not-found')
    }
  })

  it('of the page all answer the page, not to be kept', async () => {
    for (const path of ['/', '/jobs', `/sections/${randomUUID()}`, '/sign-in']) {
      const { text, headers } = await request(office.app).get(path).expect(200)
      expect(text).toContain('<title>Girdwell</title>')
      expect(headers['cache-control']).toBe('no-cache')
    }
  })

  it('of a link are kept by nobody', async () => {
    const { headers } = await request(office.app)
      .get(`/link/${'A'.repeat(43)}`)
      .expect(200)
    expect(headers['cache-control']).toBe('no-store')
    expect(headers['x-robots-tag']).toContain('noindex')
    expect(headers['referrer-policy']).toBe('no-referrer')
  })

  it('of assets are kept for good, compressed, and a missing one is not the page', async () => {
    const { headers } = await request(office.app)
      .get('/assets/index-abc.js')
      .set('Accept-Encoding', 'gzip')
      .expect(200)
    expect(headers['cache-control']).toBe('public, max-age=31536000, immutable')
    expect(headers['content-encoding']).toBe('gzip')
    const missing = await request(office.app).get('/assets/index-old.js').expect(404)
    expect(missing.body.error.code).toBe('not-found')
    for (const way of ['/assets/../../package.json', '/assets/..%2f..%2fpackage.json']) {
      await request(office.app).get(way).expect(400)
    }
  })

  it('of the page answer nothing when no page was built', async () => {
    const apart = await startApi()
    await request(apart.app).get('/').expect(404)
    await request(apart.app).get('/api/health').expect(200)
    await apart.close()
  })
})

describe('headers', () => {
  it('let the page load its own things only', async () => {
    const { headers } = await request(office.app).get('/').expect(200)
    const policy = Object.fromEntries(
      headers['content-security-policy'].split(';').map((rule) => {
        const [name, ...values] = rule.trim().split(' ')
        return [name, values.join(' ')]
      }),
    )
    expect(policy).toMatchObject({
      'default-src': "'self'",
      'script-src': "'self'",
      'worker-src': "'self'",
      'connect-src': "'self'",
      'style-src': "'self' 'unsafe-inline'",
      'font-src': "'self' data:",
      'img-src': "'self' data: blob:",
      'object-src': "'none'",
      'frame-ancestors': "'none'",
    })
    // On plain http it would turn every request to a port that answers nothing.
    expect(policy).not.toHaveProperty('upgrade-insecure-requests')
    expect(headers['strict-transport-security']).toBeUndefined()
    expect(headers['x-content-type-options']).toBe('nosniff')
    expect(headers['x-powered-by']).toBeUndefined()
  })

  it('keep what the API answers out of every cache', async () => {
    const { headers } = await office.designer.get('/api/jobs').expect(200)
    expect(headers['cache-control']).toBe('no-store')
    expect(headers.etag).toBeUndefined()
  })
})

describe('a fault of ours', () => {
  it('is told with its request number and without its cause', async () => {
    const apart = await startOffice()
    apart.context.database.$client.exec('drop table sheet_events; drop table links')
    const { body, headers } = await apart.designer.post(`/api/links/${randomUUID()}/revoke`).expect(500)
    expect(body.error.code).toBe('internal')
    expect(body.error.message).not.toMatch(/table|links|sqlite/i)
    expect(body.error.requestId).toBe(headers['x-request-id'])
    await apart.close()
  })
})
