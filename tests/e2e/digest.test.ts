import { readFileSync } from 'node:fs'
import { fileURLToPath } from 'node:url'
import { build } from 'esbuild'
import type { Browser } from 'playwright-core'
import { afterAll, beforeAll, describe, expect, inject, it } from 'vitest'
import { launchBrowser, openProfile } from './browser.ts'

const baseUrl = inject('baseUrl')
const folder = new URL('../fixtures/documents/', import.meta.url)
const digests: Record<string, string> = JSON.parse(readFileSync(new URL('digests.json', folder), 'utf8'))

/** Reader and digest of the product as one script that a page can run. */
async function bundleDigest(): Promise<string> {
  const { outputFiles } = await build({
    stdin: {
      contents: `
        import { readDocument } from '#shared/document/readDocument.ts'
        import { computeDigest } from '#shared/document/digest.ts'
        globalThis.digestOf = (input) => {
          const read = readDocument(input)
          return read.status === 'read' ? computeDigest(read.document) : JSON.stringify(read.issues)
        }`,
      resolveDir: fileURLToPath(new URL('../..', import.meta.url)),
    },
    bundle: true,
    format: 'iife',
    write: false,
  })
  return outputFiles[0].text
}

describe('digests of the fixtures in a browser', () => {
  let browser: Browser
  beforeAll(async () => {
    browser = await launchBrowser()
  })
  afterAll(() => browser?.close())

  it('are those of Node', async () => {
    const { page, context } = await openProfile(browser)
    await page.goto(`${baseUrl}/sign-in`)
    await page.evaluate(await bundleDigest())
    const names = Object.keys(digests)
    expect(names.length).toBeGreaterThan(2)
    for (const name of names) {
      const input = JSON.parse(readFileSync(new URL(`${name}.json`, folder), 'utf8'))
      const digest = await page.evaluate(
        (document) =>
          (globalThis as typeof globalThis & { digestOf(input: unknown): string }).digestOf(document),
        input,
      )
      expect(digest).toBe(digests[name])
    }
    await context.close()
  })
})
