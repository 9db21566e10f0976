import { createHash } from 'node:crypto'
import request from 'supertest'
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest'
import * as passwords from '#server/auth/passwords.ts'
import { host, origin, password, startApi, type Api, type Person } from '../helpers/api.ts'

let api: Api
let rosa: Person
beforeEach(async () => {
  api = await startApi()
  rosa = await api.addPerson('Rosa Marchetti')
})
afterEach(async () => {
  vi.restoreAllMocks()
  await api.close()
})

const signIn = (email: string, given: string) =>
  api.nobody.post('/api/sign-in').send({ email, password: given })
const sessionRows = () =>
  api.context.database.$client.prepare('select id, user_id, expires_at from sign_in_sessions').all() as {
    id: string
    user_id: string
    expires_at: number
  }[]

describe('sign-in', () => {
  it('answers who signed in, and nothing of the password', async () => {
    const { body } = await signIn('  ROSA.marchetti@columns.test ', password).expect(200)
    expect(body).toEqual({
      id: rosa.id,
      name: 'Rosa Marchetti',
      initials: 'RM',
      email: 'rosa.marchetti@columns.test',
      role: 'member',
      active: true,
    })
  })

  it('sets a cookie that scripts cannot read and other sites do not send', async () => {
    const { headers } = await signIn(rosa.email, password).expect(200)
    const [cookie] = headers['set-cookie']
    expect(cookie).toMatch(/^girdwell_session=[\w-]{43};/)
    expect(cookie).toContain('HttpOnly')
    expect(cookie).toContain('SameSite=Lax')
    expect(cookie).toContain('Path=/')
    expect(cookie).not.toContain('Secure')
  })

  it('marks the cookie Secure and sends HSTS behind TLS', async () => {
    const publicUrl = new URL('https://columns.test')
    const behindTls = await startApi({}, { publicUrl })
    await behindTls.addPerson('Rosa Marchetti')
    const { headers } = await request(behindTls.app)
      .post('/api/sign-in')
      .set({ Host: 'inner:4780', Origin: publicUrl.origin })
      .send({ email: 'rosa.marchetti@columns.test', password })
      .expect(200)
    expect(headers['set-cookie'][0]).toContain('Secure')
    expect(headers['strict-transport-security']).toMatch(/^max-age=/)
    expect(headers['content-security-policy']).toContain('upgrade-insecure-requests')
    await behindTls.close()
  })

  it("stores the token's SHA-256 only, with an expiry in seconds", async () => {
    const { headers } = await signIn(rosa.email, password).expect(200)
    const [, token] = /^girdwell_session=([^;]+)/.exec(headers['set-cookie'][0]) ?? []
    const hash = createHash('sha256').update(token).digest('hex')
    const row = sessionRows().find(({ id }) => id === hash)
    expect(row).toBeDefined()
    const fortnight = Date.now() / 1000 + 14 * 24 * 3600
    expect(Math.abs((row?.expires_at ?? 0) - fortnight)).toBeLessThan(60)
    expect(JSON.stringify(sessionRows())).not.toContain(token)
  })

  it('says the same of a wrong password, an unknown address and a closed account', async () => {
    const wrong = await signIn(rosa.email, 'not the password').expect(401)
    const unknown = await signIn('nobody@columns.test', password).expect(401)
    api.context.database.$client.prepare('update users set active = 0').run()
    const closed = await signIn(rosa.email, password).expect(401)
    const told = [wrong, unknown, closed].map(({ body }) => [body.error.code, body.error.message])
    expect(told[0][0]).toBe('wrong-credentials')
    expect(told[1]).toEqual(told[0])
    expect(told[2]).toEqual(told[0])
    expect(wrong.headers['set-cookie']).toBeUndefined()
  })

  it('does the same work for an unknown address as for a known one', async () => {
    const dummy = vi.spyOn(passwords, 'verifyAgainstNobody')
    const time = async (email: string) => {
      const startedAt = performance.now()
      await signIn(email, 'not the password').expect(401)
      return performance.now() - startedAt
    }
    await time('first@columns.test') // makes the dummy hash
    const known = Math.min(await time(rosa.email), await time(rosa.email))
    const unknown = Math.min(await time('second@columns.test'), await time('third@columns.test'))
    expect(dummy).toHaveBeenCalledTimes(3)
    // argon2id takes some 50 ms of it; without the dummy the answer would come in a few.
    expect(unknown).toBeGreaterThan(known / 3)
  })

  it('names the field that is missing', async () => {
    const { body } = await api.nobody.post('/api/sign-in').send({ email: 'no address' }).expect(400)
    expect(body.error.code).toBe('invalid')
    expect(body.error.issues.map((issue: { path: string }) => issue.path)).toEqual(['email', 'password'])
  })

  it('stops guessing at one account after ten failures, and lets others in meanwhile', async () => {
    const tomas = await api.addPerson('Tomas Ekholm')
    for (let tries = 0; tries < 10; tries += 1) await signIn(rosa.email, `guess ${tries}`).expect(401)
    const { body } = await signIn(rosa.email, password).expect(429)
    expect(body.error.code).toBe('too-many-tries')
    expect(body.error.message).toMatch(/15 minutes/)
    await signIn(rosa.email.toUpperCase(), password).expect(429)
    await signIn(tomas.email, password).expect(200)
  })

  it('does not count what succeeds', async () => {
    for (let times = 0; times < 12; times += 1) await signIn(rosa.email, password).expect(200)
  })
})

describe('a session', () => {
  it('tells who is signed in, and 401 to who is not', async () => {
    const { body } = await rosa.get('/api/session').expect(200)
    expect(body.email).toBe(rosa.email)
    const nobody = await api.nobody.get('/api/session').expect(401)
    expect(nobody.body.error.code).toBe('not-signed-in')
  })

  it('ends with sign-out, which clears the cookie', async () => {
    const { headers } = await rosa.post('/api/sign-out').expect(204)
    expect(headers['set-cookie'][0]).toMatch(/^girdwell_session=;.*Max-Age=0/)
    await rosa.get('/api/session').expect(401)
    expect(sessionRows()).toEqual([])
    await api.nobody.post('/api/sign-out').expect(204)
  })

  it('is renewed in its second half, with the same token', async () => {
    const soon = Math.floor(Date.now() / 1000) + 3 * 24 * 3600
    api.context.database.$client.prepare('update sign_in_sessions set expires_at = ?').run(soon)
    const { headers } = await rosa.get('/api/session').expect(200)
    expect(headers['set-cookie'][0]).toContain(rosa.cookie)
    expect(sessionRows()[0].expires_at).toBeGreaterThan(soon + 10 * 24 * 3600)
    const again = await rosa.get('/api/session').expect(200)
    expect(again.headers['set-cookie']).toBeUndefined()
  })

  it('that has expired is none', async () => {
    api.context.database.$client
      .prepare('update sign_in_sessions set expires_at = ?')
      .run(Math.floor(Date.now() / 1000) - 1)
    await rosa.get('/api/session').expect(401)
    expect(sessionRows()).toEqual([])
  })

  it('of a person whose account is closed ends at once', async () => {
    const ada = await api.addPerson('Ada Minter', 'administrator')
    await ada.patch(`/api/users/${rosa.id}`).send({ active: false }).expect(200)
    await rosa.get('/api/session').expect(401)
    expect(sessionRows().map((row) => row.user_id)).toEqual([ada.id])
    // And a session that was made behind the administrator's back does not help either.
    const [cookie] = (await api.context.sessions.open(rosa.id)).split(';')
    await request(api.app).get('/api/session').set({ Host: host, Cookie: cookie }).expect(401)
  })

  it('elsewhere ends when the password changes; this one goes on under a new token', async () => {
    const elsewhere = await signIn(rosa.email, password).expect(200)
    const next = 'a new and longer password'
    const wrong = await rosa.post('/api/account/password').send({ current: 'x', next }).expect(400)
    expect(wrong.body.error.issues[0].path).toBe('current')
    const short = await rosa
      .post('/api/account/password')
      .send({ current: password, next: 'short' })
      .expect(400)
    expect(short.body.error.issues[0].path).toBe('next')

    const { headers } = await rosa.post('/api/account/password').send({ current: password, next }).expect(204)
    const ask = (cookie: string) =>
      request(api.app)
        .get('/api/session')
        .set({ Host: host, Cookie: cookie.split(';')[0] })
    await ask(elsewhere.headers['set-cookie'][0]).expect(401)
    await ask(rosa.cookie).expect(401)
    await ask(headers['set-cookie'][0]).expect(200)
    await signIn(rosa.email, password).expect(401)
    await signIn(rosa.email, next).expect(200)
  })
})

describe('the origin of a request', () => {
  const post = (headers: Record<string, string>) =>
    request(api.app)
      .post('/api/sign-out')
      .set({ Host: host, Cookie: rosa.cookie, ...headers })

  it.each([
    ['another page', { Origin: 'http://elsewhere.test' }],
    ['our host on another port', { Origin: `${origin}:8080` }],
    ['a page that hides it', { Origin: 'null' }],
    ['a page whose name begins with ours', { Origin: `${origin}.elsewhere.test` }],
    ['nowhere', {}],
  ])('from %s is refused where something would change', async (_name, headers) => {
    const { body } = await post(headers as Record<string, string>).expect(403)
    expect(body.error.code).toBe('foreign-origin')
    await rosa.get('/api/session').expect(200)
  })

  it('is not asked for by reading', async () => {
    await request(api.app).get('/api/session').set({ Host: host, Cookie: rosa.cookie }).expect(200)
  })

  it('must be the public address where one is configured', async () => {
    const behind = await startApi({}, { publicUrl: new URL('https://columns.office.test/') })
    const ask = (from: string) =>
      request(behind.app).post('/api/sign-out').set({ Host: 'inner:4780', Origin: from })
    await ask('https://columns.office.test').expect(204)
    await ask('http://columns.office.test').expect(403)
    await ask('http://inner:4780').expect(403)
    await behind.close()
  })
})
