import { describe, expect, it } from 'vitest'
import { answerWith, listOf, openPage, press, refusal, typeInto } from '../../helpers/openPage.ts'
import { lena, makeJob, rosa } from '../../helpers/officePeople.ts'

const nobody = refusal(401, 'not-signed-in', 'You are not signed in.')

describe('who comes to which page', () => {
  it('a stranger who wants a job signs in first and then stands there', async () => {
    const { asked } = answerWith({
      'GET /api/session': nobody,
      'POST /api/sign-in': [200, rosa],
      'GET /api/jobs': listOf(makeJob('designer')),
    })
    const { router, see } = await openPage('/jobs')
    await see('Password')
    expect(router.currentRoute.value.name).toBe('sign-in')
    expect(asked.some(({ path }) => path === '/api/jobs')).toBe(false)

    await typeInto('E-mail', 'rosa@demo.girdwell.invalid')
    await typeInto('Password', 'spiral-and-core')
    await press('Sign in')
    await see('Tern Creek Crossing')
    expect(router.currentRoute.value.fullPath).toBe('/jobs')
    expect(document.title).toBe('Jobs · Girdwell')
  })

  it.each([['//elsewhere.invalid'], ['/\\elsewhere.invalid'], ['https://elsewhere.invalid']])(
    'sign-in never leads to another site: %s',
    async (to) => {
      answerWith({ 'GET /api/session': [200, rosa], 'GET /api/jobs': listOf() })
      const { router, see } = await openPage(`/sign-in?to=${encodeURIComponent(to)}`)
      await see('No job yet')
      expect(router.currentRoute.value.fullPath).toBe('/jobs')
    },
  )

  it('whoever is signed in already is not asked again', async () => {
    answerWith({ 'GET /api/session': [200, rosa] })
    const { router, see } = await openPage('/sign-in?to=/account')
    await see('Name and initials')
    expect(router.currentRoute.value.name).toBe('account')
  })

  it('people are for administrators: a member stands before the jobs instead', async () => {
    const { asked } = answerWith({ 'GET /api/session': [200, rosa], 'GET /api/jobs': listOf() })
    const { router, see } = await openPage('/people')
    await see('No job yet')
    expect(router.currentRoute.value.name).toBe('jobs')
    expect(asked.some(({ path }) => path === '/api/users')).toBe(false)
  })

  it('an administrator sees the people', async () => {
    answerWith({ 'GET /api/session': [200, lena], 'GET /api/users': listOf(lena, rosa) })
    const { see } = await openPage('/people')
    await see('Rosa Marchetti')
  })

  it('an address that is none says so', async () => {
    answerWith({ 'GET /api/session': [200, rosa] })
    const { see } = await openPage('/nowhere')
    await see('There is no page at this address')
  })

  it('a server out of reach is told before anybody is asked to sign in, with a way on', async () => {
    const { answers } = answerWith({
      'GET /api/session': () => Promise.reject(new TypeError('failed to fetch')),
      'GET /api/jobs': listOf(makeJob('designer')),
    })
    const { see } = await openPage('/jobs')
    await see('It is not known who is signed in')
    await see('The server cannot be reached')
    expect(document.querySelector('input[type=password]')).toBeNull()
    answers['GET /api/session'] = [200, rosa]
    await press('Try again')
    await see('Tern Creek Crossing')
  })
})
