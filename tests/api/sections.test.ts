import { randomUUID } from 'node:crypto'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import type { StoredSection } from '#shared/api.ts'
import { roundColumn } from '../helpers/apiDocuments.ts'
import { startOffice, type Office } from '../helpers/api.ts'

let office: Office
beforeAll(async () => {
  office = await startOffice()
})
afterAll(() => office.close())

const sections = () => `/api/jobs/${office.jobId}/sections`

async function createSection(title = 'Pier 3'): Promise<StoredSection> {
  const asked = { id: randomUUID(), title, document: roundColumn() }
  const { body } = await office.designer.post(sections()).send(asked).expect(201)
  return body
}

/** A document with one field put wrong. */
function spoil(change: (document: ReturnType<typeof roundColumn>) => void) {
  const document = roundColumn()
  change(document)
  return document
}

describe('creating a section', () => {
  it('stores the document with its defaults filled in', async () => {
    const section = await createSection()
    const { body } = await office.viewer.get(`/api/sections/${section.id}`).expect(200)
    expect(body).toMatchObject({
      title: 'Pier 3',
      revision: 1,
      changedBy: 'Dora Signe',
      sheetCount: 0,
      job: { id: office.jobId, role: 'viewer' },
    })
    expect(body.document.section.voids).toEqual([])
    expect(body.document.analysis).toMatchObject({ angle: 0, points: 200, direction: 'curvature' })
    // analysis-document contract: 5000 sqrt(f'co) MPa for f'co = 40 MPa, to nine figures.
    expect(body.document.materials.concrete.modulus).toBeCloseTo(31622.7766, 4)
  })

  it('asked twice with the same id makes one', async () => {
    const asked = { id: randomUUID(), title: 'Pier 5', document: roundColumn() }
    await office.designer.post(sections()).send(asked).expect(201)
    const { body } = await office.designer.post(sections()).send(asked).expect(200)
    expect(body).toMatchObject({ id: asked.id, revision: 1 })
    // The retry may come late, after someone went on with the section: it gets what is stored now.
    const write = { title: 'Pier 5, wider', document: roundColumn(90) }
    await office.secondDesigner
      .put(`/api/sections/${asked.id}`)
      .set('If-Match', '"1"')
      .send(write)
      .expect(200)
    const late = await office.designer.post(sections()).send(asked).expect(200)
    expect(late.body).toMatchObject({ title: 'Pier 5, wider', revision: 2 })
  })

  it('refuses an id that belongs to something else', async () => {
    const { id } = await createSection()
    const other = { id, title: 'Pier 3', document: roundColumn(120) }
    const { body } = await office.designer.post(sections()).send(other).expect(409)
    expect(body.error.code).toBe('id-taken')
    const same = { id, title: 'Pier 3', document: roundColumn() }
    await office.secondDesigner.post(sections()).send(same).expect(409)
    const jobId = randomUUID()
    await office.designer.post('/api/jobs').send({ id: jobId, title: 'Other', number: '' }).expect(201)
    await office.designer.post(`/api/jobs/${jobId}/sections`).send(same).expect(409)
  })
})

describe('issues', () => {
  it.each([
    ['section.spirals[0].pitch', spoil((d) => (d.section.spirals[0].pitch = -80))],
    ['section.spirals[0].steel', spoil((d) => (d.section.spirals[0].steel = 'X'))],
    ['section.outline.diameter', spoil((d) => (d.section.outline.diameter = Number('1e9')))],
    ['materials.concrete.strength', spoil((d) => Object.assign(d.materials.concrete, { strength: '40' }))],
    ['section.extra', spoil((d) => Object.assign(d.section, { extra: 1 }))],
  ])("of a document stand at the document's own path: %s", async (path, document) => {
    const asked = { id: randomUUID(), title: 'Pier 3', document }
    const { body } = await office.designer.post(sections()).send(asked).expect(400)
    expect(body.error.code).toBe('invalid')
    expect(body.error.issues.map((issue: { path: string }) => issue.path)).toContain(path)
    expect(body.error.issues[0].message).not.toBe('')
    expect(body.error.requestId).toMatch(/^[0-9a-f-]{36}$/)
  })

  it('of the payload stand at its field', async () => {
    const asked = { id: 'no id', title: ' ', document: roundColumn(), more: true }
    const { body } = await office.designer.post(sections()).send(asked).expect(400)
    const found = body.error.issues.map((issue: { path: string }) => issue.path)
    expect(found.sort()).toEqual(['id', 'more', 'title'])
  })

  it('come back for what is no document at all', async () => {
    for (const document of [undefined, null, 'text', [], 7]) {
      const asked = { id: randomUUID(), title: 'Pier 3', document }
      const { body } = await office.designer.post(sections()).send(asked).expect(400)
      expect(body.error.issues.length).toBeGreaterThan(0)
    }
  })

  it('leave the stored section as it was', async () => {
    const section = await createSection()
    const document = spoil((d) => (d.section.spirals[0].pitch = 4))
    await office.designer
      .put(`/api/sections/${section.id}`)
      .set('If-Match', '"1"')
      .send({ title: 'Spoilt', document })
      .expect(400)
    const { body } = await office.designer.get(`/api/sections/${section.id}`).expect(200)
    expect(body).toEqual(section)
  })
})

describe('saving a section', () => {
  it('raises its revision and names who did it', async () => {
    const { id } = await createSection()
    const write = { title: 'Pier 3', document: roundColumn(60) }
    const { body } = await office.secondDesigner
      .put(`/api/sections/${id}`)
      .set('If-Match', '"1"')
      .send(write)
      .expect(200)
    expect(body).toMatchObject({ revision: 2, changedBy: 'Dan Second' })
    expect(body.document.section.spirals[0].pitch).toBe(60)
  })

  it('tells the second of two designers, hands over what is stored, and overwrites nothing', async () => {
    const { id } = await createSection()
    const path = `/api/sections/${id}`
    const first = { title: 'Pier 3', document: roundColumn(60) }
    const second = { title: 'Pier 3', document: roundColumn(100) }
    await office.designer.put(path).set('If-Match', '"1"').send(first).expect(200)
    const { body } = await office.secondDesigner.put(path).set('If-Match', '"1"').send(second).expect(409)
    expect(body.error.code).toBe('conflict')
    expect(body.error.stored).toMatchObject({ id, revision: 2, changedBy: 'Dora Signe' })
    expect(body.error.stored.document.section.spirals[0].pitch).toBe(60)
    // Having read the stored one, the second may go on from it.
    await office.secondDesigner.put(path).set('If-Match', '"2"').send(second).expect(200)
  })

  it('again after a lost answer is no conflict and no new revision', async () => {
    const { id } = await createSection()
    const ask = () =>
      office.designer
        .put(`/api/sections/${id}`)
        .set('If-Match', '"1"')
        .send({ title: 'Pier 3', document: roundColumn(60) })
    const first = await ask().expect(200)
    const again = await ask().expect(200)
    expect(again.body).toEqual(first.body)
    expect(again.body.revision).toBe(2)
  })

  it.each([['nothing'], ['*'], ['"one"'], ['"-1"']])('with If-Match %s is refused', async (header) => {
    const { id } = await createSection()
    const asking = office.designer.put(`/api/sections/${id}`)
    if (header !== 'nothing') asking.set('If-Match', header)
    const { body } = await asking.send({ title: 'Pier 3', document: roundColumn(60) }).expect(400)
    expect(body.error.issues[0].path).toBe('If-Match')
  })

  it('moves its job to the top of the list', async () => {
    const { id } = await createSection()
    await office.designer.post('/api/jobs').send({ id: randomUUID(), title: 'Newer', number: '' }).expect(201)
    await office.designer
      .put(`/api/sections/${id}`)
      .set('If-Match', '"1"')
      .send({ title: 'Pier 3', document: roundColumn(60) })
      .expect(200)
    const { body } = await office.designer.get('/api/jobs').expect(200)
    expect(body.items[0].id).toBe(office.jobId)
    expect(body.items[0].sectionCount).toBeGreaterThan(0)
  })
})
