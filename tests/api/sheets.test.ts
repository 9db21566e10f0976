import { randomUUID } from 'node:crypto'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import type { Seen, StoredSheet } from '#shared/api.ts'
import type { MomentCurvatureResult } from '#shared/document/analysisResult.ts'
import { toSeen } from '#shared/document/seenFigures.ts'
import { createVerifier } from '#server/services/verification.ts'
import { analyse } from '#workers/solver/analyse.ts'
import { roundColumn } from '../helpers/apiDocuments.ts'
import { startOffice, type Office } from '../helpers/api.ts'

let office: Office
let sectionId: string
/** What a browser would see: the same solver, here in this process. */
let own: MomentCurvatureResult
beforeAll(async () => {
  office = await startOffice()
  sectionId = await createSection(office)
  own = solve()
})
afterAll(() => office.close())

function solve(pitch = 80): MomentCurvatureResult {
  const reply = analyse(roundColumn(pitch))
  if (reply.status !== 'solved') throw new Error(JSON.stringify(reply))
  return reply.result
}

async function createSection(where: Office): Promise<string> {
  const asked = { id: randomUUID(), title: 'Pier 3', document: roundColumn() }
  await where.designer.post(`/api/jobs/${where.jobId}/sections`).send(asked).expect(201)
  return asked.id
}

const ask = (change: Partial<{ id: string; number: string; document: unknown; seen: Seen }> = {}) =>
  office.designer
    .post(`/api/sections/${sectionId}/sheets`)
    .send({ id: randomUUID(), number: randomUUID(), document: roundColumn(), seen: toSeen(own), ...change })

const countSheets = () => office.context.database.$client.prepare('select count(*) from sheets').pluck().get()
/** What a run takes is the one thing in which two runs of the same solver may differ. */
const timeless = (result: MomentCurvatureResult) => ({
  ...result,
  diagnostics: { ...result.diagnostics, milliseconds: 0 },
})

describe('saving a sheet', () => {
  it("stores the server's own result, which is the solver's", async () => {
    const { body } = await ask({ number: 'C-101' }).expect(201)
    const sheet = body as StoredSheet
    expect(sheet).toMatchObject({
      sectionId,
      number: 'C-101',
      revision: 'A',
      sectionTitle: 'Pier 3',
      digest: own.digest,
      solverVersion: own.solver.version,
      savedBy: { name: 'Dora Signe', initials: 'DS' },
      supersededBy: null,
      job: { id: office.jobId, title: 'Tern Creek Crossing', number: 'TC-1', role: 'designer' },
    })
    expect(timeless(sheet.result)).toEqual(timeless(JSON.parse(JSON.stringify(own))))
    expect(sheet.document).toEqual(sheet.result.document)
    expect(sheet.events.map(({ kind, by }) => [kind, by])).toEqual([['saved', 'Dora Signe']])
    const read = await office.checker.get(`/api/sheets/${sheet.id}`).expect(200)
    expect(read.body).toEqual({ ...sheet, job: { ...sheet.job, role: 'checker' } })
  })

  it('accepts figures that differ in the last digits only, and stores its own', async () => {
    const seen = { ...toSeen(own) }
    seen.greatestMoment = (seen.greatestMoment ?? 0) * (1 + 5e-7)
    const { body } = await ask({ seen }).expect(201)
    expect(Math.max(...body.result.points.moment)).toBe(toSeen(own).greatestMoment)
  })

  it.each(['ultimateCurvature', 'ultimateMoment', 'greatestMoment'] as const)(
    'refuses a forged %s and names it',
    async (figure) => {
      const before = countSheets()
      const seen = { ...toSeen(own), [figure]: (toSeen(own)[figure] ?? 0) * 1.00001 }
      const { body } = await ask({ seen }).expect(422)
      expect(body.error.code).toBe('verification-failed')
      expect(body.error.issues).toHaveLength(1)
      expect(body.error.issues[0]).toMatchObject({ path: `seen.${figure}`, code: 'differs' })
      expect(body.error.issues[0].found).not.toBe(body.error.issues[0].allowed)
      expect(countSheets()).toBe(before)
    },
  )

  it('refuses figures that are missing', async () => {
    const seen = { ...toSeen(own), ultimateMoment: null }
    const { body } = await ask({ seen }).expect(422)
    expect(body.error.issues[0].path).toBe('seen.ultimateMoment')
  })

  it('refuses a document that was changed after it was seen', async () => {
    const { body } = await ask({ document: roundColumn(60) }).expect(422)
    const found = body.error.issues.map((issue: { path: string }) => issue.path)
    expect(found).toContain('seen.digest')
    expect(found).toContain('seen.ultimateCurvature')
  })

  it('refuses a result sent along: there is no field for one', async () => {
    const { body } = await office.designer
      .post(`/api/sections/${sectionId}/sheets`)
      .send({ id: randomUUID(), number: 'C-1', document: roundColumn(), seen: toSeen(own), result: own })
      .expect(400)
    expect(body.error.issues[0].path).toBe('result')
  })

  it('refuses a document that is not sound', async () => {
    const document = roundColumn()
    document.section.spirals[0].pitch = -1
    const { body } = await ask({ document }).expect(400)
    expect(body.error.issues[0].path).toBe('section.spirals[0].pitch')
  })

  it('keeps a result without a curve, where no equilibrium is found', async () => {
    const document = roundColumn()
    document.analysis.axialLoad = 100_000_000 // N, about twice what this column can carry
    const reply = analyse(document)
    if (reply.status !== 'no-equilibrium') throw new Error(`expected no equilibrium, got ${reply.status}`)
    const { body } = await ask({ document, seen: toSeen(reply.result) }).expect(201)
    expect(body.result.stop.reason).toBe('no-equilibrium')
    expect(body.result.points.moment).toEqual([])
  })

  it('asked twice with the same id makes one', async () => {
    const asked = { id: randomUUID(), number: 'C-102' }
    const first = await ask(asked).expect(201)
    const again = await ask(asked).expect(200)
    expect(again.body).toEqual(first.body)
    const other = await ask({ ...asked, document: roundColumn(60), seen: toSeen(solve(60)) }).expect(409)
    expect(other.body.error.code).toBe('id-taken')
  })

  it('asked twice at once makes one', async () => {
    const asked = { id: randomUUID(), number: 'C-103' }
    const answers = await Promise.all([ask(asked), ask(asked)])
    expect(answers.map(({ status }) => status).sort()).toEqual([200, 201])
    expect(answers[0].body).toEqual(answers[1].body)
  })
})

describe('revisions', () => {
  it('are lettered by number, and the latest supersedes', async () => {
    const first = await ask({ number: 'C-200' }).expect(201)
    const second = await ask({ number: 'C-200', document: roundColumn(60), seen: toSeen(solve(60)) }).expect(
      201,
    )
    const other = await ask({ number: 'C-201' }).expect(201)
    expect([first, second, other].map(({ body }) => body.revision)).toEqual(['A', 'B', 'A'])
    const { body } = await office.viewer.get(`/api/sheets/${first.body.id}`).expect(200)
    expect(body.supersededBy).toBe(second.body.id)
    expect(second.body.supersededBy).toBeNull()
  })

  it('of two sections do not meet', async () => {
    const elsewhere = await createSection(office)
    const { body } = await office.designer
      .post(`/api/sections/${elsewhere}/sheets`)
      .send({ id: randomUUID(), number: 'C-200', document: roundColumn(), seen: toSeen(own) })
      .expect(201)
    expect(body.revision).toBe('A')
  })
})

describe('a stored sheet', () => {
  it.each([
    ['changed', `update sheets set digest = 'sha256:0'`],
    ['deleted', 'delete from sheets'],
    ['replaced', 'insert or replace into sheets select * from sheets'],
    ['given other events', `update sheet_events set text = ''`],
    ['robbed of its events', 'delete from sheet_events'],
    ['robbed of them by replacement', 'insert or replace into sheet_events select * from sheet_events'],
  ])('cannot be %s, not even in the database', async (_deed, statement) => {
    await ask().expect(201)
    const before = countSheets()
    expect(() => office.context.database.$client.exec(statement)).toThrow(/cannot be (changed|deleted)/)
    expect(countSheets()).toBe(before)
  })

  it('keeps names and titles as they were when it was saved', async () => {
    const apart = await startOffice()
    const id = randomUUID()
    const section = await createSection(apart)
    await apart.designer
      .post(`/api/sections/${section}/sheets`)
      .send({ id, number: 'C-1', document: roundColumn(), seen: toSeen(own) })
      .expect(201)
    await apart.designer.patch('/api/account').send({ name: 'Dora Married', initials: 'DM' }).expect(200)
    await apart.designer
      .patch(`/api/jobs/${apart.jobId}`)
      .set('If-Match', '"1"')
      .send({ title: 'Renamed', number: 'R' })
      .expect(200)
    const { body } = await apart.designer.get(`/api/sheets/${id}`).expect(200)
    expect(body.savedBy).toEqual({ name: 'Dora Signe', initials: 'DS' })
    expect(body.job.title).toBe('Tern Creek Crossing')
    await apart.close()
  })
})

describe('a solver that', () => {
  const save = async (thread: string, timeLimit: number) => {
    const verifier = createVerifier({ timeLimit, thread: new URL(thread, import.meta.url) })
    const apart = await startOffice({ verifier })
    const section = await createSection(apart)
    const post = () =>
      apart.designer
        .post(`/api/sections/${section}/sheets`)
        .send({ id: randomUUID(), number: 'C-1', document: roundColumn(), seen: toSeen(own) })
    return { apart, post }
  }

  it('does not end is stopped at the time limit, and a new one takes over', async () => {
    const { apart, post } = await save('../helpers/apiThreadEndless.mjs', 300)
    for (let times = 0; times < 2; times += 1) {
      const { body } = await post().expect(503)
      expect(body.error.code).toBe('solver-timeout')
      expect(body.error.message).toContain('0.3 s')
    }
    await apart.close()
  })

  it('is busy lets so many wait, and tells the next one to come back', async () => {
    const thread = new URL('../helpers/apiThreadEndless.mjs', import.meta.url)
    const verifier = createVerifier({ timeLimit: 300, waitingLimit: 2, thread })
    const waiting = [verifier.analyse({}), verifier.analyse({})].map((run) =>
      run.catch((cause: Error) => cause.message),
    )
    await expect(verifier.analyse({})).rejects.toThrow(/Too many/)
    for (const message of await Promise.all(waiting)) expect(message).toContain('0.3 s')
    await verifier.close()
  })

  it('dies is an internal fault with its cause withheld', async () => {
    const { apart, post } = await save('../helpers/apiThreadDying.mjs', 5_000)
    const { body } = await post().expect(500)
    expect(body.error.code).toBe('internal')
    expect(JSON.stringify(body)).not.toContain('broken inside')
    await post().expect(500)
    await apart.close()
  })
})
