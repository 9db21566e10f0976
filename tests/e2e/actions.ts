import type { Browser, Page } from 'playwright-core'
import { openProfile } from './browser.ts'

/** What people of the demo office do, in their words. */
export const demoPassword = 'spiral-and-core'
export type DemoPerson = 'lena' | 'rosa' | 'tomas' | 'kofi' | 'mara'

export async function signIn(page: Page, baseUrl: string, person: DemoPerson): Promise<void> {
  await page.goto(`${baseUrl}/sign-in`)
  await page.getByLabel('E-mail').fill(`${person}@demo.girdwell.invalid`)
  await page.getByLabel('Password').fill(demoPassword)
  await page.getByRole('button', { name: 'Sign in' }).click()
  await page.waitForURL('**/jobs')
}

/** A fresh profile in which a person is signed in. */
export async function openAs(browser: Browser, baseUrl: string, person: DemoPerson) {
  const profile = await openProfile(browser)
  await signIn(profile.page, baseUrl, person)
  // Nobody being signed in is the honest first answer, and the browser logs it.
  profile.faults.length = 0
  return profile
}

export async function openJob(page: Page, title = 'Tern Creek Crossing'): Promise<void> {
  await page.getByRole('link', { name: title }).click()
  await page.getByRole('heading', { name: 'Sections' }).waitFor()
}

export async function openSection(page: Page, title: string | RegExp): Promise<void> {
  await page.getByRole('link', { name: title }).click()
  await waitForCurve(page)
}

/** A new section from a layout. */
export async function makeSection(page: Page, title: string, layout: string): Promise<void> {
  await page.getByRole('button', { name: 'New section' }).click()
  await page.getByLabel('Name of the section').fill(title)
  await page.getByText(layout, { exact: true }).click()
  await page.getByRole('button', { name: 'Make the section' }).click()
  await page.waitForURL('**/sections/*')
  await waitForCurve(page)
}

/** The curve in force is drawn and belongs to the input. */
export async function waitForCurve(page: Page): Promise<void> {
  await page.locator('.marks:not(.stale) .mark').first().waitFor()
}

/** The figure under a heading of the key figures. */
export async function readFigure(page: Page, name: string): Promise<string> {
  return page
    .locator('dl div', { has: page.getByText(name, { exact: false }) })
    .locator('dd')
    .first()
    .innerText()
}

export async function saveSheet(page: Page, number: string): Promise<void> {
  await page.getByRole('button', { name: 'Save a sheet' }).click()
  await page.getByLabel('Sheet number').fill(number)
  await page.getByRole('button', { name: 'Save sheet' }).click()
  await page.waitForURL('**/sheets/*')
  await page.getByRole('heading', { name: 'Links' }).waitFor()
}

/** The address of a new link. */
export async function makeLink(page: Page, recipient: string): Promise<string> {
  await page.getByLabel('For whom').fill(recipient)
  await page.getByRole('button', { name: 'Make a link' }).click()
  return page.locator('[data-test=link-address]').innerText()
}

/** Recomputes on this machine; the largest relative difference from the stored result. */
export async function recompute(page: Page): Promise<number> {
  await page.getByRole('button', { name: 'Recompute' }).click()
  const difference = page.locator('[data-test=largest-difference]')
  await difference.waitFor()
  return Number(await difference.getAttribute('data-value'))
}
