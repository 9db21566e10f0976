import { readFileSync } from 'node:fs'
import { afterAll, expect, it, vi } from 'vitest'

const made: unknown[][] = []

// zod tries once whether code may be made from text; under the page's content security policy that is a violation, reported
// though it is caught.
vi.stubGlobal(
  'Function',
  new Proxy(Function, {
    construct(target, args: string[]) {
      made.push(args)
      return Reflect.construct(target, args) as object
    },
  }),
)
afterAll(() => vi.unstubAllGlobals())

it('no code is made from text where documents and payloads are read', async () => {
  const { readDocument } = await import('#shared/document/readDocument.ts')
  const api = await import('#shared/api.ts')
  const text = readFileSync(new URL('../../fixtures/documents/one-spiral.json', import.meta.url), 'utf8')
  expect(readDocument(JSON.parse(text)).status).toBe('read')
  expect(Object.keys(api).length).toBeGreaterThan(0)
  expect(made).toEqual([])
})
