import type { Browser, Page } from 'playwright-core'
import { afterAll, beforeAll, describe, expect, inject, it } from 'vitest'
import {
  makeLink,
  makeSection,
  openAs,
  openJob,
  readFigure,
  recompute,
  saveSheet,
  waitForCurve,
} from './actions.ts'
import { launchBrowser, openProfile, takePicture } from './browser.ts'

const baseUrl = inject('baseUrl')

/** Middle of the centre handle of a spiral, px. */
async function findCentre(page: Page, spiral: string): Promise<{ x: number; y: number }> {
  const box = await page.locator(`[data-centre="${spiral}"]`).boundingBox()
  if (!box) throw new Error(`Spiral ${spiral} is not on the drawing`)
  return { x: box.x + box.width / 2, y: box.y + box.height / 2 }
}

/** Until the result of the latest input is in. */
async function readUltimate(page: Page, before: string): Promise<string> {
  await page.waitForFunction(
    (old) => {
      const stale = document.querySelector('.marks.stale')
      const first = document.querySelector('.figures dd')?.textContent?.trim()
      return !stale && first !== undefined && first !== old
    },
    before,
    { timeout: 10_000 },
  )
  return readFigure(page, 'Ultimate curvature')
}

describe('the main job, from sign-in to the checker’s link', () => {
  let browser: Browser
  beforeAll(async () => {
    browser = await launchBrowser()
  })
  afterAll(() => browser?.close())

  it('draws, compares, saves, links, and comes to the same numbers on another machine', async () => {
    const { page, faults } = await openAs(browser, baseUrl, 'rosa')
    await openJob(page)
    await makeSection(page, 'Pier 5 column', 'Centre and four corner spirals')
    const start = await readFigure(page, 'Ultimate curvature')

    // Drag a corner spiral: its mirror images go with it, and the curve follows.
    const from = await findCentre(page, 'K1')
    await page.mouse.move(from.x, from.y)
    await page.mouse.down()
    await page.mouse.move(from.x - 6, from.y + 6)
    await page.mouse.move(from.x - 14, from.y + 14, { steps: 4 })
    await page.mouse.up()
    await waitForCurve(page)
    const dragged = await findCentre(page, 'K1')
    expect(dragged.x).toBeLessThan(from.x - 4)
    const mirrored = await findCentre(page, 'K3')
    const middle = await findCentre(page, 'C')
    expect(mirrored.x - middle.x).toBeCloseTo(middle.x - dragged.x, 0)

    // One drag is one undo step.
    await page.getByRole('button', { name: 'Undo' }).click()
    await waitForCurve(page)
    expect((await findCentre(page, 'K1')).x).toBeCloseTo(from.x, 0)
    expect(await page.getByRole('button', { name: 'Undo' }).isDisabled()).toBe(true)
    await page.getByRole('button', { name: 'Redo' }).click()
    await waitForCurve(page)

    // Change the pitch by value.
    const before = await readFigure(page, 'Ultimate curvature')
    expect(before).not.toBe(start)
    const pitch = page.getByLabel('Pitch of C, mm')
    await pitch.fill('70')
    await pitch.press('Enter')
    const closer = await readUltimate(page, before)
    expect(Number.parseFloat(closer)).toBeGreaterThan(Number.parseFloat(before))

    // A bad value is explained at its field, and the last sound curve stays, marked as stale.
    await pitch.fill('12')
    await pitch.press('Enter')
    await page.getByText('must be larger than the bar of the spiral').first().waitFor()
    await page.locator('.marks.stale').waitFor()
    expect(await pitch.inputValue()).toBe('12')
    expect(await page.getByRole('button', { name: 'Save a sheet' }).isDisabled()).toBe(true)
    await pitch.fill('70')
    await pitch.press('Enter')
    await waitForCurve(page)

    // Compare pitches.
    await page.getByRole('tab', { name: 'Pitch comparison' }).click()
    await page.getByLabel('Pitches of all spirals, mm').fill('60, 80, 100')
    await page.getByRole('button', { name: 'Compare pitches' }).click()
    const rows = page.locator('.pitch-panel tbody tr')
    await rows.nth(2).waitFor()
    const ultimates = await rows.evaluateAll((all) =>
      all.map((row) => Number(row.querySelectorAll('td')[1].textContent)),
    )
    expect(ultimates).toHaveLength(3)
    expect([...ultimates].sort((a, b) => b - a)).toEqual(ultimates)
    await takePicture(page, 'e2e-pitches')
    await page.getByRole('tab', { name: 'Moment-curvature' }).click()
    await waitForCurve(page)

    // Save a sheet, make a link, open it in a fresh profile and recompute there.
    await saveSheet(page, 'P5-01')
    const address = await makeLink(page, 'Kofi Oduya, checker')
    expect(await recompute(page)).toBeLessThan(1e-6)
    expect(faults).toEqual([])

    const visitor = await openProfile(browser, { viewport: { width: 390, height: 844 } })
    await visitor.page.goto(address)
    await visitor.page.getByRole('heading', { name: 'Pier 5 column' }).waitFor()
    const difference = await recompute(visitor.page)
    expect(difference).toBeLessThan(1e-6)
    for (const text of [
      'sha256:',
      'licensed engineer',
      'not validated by test',
      'Spiral',
      'read only, until',
    ]) {
      expect(await visitor.page.getByText(text, { exact: false }).first().isVisible()).toBe(true)
    }
    console.log(`largest relative difference on the visitor's machine: ${difference}`)
    await takePicture(visitor.page, 'e2e-link', true)
    expect(visitor.faults).toEqual([])
    await visitor.context.close()
  })

  it('follows the hand: the delay from a drag step to the new curve', async () => {
    const { page, context } = await openAs(browser, baseUrl, 'rosa')
    await openJob(page)
    await makeSection(page, 'Pier 6 column', 'Centre and four corner spirals')
    const from = await findCentre(page, 'K1')
    await page.mouse.move(from.x, from.y)
    await page.mouse.down()
    // With Alt nothing snaps: every step changes the section.
    await page.keyboard.down('Alt')
    await page.mouse.move(from.x - 5, from.y + 5)
    const delays: number[] = []
    for (let step = 0; step < 50; step++) {
      const reach = 6 + (step % 10)
      // Time in the page: from the pointer's move to the frame after the curve that belongs to it was drawn.
      await page.evaluate(() => {
        const watched = window as typeof window & { drawn?: Promise<number> }
        const begun = new Promise<number>((resolve) =>
          addEventListener('pointermove', () => resolve(performance.now()), { once: true, capture: true }),
        )
        watched.drawn = begun.then(
          (startedAt) =>
            new Promise((resolve) => {
              const panel = document.querySelector('[data-delay]')
              const before = panel?.getAttribute('data-delay')
              const poll = () => {
                const fresh =
                  panel?.getAttribute('data-delay') !== before && !document.querySelector('.marks.stale')
                if (fresh || performance.now() - startedAt > 2000) resolve(performance.now() - startedAt)
                else requestAnimationFrame(poll)
              }
              requestAnimationFrame(poll)
            }),
        )
      })
      await page.mouse.move(from.x - reach, from.y + reach)
      delays.push(
        await page.evaluate(
          () => (window as typeof window & { drawn?: Promise<number> }).drawn ?? Number.NaN,
        ),
      )
    }
    await page.mouse.up()
    await page.keyboard.up('Alt')
    const sorted = [...delays].sort((a, b) => a - b)
    const p95 = sorted[Math.ceil(0.95 * sorted.length) - 1]
    console.log(
      `drag step to new curve drawn, ms over ${delays.length}: median ${sorted[25].toFixed(1)}, 95th percentile ${p95.toFixed(1)}`,
    )
    // Speed is recorded here and judged in the benchmark; what is tested is that every step was answered.
    expect(delays.every((delay) => delay < 2000)).toBe(true)
    await context.close()
  })
})
