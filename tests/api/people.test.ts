import { randomUUID } from 'node:crypto'
import { afterEach, beforeEach, describe, expect, it } from 'vitest'
import { startOffice, type Office } from '../helpers/api.ts'

let office: Office
beforeEach(async () => {
  office = await startOffice()
})
afterEach(() => office.close())

const newcomer = (change = {}) => ({
  id: randomUUID(),
  name: 'Nils Newe',
  initials: 'NN',
  email: 'nils@columns.test',
  password: 'ten characters',
  role: 'member',
  ...change,
})
const invite = (asked: object) => office.administrator.post('/api/users').send(asked)
const signIn = (email: string, password: string) =>
  office.nobody.post('/api/sign-in').send({ email, password })

describe('inviting', () => {
  it('makes someone who can sign in at once', async () => {
    const { body } = await invite(newcomer()).expect(201)
    expect(body).toMatchObject({ name: 'Nils Newe', email: 'nils@columns.test', active: true })
    expect(body).not.toHaveProperty('password')
    expect(body).not.toHaveProperty('passwordHash')
    await signIn('nils@columns.test', 'ten characters').expect(200)
  })

  it('asked twice with the same id makes one', async () => {
    const asked = newcomer()
    await invite(asked).expect(201)
    await invite(asked).expect(200)
    const { body } = await invite({ ...asked, name: 'Someone Else' }).expect(409)
    expect(body.error.code).toBe('id-taken')
  })

  it('refuses an address that someone has, a short password, and an unknown role', async () => {
    const taken = await invite(newcomer({ email: office.viewer.email.toUpperCase() })).expect(400)
    expect(taken.body.error.issues).toEqual([
      { path: 'email', code: 'taken', message: 'Someone in this office has this address already' },
    ])
    const { body } = await invite(newcomer({ password: 'nine char', role: 'owner', email: 'x' })).expect(400)
    expect(body.error.issues.map((issue: { path: string }) => issue.path).sort()).toEqual([
      'email',
      'password',
      'role',
    ])
  })
})

describe('an administrator', () => {
  it('closes and opens an account', async () => {
    const { administrator, checker } = office
    await administrator.patch(`/api/users/${checker.id}`).send({ active: false }).expect(200)
    await checker.get('/api/jobs').expect(401)
    await administrator.patch(`/api/users/${checker.id}`).send({ active: true }).expect(200)
    await checker.get('/api/jobs').expect(401) // signed out, not locked out for a while
  })

  it('gives a new password, which signs the person out', async () => {
    const { administrator, checker } = office
    const password = 'quite another one'
    await administrator.patch(`/api/users/${checker.id}`).send({ password }).expect(200)
    await checker.get('/api/session').expect(401)
    await signIn(checker.email, password).expect(200)
  })

  it('takes effect on the next request when made or unmade', async () => {
    const { administrator, checker } = office
    await checker.get('/api/users').expect(403)
    await administrator.patch(`/api/users/${checker.id}`).send({ role: 'administrator' }).expect(200)
    await checker.get('/api/users').expect(200)
    await administrator.patch(`/api/users/${checker.id}`).send({ role: 'member' }).expect(200)
    await checker.get('/api/users').expect(403)
  })

  it('cannot be the last to go', async () => {
    const { administrator } = office
    const path = `/api/users/${administrator.id}`
    const demoted = await administrator.patch(path).send({ role: 'member' }).expect(400)
    expect(demoted.body.error.issues[0]).toMatchObject({ path: 'role', code: 'last-administrator' })
    const closed = await administrator.patch(path).send({ active: false }).expect(400)
    expect(closed.body.error.issues[0].path).toBe('active')
    await administrator.get('/api/users').expect(200)
  })

  it('sees every job and edits none unless made its designer', async () => {
    const { administrator, jobId } = office
    const { body } = await administrator.get(`/api/jobs/${jobId}`).expect(200)
    expect(body.role).toBeNull()
    const members = `/api/jobs/${jobId}/members/${administrator.id}`
    await administrator.put(members).send({ role: 'designer' }).expect(200)
    const again = await administrator.get(`/api/jobs/${jobId}`).expect(200)
    expect(again.body.role).toBe('designer')
  })

  it('hears that a person to be changed does not exist', async () => {
    await office.administrator.patch(`/api/users/${randomUUID()}`).send({ active: false }).expect(404)
  })
})

describe('members', () => {
  it('lose the job when they are dismissed', async () => {
    const { administrator, checker, jobId } = office
    await checker.get(`/api/jobs/${jobId}`).expect(200)
    const path = `/api/jobs/${jobId}/members/${checker.id}`
    await administrator.delete(path).expect(204)
    await checker.get(`/api/jobs/${jobId}`).expect(404)
    await administrator.delete(path).expect(404)
  })

  it('must be people of the office with an open account, in a role that exists', async () => {
    const { administrator, checker, jobId } = office
    const put = (userId: string, role: string) =>
      administrator.put(`/api/jobs/${jobId}/members/${userId}`).send({ role })
    await put(randomUUID(), 'viewer').expect(404)
    await put(checker.id, 'owner').expect(400)
    await administrator.patch(`/api/users/${checker.id}`).send({ active: false }).expect(200)
    const { body } = await put(checker.id, 'viewer').expect(400)
    expect(body.error.issues[0].code).toBe('inactive')
  })
})

describe('a job', () => {
  it('asked twice with the same id is one, and its maker is its designer', async () => {
    const asked = { id: randomUUID(), title: 'Two Rivers', number: 'TR-7' }
    const { body } = await office.stranger.post('/api/jobs').send(asked).expect(201)
    expect(body).toMatchObject({ ...asked, revision: 1, role: 'designer', sectionCount: 0 })
    await office.stranger.post('/api/jobs').send(asked).expect(200)
    await office.stranger
      .post('/api/jobs')
      .send({ ...asked, number: 'TR-8' })
      .expect(409)
    await office.designer.post('/api/jobs').send(asked).expect(409)
  })

  it('saved by two at once tells the second, with what is stored', async () => {
    const path = `/api/jobs/${office.jobId}`
    const write = (title: string) => ({ title, number: 'TC-1' })
    await office.designer.patch(path).set('If-Match', '"1"').send(write('First')).expect(200)
    const { body } = await office.administrator
      .patch(path)
      .set('If-Match', '"1"')
      .send(write('Second'))
      .expect(409)
    expect(body.error.code).toBe('conflict')
    expect(body.error.stored).toMatchObject({ title: 'First', revision: 2 })
    await office.designer.patch(path).send(write('Third')).expect(400)
  })
})

describe('an account of one’s own', () => {
  it('changes name and initials, and nothing else', async () => {
    const { body } = await office.viewer
      .patch('/api/account')
      .send({ name: ' Vera Vantage ', initials: 'VV' })
      .expect(200)
    expect(body).toMatchObject({ name: 'Vera Vantage', initials: 'VV', role: 'member' })
    const more = { name: 'V', initials: 'V', role: 'administrator' }
    const { body: refused } = await office.viewer.patch('/api/account').send(more).expect(400)
    expect(refused.error.issues[0].path).toBe('role')
  })
})
