/** What happy-dom lacks and Vuetify asks for; and a test that makes the page warn has failed. */
import { afterEach, beforeEach, expect, vi } from 'vitest'

const viewport = Object.assign(new EventTarget(), {
  width: 1440,
  height: 900,
  scale: 1,
  offsetLeft: 0,
  offsetTop: 0,
  pageLeft: 0,
  pageTop: 0,
})
Object.defineProperty(window, 'visualViewport', { value: viewport, configurable: true })

const complaints: string[] = []
beforeEach(() => {
  complaints.length = 0
  localStorage.clear()
  for (const method of ['warn', 'error'] as const) {
    vi.spyOn(console, method).mockImplementation((...words: unknown[]) => {
      complaints.push(words.map(String).join(' '))
    })
  }
})
afterEach(() => {
  document.body.innerHTML = ''
  expect(complaints).toEqual([])
})
