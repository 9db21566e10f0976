import type { JobRole } from '#shared/api.ts'
import { flushPromises } from '@vue/test-utils'
import { describe, expect, it } from 'vitest'
import {
  answerWith,
  fieldOf,
  hasButton,
  listOf,
  openPage,
  press,
  refusal,
  typeInto,
  type Answers,
} from '../../helpers/openPage.ts'
import { jobId, lena, makeJob, pier3, rosa, rosaAsDesigner } from '../../helpers/officePeople.ts'

const job = `/api/jobs/${jobId}`

function serve(role: JobRole | null, more: Answers = {}) {
  return answerWith({
    'GET /api/session': [200, role === null ? lena : rosa],
    [`GET ${job}`]: [200, makeJob(role)],
    [`GET ${job}/sections`]: listOf(pier3),
    [`GET ${job}/members`]: listOf(rosaAsDesigner),
    'GET /api/users': listOf(lena, rosa),
    ...more,
  })
}

async function open() {
  const page = await openPage(`/jobs/${jobId}`)
  await page.see('Pier 3 column, five spirals')
  return page
}

describe('the page of a job', () => {
  it.each([
    { role: 'designer', makes: true, renames: true, manages: false },
    { role: 'checker', makes: false, renames: false, manages: false },
    { role: 'viewer', makes: false, renames: false, manages: false },
    { role: null, makes: false, renames: true, manages: true },
  ] as const)('offers $role what the server allows', async ({ role, makes, renames, manages }) => {
    serve(role)
    await open()
    expect(hasButton('New section')).toBe(makes)
    expect(hasButton('Rename')).toBe(renames)
    expect(hasButton('Remove')).toBe(manages)
    expect(hasButton('Add')).toBe(manages)
    expect(document.querySelectorAll('select')).toHaveLength(manages ? 1 : 0)
    expect(document.title).toBe('Tern Creek Crossing · Girdwell')
  })

  it('asks before a person is removed, and tells when it is done', async () => {
    const { asked, answers } = serve(null, { [`DELETE ${job}/members/${rosa.id}`]: [204] })
    const { see } = await open()
    await press('Remove')
    await see('Remove Rosa Marchetti from this job?')
    expect(asked.some(({ method }) => method === 'DELETE')).toBe(false)
    answers[`GET ${job}/members`] = listOf()
    document.querySelector<HTMLElement>('[role=dialog] .v-card-actions button:last-child')?.click()
    await see('Rosa Marchetti is no longer on this job.')
    await see('Nobody yet.')
  })

  it('keeps the page in sight while it is fetched again', async () => {
    let answer: () => void = () => {}
    const wait = new Promise<void>((resolve) => (answer = resolve))
    const { answers } = serve(null, {
      [`PUT ${job}/members/${rosa.id}`]: [200, { ...rosaAsDesigner, role: 'checker' }],
    })
    const { see } = await open()
    answers[`GET ${job}/members`] = () => wait.then(() => listOf({ ...rosaAsDesigner, role: 'checker' }))
    const choice = document.querySelector('select') as HTMLSelectElement
    choice.value = 'checker'
    choice.dispatchEvent(new Event('change'))
    await see('Rosa Marchetti is now checker on this job.')
    expect(document.body.textContent).toContain('Pier 3 column, five spirals')
    expect(document.querySelector('select')).toBe(choice)
    answer()
    await flushPromises()
    expect(choice.value).toBe('checker')
  })

  it('tells what somebody else saved meanwhile, and saves over it only on a second decision', async () => {
    const theirs = makeJob('designer', { title: 'Tern Creek North', revision: 5 })
    const { asked } = serve('designer', {
      [`PATCH ${job}`]: ({ headers }) =>
        headers['if-match'] === '"5"'
          ? [200, makeJob('designer', { title: 'Tern Creek South', revision: 6 })]
          : refusal(409, 'conflict', 'Someone else saved this job meanwhile.', { stored: theirs }),
    })
    const { see } = await open()
    await press('Rename')
    await see('Name and number of the job')
    await typeInto('Name', 'Tern Creek South')
    await press('Save')
    await see('the job is now “Tern Creek North”')
    expect(fieldOf('Name').value).toBe('Tern Creek South')
    await press('Save mine over it')
    const sent = asked.filter(({ method }) => method === 'PATCH').map(({ headers }) => headers['if-match'])
    expect(sent).toEqual(['"3"', '"5"'])
  })

  it('shows issues of the server at their field, and those without a field below', async () => {
    serve('designer', {
      [`PATCH ${job}`]: refusal(400, 'invalid', 'The request is not sound.', {
        issues: [
          { path: 'title', code: 'too-long', message: 'longer than the sheet is wide' },
          { path: 'colour', code: 'unrecognized-keys', message: 'is not known here' },
        ],
      }),
    })
    const { see } = await open()
    await press('Rename')
    await press('Save')
    await see('longer than the sheet is wide')
    await see('colour: is not known here')
  })

  it('a dialog stays until it is answered, so that a click beside it loses nothing; Escape closes it', async () => {
    serve('designer')
    const { wrapper, see } = await open()
    await press('New section')
    await see('Start from a layout')
    // happy-dom has no presses outside an element; that the browser keeps the dialog open is Vuetify's promise for this.
    const dialogs = wrapper.findAllComponents({ name: 'VDialog' }).filter((one) => one.props('modelValue'))
    expect(dialogs.map((one) => one.props('persistent'))).toEqual([true])
    fieldOf('Name of the section').dispatchEvent(
      new KeyboardEvent('keydown', { key: 'Escape', bubbles: true }),
    )
    await flushPromises()
    expect(document.body.textContent).not.toContain('Start from a layout')
  })

  it('makes a section from the chosen layout, with the same id when it is sent again', async () => {
    let tries = 0
    const { asked } = serve('designer', {
      [`POST ${job}/sections`]: () => {
        tries++
        throw new TypeError('failed to fetch')
      },
    })
    const { see } = await open()
    await press('New section')
    await typeInto('Name of the section', 'Pier 5')
    await press('Make the section')
    await see('The server cannot be reached')
    await press('Make the section')
    const sent = asked.filter(({ method }) => method === 'POST').map(({ body }) => body)
    expect(tries).toBe(2)
    expect(sent[0]).toEqual(sent[1])
    expect(sent[0]).toMatchObject({ title: 'Pier 5', document: { format: 'girdwell-analysis/1' } })
  })

  it('says plainly that a job is not there', async () => {
    serve('designer', {
      [`GET ${job}`]: refusal(404, 'not-found', 'There is no such job, or it is not open to you.'),
    })
    const { see } = await openPage(`/jobs/${jobId}`)
    await see('The job could not be opened')
    await see('There is no such job, or it is not open to you.')
    expect(hasButton('Try again')).toBe(false)
  })
})
