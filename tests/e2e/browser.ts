import { mkdirSync } from 'node:fs'
import { chromium, type Browser, type BrowserContext, type Page } from 'playwright-core'
import { findChromium } from '../helpers/chromium.mjs'

/** Where pictures go when `GIRDWELL_PICTURES` names a folder; otherwise none are taken. */
const pictures = process.env.GIRDWELL_PICTURES

export async function launchBrowser(): Promise<Browser> {
  return chromium.launch({
    executablePath: findChromium(),
    args: [
      '--disable-gpu',
      '--disable-quic',
      '--no-first-run',
      '--disable-background-networking',
      '--disable-component-update',
      '--disable-sync',
    ],
  })
}

/** A fresh profile: no cookies, nothing stored. Faults of the page are collected, so that a test can ask for none. */
export async function openProfile(
  browser: Browser,
  options: Parameters<Browser['newContext']>[0] = {},
): Promise<{ context: BrowserContext; page: Page; faults: string[] }> {
  const context = await browser.newContext({
    viewport: { width: 1440, height: 900 },
    reducedMotion: 'reduce',
    ...options,
  })
  // Generous: a machine that runs other work may starve a browser for seconds.
  context.setDefaultTimeout(30_000)
  const page = await context.newPage()
  const faults: string[] = []
  page.on('pageerror', (error) => faults.push(`page error: ${error.message}`))
  page.on('console', (message) => {
    if (message.type() === 'error' || message.type() === 'warning') faults.push(`console: ${message.text()}`)
  })
  return { context, page, faults }
}

export async function takePicture(page: Page, name: string, fullPage = false): Promise<void> {
  if (!pictures) return
  mkdirSync(pictures, { recursive: true })
  await page.screenshot({ path: `${pictures}/${name}.png`, fullPage })
}
