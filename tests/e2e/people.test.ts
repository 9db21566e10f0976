import { randomUUID } from 'node:crypto'
import type { Browser, Page } from 'playwright-core'
import { afterAll, beforeAll, describe, expect, inject, it } from 'vitest'
import { makeLink, makeSection, openAs, openJob, openSection, saveSheet, waitForCurve } from './actions.ts'
import { launchBrowser, openProfile, takePicture } from './browser.ts'

const baseUrl = inject('baseUrl')

describe('who may do what', () => {
  let browser: Browser
  let sectionUrl = ''
  let sheetUrl = ''

  beforeAll(async () => {
    browser = await launchBrowser()
    const { page, context } = await openAs(browser, baseUrl, 'rosa')
    await openJob(page)
    await makeSection(page, 'Shared column', 'One spiral')
    sectionUrl = page.url()
    await saveSheet(page, 'SC-01')
    sheetUrl = page.url()
    await context.close()
  })
  afterAll(() => browser?.close())

  it.each(['kofi', 'mara'] as const)('%s reads the section and cannot change it', async (person) => {
    const { page, context, faults } = await openAs(browser, baseUrl, person)
    await openJob(page)
    expect(await page.getByRole('button', { name: 'New section' }).count()).toBe(0)
    await openSection(page, 'Shared column')
    for (const name of ['Save', 'Save a sheet', 'Undo', 'Add a spiral']) {
      expect(await page.getByRole('button', { name, exact: true }).count()).toBe(0)
    }
    expect(await page.getByLabel('Pitch of S1, mm').count()).toBe(0)
    expect(await page.locator('.handles').count()).toBe(0)

    // Nor past the page: the server refuses the same person.
    const sectionId = sectionUrl.split('/').at(-1)
    const stored = await page.request.get(`${baseUrl}/api/sections/${sectionId}`)
    const { title, document, revision } = await stored.json()
    const refused = await page.request.put(`${baseUrl}/api/sections/${sectionId}`, {
      data: { title: `${title} changed`, document },
      headers: { origin: baseUrl, 'if-match': `"${revision}"` },
    })
    expect(refused.status()).toBe(403)
    expect(faults).toEqual([])
    await context.close()
  })

  it('a stranger sees nothing without a link', async () => {
    const { page, context } = await openProfile(browser)
    for (const url of [sectionUrl, sheetUrl, `${baseUrl}/jobs`]) {
      await page.goto(url)
      await page.getByRole('button', { name: 'Sign in' }).waitFor()
      expect(await page.getByText('Shared column').count()).toBe(0)
    }
    const answer = await page.request.get(sheetUrl.replace('/sheets/', '/api/sheets/'))
    expect(answer.status()).toBe(401)
    await page.goto(`${baseUrl}/link/${'A'.repeat(43)}`)
    await page.getByText('This link opens nothing').waitFor()
    await context.close()
  })

  it('a revoked link shows one plain line', async () => {
    const { page, context } = await openAs(browser, baseUrl, 'rosa')
    await page.goto(sheetUrl)
    const address = await makeLink(page, 'visitor')
    const visitor = await openProfile(browser)
    await visitor.page.goto(address)
    await visitor.page.getByRole('heading', { name: 'Shared column' }).waitFor()
    await page.getByRole('button', { name: 'Revoke' }).first().click()
    await page.getByRole('dialog').getByRole('button', { name: 'Revoke' }).click()
    await page.getByText('revoked').first().waitFor()
    await expectPlainLine(visitor.page, address, /revoked/i)
    await takePicture(visitor.page, 'e2e-link-revoked')
    await visitor.context.close()
    await context.close()
  })

  it('an expired link shows one plain line', async () => {
    const { page, context } = await openAs(browser, baseUrl, 'rosa')
    const made = await page.request.post(`${baseUrl}/api/sheets/${sheetUrl.split('/').at(-1)}/links`, {
      data: { id: randomUUID(), recipient: 'visitor', expiresAt: Date.now() + 1500 },
      headers: { origin: baseUrl },
    })
    expect(made.status()).toBe(201)
    const { token } = await made.json()
    await page.waitForTimeout(1700)
    const visitor = await openProfile(browser)
    await expectPlainLine(visitor.page, `${baseUrl}/link/${token}`, /expired/i)
    await visitor.context.close()
    await context.close()
  })

  it('two designers save the same section: the second is told and loses nothing', async () => {
    const rosa = await openAs(browser, baseUrl, 'rosa')
    const tomas = await openAs(browser, baseUrl, 'tomas')
    for (const { page } of [rosa, tomas]) {
      await page.goto(sectionUrl)
      await waitForCurve(page)
    }
    await changePitch(rosa.page, '65')
    await rosa.page.getByRole('button', { name: 'Save', exact: true }).click()
    await rosa.page.getByText(/^saved \d/).waitFor()

    await changePitch(tomas.page, '75')
    await tomas.page.getByRole('button', { name: 'Save', exact: true }).click()
    const dialog = tomas.page.getByRole('dialog')
    await dialog.getByText('Changed by Rosa Marchetti meanwhile').waitFor()
    await dialog.getByRole('cell', { name: '75', exact: true }).waitFor()
    await dialog.getByRole('cell', { name: '65', exact: true }).waitFor()
    await takePicture(tomas.page, 'e2e-conflict')

    // Deciding later, and even reloading, keeps what was done.
    await dialog.getByRole('button', { name: 'Decide later' }).click()
    await tomas.page.waitForTimeout(400)
    await tomas.page.reload()
    await tomas.page.getByText('was taken up again').waitFor()
    await waitForCurve(tomas.page)
    expect(await tomas.page.getByLabel('Pitch of S1, mm').inputValue()).toBe('75')

    // The work still starts from the revision before Rosa's: saving asks again and never writes over hers.
    await tomas.page.getByRole('button', { name: 'Save', exact: true }).click()
    await tomas.page.getByRole('dialog').getByText('Changed by Rosa Marchetti meanwhile').waitFor()
    await tomas.page.getByRole('button', { name: 'Take theirs, drop mine' }).click()
    await waitForCurve(tomas.page)
    expect(await tomas.page.getByLabel('Pitch of S1, mm').inputValue()).toBe('65')
    await rosa.context.close()
    await tomas.context.close()
  })

  it('keeps one’s own work as a copy after a conflict', async () => {
    const rosa = await openAs(browser, baseUrl, 'rosa')
    const tomas = await openAs(browser, baseUrl, 'tomas')
    for (const { page } of [rosa, tomas]) {
      await page.goto(sectionUrl)
      await waitForCurve(page)
    }
    await changePitch(rosa.page, '62')
    await rosa.page.getByRole('button', { name: 'Save', exact: true }).click()
    await rosa.page.getByText(/^saved \d/).waitFor()
    await changePitch(tomas.page, '58')
    await tomas.page.getByRole('button', { name: 'Save', exact: true }).click()
    await tomas.page.getByRole('button', { name: 'Keep mine as a copy' }).click()
    await tomas.page.waitForURL((url) => url.href.includes('/sections/') && url.href !== sectionUrl)
    await waitForCurve(tomas.page)
    expect(await tomas.page.getByLabel('Pitch of S1, mm').inputValue()).toBe('58')
    expect(await tomas.page.getByText('Shared column (copy)').first().isVisible()).toBe(true)
    await rosa.context.close()
    await tomas.context.close()
  })
})

async function changePitch(page: Page, pitch: string) {
  const field = page.getByLabel('Pitch of S1, mm')
  await field.fill(pitch)
  await field.press('Enter')
  await waitForCurve(page)
}

async function expectPlainLine(page: Page, address: string, words: RegExp) {
  await page.goto(address)
  const line = page.getByRole('alert')
  await line.waitFor()
  expect(await line.innerText()).toMatch(words)
  expect(await page.getByRole('heading').count()).toBe(0)
  expect(await page.getByText('Shared column').count()).toBe(0)
}
