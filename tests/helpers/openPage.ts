import { flushPromises, mount, type VueWrapper } from '@vue/test-utils'
import { createPinia, setActivePinia } from 'pinia'
import { onTestFinished, vi } from 'vitest'
import { createMemoryHistory } from 'vue-router'
import App from '@/App.vue'
import { vuetify } from '@/plugins/vuetify.ts'
import { createAppRouter } from '@/router/router.ts'

export interface Asked {
  method: string
  path: string
  body: unknown
  headers: Record<string, string>
}
export type Answer = [status: number, body?: unknown]
/** "GET /api/jobs": what the server says, the same each time or worked out anew. */
export type Answers = Record<string, Answer | ((asked: Asked) => Answer | Promise<Answer>)>

/** Stands in for the server. What was not foreseen answers 404, so that nothing passes unnoticed. */
export function answerWith(answers: Answers): { asked: Asked[]; answers: Answers } {
  const asked: Asked[] = []
  const fetch = async (path: string, init: RequestInit = {}): Promise<Response> => {
    const one: Asked = {
      method: init.method ?? 'GET',
      path: path.split('?')[0],
      body: typeof init.body === 'string' ? JSON.parse(init.body) : undefined,
      headers: init.headers as Record<string, string>,
    }
    asked.push(one)
    const known =
      answers[`${one.method} ${one.path}`] ?? refusal(404, 'not-found', 'There is no such address.')
    const [status, body] = typeof known === 'function' ? await known(one) : known
    return new Response(body === undefined ? null : JSON.stringify(body), { status })
  }
  vi.stubGlobal('fetch', vi.fn(fetch))
  onTestFinished(() => void vi.unstubAllGlobals())
  return { asked, answers }
}

/** An error of the API. */
export function refusal(status: number, code: string, message: string, more: object = {}): Answer {
  return [status, { error: { code, message, requestId: 'r-1', ...more } }]
}

export const listOf = (...items: unknown[]): Answer => [200, { items, nextCursor: null }]

/** The whole application at an address. */
export async function openPage(address: string): Promise<{
  wrapper: VueWrapper
  router: ReturnType<typeof createAppRouter>
  /** Waits until the words stand on the page, dialogs included. */
  see(words: string): Promise<void>
}> {
  const pinia = createPinia()
  setActivePinia(pinia)
  const history = createMemoryHistory()
  history.replace(address)
  const router = createAppRouter(history)
  const wrapper = mount(App, { attachTo: document.body, global: { plugins: [pinia, vuetify, router] } })
  onTestFinished(() => wrapper.unmount())
  await router.isReady()
  await flushPromises()
  const see = (words: string) =>
    vi.waitFor(() => {
      const page = document.body.textContent ?? ''
      if (!page.includes(words)) throw new Error(`"${words}" is not on the page: ${page}`)
    }, 10_000)
  return { wrapper, router, see }
}

/** A button by its words, on the page or in a dialog. */
export function buttonOf(words: string): HTMLButtonElement {
  const found = [...document.querySelectorAll('button')].find((one) => one.textContent?.trim() === words)
  if (!found) throw new Error(`There is no button "${words}"`)
  return found
}

export const hasButton = (words: string) =>
  [...document.querySelectorAll('button')].some((one) => one.textContent?.trim() === words)

/** An entry by its label. */
export function fieldOf(label: string): HTMLInputElement {
  // An entry with something in it has a second, floating label.
  const field = [...document.querySelectorAll('label')]
    .filter((one) => one.textContent?.trim() === label)
    .map((one) => document.getElementById(one.htmlFor))
    .find((one) => one instanceof HTMLInputElement)
  if (!field) throw new Error(`There is no entry "${label}"`)
  return field
}

export async function typeInto(label: string, text: string): Promise<void> {
  const field = fieldOf(label)
  field.value = text
  field.dispatchEvent(new Event('input'))
  await flushPromises()
}

export async function press(words: string): Promise<void> {
  const button = buttonOf(words)
  if (button.type === 'submit') button.form?.dispatchEvent(new Event('submit', { cancelable: true }))
  else button.click()
  await flushPromises()
}
