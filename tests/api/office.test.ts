import { afterEach, describe, expect, it } from 'vitest'
import { readDocument } from '#shared/document/readDocument.ts'
import type { Config } from '#server/config.ts'
import { demoAccounts, demoPassword } from '#server/db/seed/demoAccounts.ts'
import { prepareOffice } from '#server/services/office.ts'
import { StartError } from '#server/startError.ts'
import { startApi, type Api } from '../helpers/api.ts'

let api: Api
afterEach(() => api.close())

const start = async (settings: Partial<Config> = {}) => {
  api = await startApi({}, settings)
  return prepareOffice(api.context)
}
const signIn = (email: string, password: string) => api.nobody.post('/api/sign-in').send({ email, password })
const [lead, designer] = demoAccounts

describe('a new database', () => {
  it('becomes the demo office, whose people can all sign in', async () => {
    const news = await start()
    expect(news.newAdministrator).toBeNull()
    expect(news.demo.accounts.map(({ words }) => words)).toEqual([
      'administrator',
      'designer',
      'designer',
      'checker',
      'viewer',
    ])
    expect(demoPassword.length).toBeGreaterThanOrEqual(10)
    for (const { email } of news.demo.accounts) await signIn(email, demoPassword).expect(200)
  })

  it('holds demo jobs with sections that can be opened, each person in the role that is told', async () => {
    await start()
    const { headers } = await signIn(designer.email, demoPassword).expect(200)
    const cookie = headers['set-cookie'][0].split(';')[0]
    const ask = async (path: string) => (await api.nobody.get(path).set('Cookie', cookie).expect(200)).body
    const jobs = await ask('/api/jobs')
    expect(jobs.items[0]).toMatchObject({ title: 'Tern Creek Crossing', role: 'designer' })
    for (const job of jobs.items) {
      const sections = await ask(`/api/jobs/${job.id}/sections`)
      expect(sections.items).toHaveLength(job.sectionCount)
      expect(sections.items.length).toBeGreaterThan(0)
      for (const { id } of sections.items) {
        const { document } = await ask(`/api/sections/${id}`)
        expect(readDocument(document)).toEqual({ status: 'read', document })
      }
      const members = await ask(`/api/jobs/${job.id}/members`)
      const roles = members.items.map((member: { email: string; role: string }) => [
        member.email,
        member.role,
      ])
      const told = demoAccounts.filter(({ jobRole }) => jobRole !== null)
      expect(roles.sort()).toEqual(told.map(({ email, jobRole }) => [email, jobRole]).sort())
    }
  })

  it('stays without a demo when that is asked for, and gets a first administrator', async () => {
    const news = await start({ demo: false, adminEmail: 'lead@office.test' })
    expect(news.demo.accounts).toEqual([])
    expect(news.newAdministrator?.email).toBe('lead@office.test')
    const { body } = await signIn('lead@office.test', news.newAdministrator?.password ?? '').expect(200)
    expect(body.role).toBe('administrator')
    await signIn(lead.email, demoPassword).expect(401)
    // The next start finds the administrator and tells no password.
    expect((await prepareOffice(api.context)).newAdministrator).toBeNull()
  })

  it('without a demo and without an administrator does not start', async () => {
    await expect(start({ demo: false })).rejects.toThrow(/GIRDWELL_ADMIN_EMAIL/)
    await expect(prepareOffice(api.context)).rejects.toBeInstanceOf(StartError)
  })
})

describe('demo accounts', () => {
  const restart = (settings: Partial<Config>) =>
    prepareOffice({ ...api.context, config: { ...api.context.config, ...settings } })

  it('keep the server to this machine', async () => {
    await start()
    await expect(restart({ host: '0.0.0.0' })).rejects.toThrow(/HOST 0\.0\.0\.0 .*GIRDWELL_DEMO=off/)
    await expect(restart({ host: 'office.test' })).rejects.toBeInstanceOf(StartError)
    await restart({ host: 'localhost' })
  })

  it('are closed and signed out by leaving the demo', async () => {
    await start()
    const { headers } = await signIn(designer.email, demoPassword).expect(200)
    const cookie = headers['set-cookie'][0].split(';')[0]
    await restart({ host: '0.0.0.0', demo: false, adminEmail: 'lead@office.test' })
    await api.nobody.get('/api/session').set('Cookie', cookie).expect(401)
    await signIn(designer.email, demoPassword).expect(401)
    await restart({ host: '0.0.0.0' })
  })

  it('are not closed when there is nobody to take over', async () => {
    await start()
    await expect(restart({ demo: false })).rejects.toThrow(/GIRDWELL_ADMIN_EMAIL/)
    await signIn(lead.email, demoPassword).expect(200)
  })

  it('with a password of their own are demo accounts no more', async () => {
    await start()
    for (const { email } of demoAccounts) {
      const { headers } = await signIn(email, demoPassword).expect(200)
      const cookie = headers['set-cookie'][0].split(';')[0]
      await expect(restart({ host: '0.0.0.0' })).rejects.toThrow()
      await api.nobody
        .post('/api/account/password')
        .set('Cookie', cookie)
        .send({ current: demoPassword, next: 'a password of my own' })
        .expect(204)
    }
    expect((await restart({ host: '0.0.0.0' })).demo.accounts).toEqual([])
  })

  it('are opened again only with a new password', async () => {
    await start()
    const news = await restart({ demo: false, adminEmail: 'lead@office.test' })
    const { headers } = await signIn('lead@office.test', news.newAdministrator?.password ?? '').expect(200)
    const cookie = headers['set-cookie'][0].split(';')[0]
    const users = await api.nobody.get('/api/users').set('Cookie', cookie).expect(200)
    const { id } = users.body.items.find((user: { email: string }) => user.email === designer.email)
    const patch = (change: object) => api.nobody.patch(`/api/users/${id}`).set('Cookie', cookie).send(change)
    const { body } = await patch({ active: true }).expect(400)
    expect(body.error.issues[0].path).toBe('password')
    await patch({ active: true, password: 'a password of her own' }).expect(200)
    await restart({ host: '0.0.0.0' })
  })
})
