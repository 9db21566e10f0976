import { flushPromises } from '@vue/test-utils'
import { afterEach, describe, expect, it, vi } from 'vitest'
import SignInForm from '@/components/people/SignInForm.vue'
import { mountPart } from '../../helpers/mountPart.ts'

function answer(status: number, body: unknown) {
  return vi.fn(() => Promise.resolve(new Response(JSON.stringify(body), { status })))
}

async function fill(email: string, password: string) {
  const wrapper = mountPart(SignInForm)
  const [emailField, passwordField] = wrapper.findAll('input')
  await emailField.setValue(email)
  await passwordField.setValue(password)
  await wrapper.get('form').trigger('submit')
  await flushPromises()
  return wrapper
}

describe('SignInForm', () => {
  afterEach(() => vi.unstubAllGlobals())

  it('sends nothing that cannot be right, and says what at its field', async () => {
    const fetch = answer(200, {})
    vi.stubGlobal('fetch', fetch)
    const wrapper = await fill('nobody', '')
    expect(fetch).not.toHaveBeenCalled()
    expect(wrapper.text()).toContain('Enter an e-mail address')
    expect(wrapper.text()).toContain('Enter the password')
  })

  it('tells the words of the server when it refuses, and keeps the e-mail', async () => {
    const error = { code: 'wrong-credentials', message: 'E-mail and password do not match.', requestId: 'r1' }
    vi.stubGlobal('fetch', answer(401, { error }))
    const wrapper = await fill('rosa@demo.girdwell.invalid', 'not the one')
    expect(wrapper.get('[role=alert].problem').text()).toBe('E-mail and password do not match.')
    expect((wrapper.findAll('input')[0].element as HTMLInputElement).value).toBe('rosa@demo.girdwell.invalid')
  })

  it('says that the server cannot be reached', async () => {
    vi.stubGlobal(
      'fetch',
      vi.fn(() => Promise.reject(new TypeError('failed to fetch'))),
    )
    const wrapper = await fill('rosa@demo.girdwell.invalid', 'spiral-and-core')
    expect(wrapper.text()).toContain('The server cannot be reached')
  })
})
