import { describe, expect, it } from 'vitest'
import { answerWith, fieldOf, listOf, openPage, press, refusal, typeInto } from '../../helpers/openPage.ts'
import { makeJob, rosa } from '../../helpers/officePeople.ts'

const nobody = refusal(401, 'not-signed-in', 'You are not signed in.')

async function openSignIn() {
  const page = await openPage('/sign-in')
  await page.see('Password')
  await typeInto('E-mail', rosa.email)
  await typeInto('Password', 'not the one')
  return page
}

describe('sign-in', () => {
  it.each([
    refusal(401, 'wrong-credentials', 'E-mail and password do not match.'),
    refusal(429, 'too-many-tries', 'Too many tries. Wait 14 minutes and try again.'),
  ])('tells the words of the server and keeps what was typed: %j', async (...answer) => {
    answerWith({ 'GET /api/session': nobody, 'POST /api/sign-in': [answer[0], answer[1]] })
    const { see } = await openSignIn()
    await press('Sign in')
    await see((answer[1] as { error: { message: string } }).error.message)
    expect(fieldOf('E-mail').value).toBe(rosa.email)
    expect(fieldOf('Password').value).toBe('not the one')
  })

  it('is sent once however often it is pressed', async () => {
    let answer: () => void = () => {}
    const wait = new Promise<void>((resolve) => (answer = resolve))
    const { asked } = answerWith({
      'GET /api/session': nobody,
      'POST /api/sign-in': () => wait.then(() => [200, rosa]),
      'GET /api/jobs': listOf(),
    })
    const { see } = await openSignIn()
    await press('Sign in')
    await press('Sign in')
    answer()
    await see('No job yet')
    expect(asked.filter(({ path }) => path === '/api/sign-in')).toHaveLength(1)
  })
})

describe('signed out meanwhile', () => {
  it('signs in again on the same page, which then fetches what it could not', async () => {
    const { answers } = answerWith({
      'GET /api/session': [200, rosa],
      'GET /api/jobs': nobody,
      'POST /api/sign-in': [200, rosa],
    })
    const { see, router } = await openPage('/jobs')
    await see('You were signed out')
    expect(router.currentRoute.value.name).toBe('jobs')
    expect(fieldOf('E-mail').value).toBe(rosa.email)
    expect(fieldOf('E-mail').readOnly).toBe(true)
    answers['GET /api/jobs'] = listOf(makeJob('designer'))
    await typeInto('Password', 'spiral-and-core')
    await press('Sign in')
    await see('Tern Creek Crossing')
  })

  it('somebody else may leave the page, and sees nothing of it', async () => {
    answerWith({ 'GET /api/session': [200, rosa], 'GET /api/jobs': nobody })
    const { see, router } = await openPage('/jobs')
    await see('You were signed out')
    await press('Leave this page')
    await see('independent check')
    expect(router.currentRoute.value.name).toBe('sign-in')
    expect(fieldOf('E-mail').value).toBe('')
  })
})
