import type { Browser } from 'playwright-core'
import { afterAll, beforeAll, describe, expect, inject, it } from 'vitest'
import { demoPassword, makeSection, openAs, openJob, waitForCurve } from './actions.ts'
import { launchBrowser, takePicture } from './browser.ts'

const baseUrl = inject('baseUrl')

describe('when something fails', () => {
  let browser: Browser
  beforeAll(async () => {
    browser = await launchBrowser()
  })
  afterAll(() => browser?.close())

  async function openNew(title: string) {
    const profile = await openAs(browser, baseUrl, 'rosa')
    await openJob(profile.page)
    await makeSection(profile.page, title, 'One spiral')
    return profile
  }

  it('the server out of reach: says so, keeps the work, saves when it is back', async () => {
    const { page, context } = await openNew('Offline column')
    const pitch = page.getByLabel('Pitch of S1, mm')
    await pitch.fill('66')
    await pitch.press('Enter')
    await waitForCurve(page)
    await context.setOffline(true)
    await page.getByRole('button', { name: 'Save', exact: true }).click()
    await page.getByText('The server cannot be reached').waitFor()
    await takePicture(page, 'e2e-unreachable')
    expect(await pitch.inputValue()).toBe('66')
    await context.setOffline(false)
    await page.getByRole('button', { name: 'Save again' }).click()
    await page.getByText(/^saved \d/).waitFor()
    await context.close()
  })

  it('signed out meanwhile: signs in again in place and loses nothing', async () => {
    const { page, context } = await openNew('Interrupted column')
    const pitch = page.getByLabel('Pitch of S1, mm')
    await pitch.fill('67')
    await pitch.press('Enter')
    await waitForCurve(page)
    await context.clearCookies()
    await page.getByRole('button', { name: 'Save', exact: true }).click()
    await page.getByText('You were signed out').waitFor()
    await takePicture(page, 'e2e-signed-out')
    await page.getByRole('dialog').getByLabel('Password').fill(demoPassword)
    await page.getByRole('dialog').getByRole('button', { name: 'Sign in' }).click()
    await page.getByText('You were signed out').waitFor({ state: 'hidden' })
    expect(await pitch.inputValue()).toBe('67')
    await page.getByRole('button', { name: 'Save', exact: true }).click()
    await page.getByText(/^saved \d/).waitFor()
    await context.close()
  })

  it('the solver cannot start: says so, and computes again on demand', async () => {
    const { page, context } = await openAs(browser, baseUrl, 'rosa')
    await page.route('**/*worker*.js', (route) => route.abort())
    await openJob(page)
    await page.getByRole('link', { name: /one spiral/ }).click()
    await page.getByText('The solver stopped').waitFor()
    await takePicture(page, 'e2e-solver-stopped')
    await page.unroute('**/*worker*.js')
    await page.getByRole('button', { name: 'Compute again' }).click()
    await waitForCurve(page)
    await context.close()
  })

  it('a section without equilibrium says what to do', async () => {
    const { page, context } = await openNew('Overloaded column')
    const load = page.getByLabel('Axial load', { exact: true })
    await load.fill('500000')
    await load.press('Enter')
    await page.getByText('No equilibrium at').first().waitFor()
    await takePicture(page, 'e2e-no-equilibrium')
    await context.close()
  })

  it('the same document has the same digest in Node and in the browser', async () => {
    const { page, context } = await openNew('Digest column')
    await page.getByRole('button', { name: 'Save a sheet' }).click()
    await page.getByLabel('Sheet number').fill('D-01')
    // The server refuses a sheet whose digest the browser did not see: being saved is the proof.
    await page.getByRole('button', { name: 'Save sheet' }).click()
    await page.waitForURL('**/sheets/*')
    await page.getByText('sha256:').waitFor()
    await context.close()
  })
})
