import { fileURLToPath } from 'node:url'
import { build } from 'esbuild'
import type { Browser } from 'playwright-core'
import { afterAll, beforeAll, describe, expect, inject, it } from 'vitest'
import { launchBrowser, openProfile } from './browser.ts'
import { fixtureDigests, loadDigested } from '../helpers/fixtureDocuments.ts'

const baseUrl = inject('baseUrl')

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
    const entries = Object.entries(fixtureDigests)
    expect(entries.length).toBeGreaterThan(8)
    for (const [name, wanted] of entries) {
      const digest = await page.evaluate(
        (document) =>
          (globalThis as typeof globalThis & { digestOf(input: unknown): string }).digestOf(document),
        loadDigested(name),
      )
      expect(digest, name).toBe(wanted)
    }
    await context.close()
  })
})
