import { readFileSync } from 'node:fs'
import { createRequire } from 'node:module'
import type { AxeResults } from 'axe-core'
import type { Browser, Page } from 'playwright-core'
import { afterAll, beforeAll, describe, expect, inject, it } from 'vitest'
import { makeLink, makeSection, openJob, saveSheet, signIn } from './actions.ts'
import { launchBrowser, openProfile } from './browser.ts'

const baseUrl = inject('baseUrl')
const axe = readFileSync(createRequire(import.meta.url).resolve('axe-core/axe.min.js'), 'utf8')

/** WCAG 2.2 A and AA, by the rules of axe-core; violations in words. */
async function findViolations(page: Page, where: string): Promise<string[]> {
  await page.evaluate(axe)
  const results = await page.evaluate(() =>
    (window as typeof window & { axe: { run(options: unknown): Promise<AxeResults> } }).axe.run({
      runOnly: ['wcag2a', 'wcag2aa', 'wcag21a', 'wcag21aa', 'wcag22aa'],
    }),
  )
  return results.violations.flatMap((violation) =>
    violation.nodes.map(
      (node) => `${where}: ${violation.id} at ${node.target.join(' ')}: ${node.failureSummary}`,
    ),
  )
}

describe.each(['light', 'dark'] as const)('accessibility, %s theme', (colorScheme) => {
  let browser: Browser
  beforeAll(async () => {
    browser = await launchBrowser()
  })
  afterAll(() => browser?.close())

  it('has no violation on any page', async () => {
    const { page, context } = await openProfile(browser, { colorScheme })
    const violations: string[] = []
    const check = async (where: string) => violations.push(...(await findViolations(page, where)))
    await page.goto(`${baseUrl}/sign-in`)
    await page.getByLabel('E-mail').waitFor()
    await check('sign-in')
    await signIn(page, baseUrl, 'rosa')
    await page.getByRole('link', { name: 'Tern Creek Crossing' }).waitFor()
    await check('jobs')
    await openJob(page)
    await check('job')
    await page.getByRole('button', { name: 'New section' }).click()
    await page.getByLabel('Name of the section').waitFor()
    await check('new section')
    await page.getByRole('button', { name: 'Cancel' }).click()
    await makeSection(page, `Readable column, ${colorScheme}`, 'Centre and four corner spirals')
    await check('section')
    for (const tab of ['Longitudinal bars', 'Outline and voids', 'Materials', 'Cases']) {
      await page.getByRole('tab', { name: tab }).click()
      await check(`section, ${tab}`)
    }
    await page.getByRole('tab', { name: 'Pitch comparison' }).click()
    await page.getByRole('button', { name: 'Compare pitches' }).click()
    await page.locator('.pitch-panel tbody tr').first().waitFor()
    await check('pitch comparison')
    await page.getByRole('tab', { name: 'Moment-curvature' }).click()
    await saveSheet(page, 'A-01')
    await check('sheet')
    await page.goto(await makeLink(page, 'reader'))
    await page.getByRole('heading', { name: 'Readable column' }).waitFor()
    await check('link')
    await page.goto(`${baseUrl}/account`)
    await page.getByRole('heading', { name: 'Account' }).waitFor()
    await check('account')
    expect(violations).toEqual([])

    // The net is not torn: a picture without words is caught.
    await page.evaluate(() => document.querySelector('main')?.append(document.createElement('img')))
    expect(await findViolations(page, 'with a wordless picture')).not.toEqual([])
    await context.close()
  })
})
