import type { Browser, Locator, Page } from 'playwright-core'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { launchChromium } from '../support/chromium.ts'
import { deskSize, expectSound, openSignedIn, phoneSize } from '../support/journey.ts'
import { startServedApp } from '../support/served-app.ts'
import type { ServedApp } from '../support/served-app.ts'

let browser: Browser
let app: ServedApp

beforeAll(async () => {
  app = await startServedApp()
  await app.as('technician')
  browser = await launchChromium()
}, 180_000)
afterAll(async () => {
  await browser.close()
  await app.stop()
})

const open = (at: string, size = phoneSize): Promise<Page> =>
  openSignedIn(browser, app, 'technician', at, size)
const bar = (page: Page) => page.locator('.bench-bar')
const fillExample = (page: Page) => page.getByRole('button', { name: 'Fill in an example' }).click()

async function placeOf(element: Locator): Promise<{ top: number; bottom: number }> {
  const box = await element.boundingBox()
  if (!box) throw new Error('not laid out')
  return { top: box.y, bottom: box.y + box.height }
}

describe('the result on a phone', () => {
  it('stays in sight at the foot while one types, and leads to its warnings and working', async () => {
    const page = await open('/bench/tank-volume')
    expect(await bar(page).count()).toBe(0)
    await fillExample(page)
    await page.getByRole('textbox', { name: /^Inside length/ }).fill('130')
    // 130 × 50 × 45 cm × 0.88 + 60 L + 1.806 L
    await bar(page).getByText('319 L').waitFor()
    const place = await placeOf(bar(page))
    expect(place.bottom).toBe(phoneSize.height)
    await expectSound(page, 'the bar of a result')
    await page.getByRole('textbox', { name: /^Inside width/ }).fill('')
    await bar(page).getByText('No figure yet. Type the inside width', { exact: false }).waitFor()
    await page.getByRole('textbox', { name: /^Inside width/ }).fill('60')
    await bar(page).getByRole('button').click()
    const result = page.getByRole('region', { name: 'Result' })
    expect((await placeOf(result)).top).toBeLessThan(120)
    expect(await result.evaluate((element) => element === document.activeElement)).toBe(true)
    // past the fields it lies over nothing
    expect((await placeOf(bar(page))).bottom).toBeLessThanOrEqual((await placeOf(result)).top)
  })

  it('says how many warnings the figure has', async () => {
    const page = await open('/bench/wash-out')
    await fillExample(page)
    await bar(page).getByText('1 warning').waitFor()
  })

  it('never covers what is typed in', async () => {
    const page = await open('/bench/bath-dose')
    await fillExample(page)
    await bar(page).waitFor()
    const fields = page.locator('.bench-sheet :is(input, select, [role="radio"])')
    await fields.first().focus()
    let met = 0
    for (let step = 0; step < 40; step += 1) {
      await page.keyboard.press('Tab')
      const focused = page.locator(':focus')
      const where = await page.evaluate(() => {
        const at = document.activeElement
        return at?.closest('.bench-bar') ? 'bar' : at?.closest('.field') ? 'field' : 'elsewhere'
      })
      if (where === 'bar') break
      if (where === 'elsewhere') continue
      met += 1
      const [field, foot] = [await placeOf(focused), await placeOf(bar(page))]
      expect(field.bottom, await focused.getAttribute('name').then(String)).toBeLessThanOrEqual(foot.top)
    }
    expect(met).toBeGreaterThan(12)
  })

  it('stands above the keyboard of the screen', async () => {
    const page = await open('/bench/bath-dose')
    await fillExample(page)
    await bar(page).waitFor()
    const keyboardPx = 320
    const show = (height: number) =>
      page.evaluate((to) => {
        const seen = window.visualViewport
        if (!seen) throw new Error('no visual viewport')
        Object.defineProperty(seen, 'height', { configurable: true, get: () => to })
        seen.dispatchEvent(new Event('resize'))
      }, height)
    await show(phoneSize.height - keyboardPx)
    expect((await placeOf(bar(page))).bottom).toBe(phoneSize.height - keyboardPx)
    await show(phoneSize.height)
    expect((await placeOf(bar(page))).bottom).toBe(phoneSize.height)
    const low = page.getByRole('textbox', { name: /^Strength on the label/ })
    await low.focus()
    await show(phoneSize.height - keyboardPx)
    const [field, foot] = [await placeOf(low), await placeOf(bar(page))]
    expect(foot.bottom).toBe(phoneSize.height - keyboardPx)
    expect(field.bottom).toBeLessThanOrEqual(foot.top)
  })

  it('is told to a reader of the screen once typing has stopped', async () => {
    const page = await open('/bench/tank-volume')
    await fillExample(page)
    const status = page.getByRole('status').filter({ hasText: 'Net volume' })
    await status.waitFor({ state: 'attached' })
    await page.evaluate(() => {
      const told: string[] = []
      Object.assign(window, { told })
      const element = [...document.querySelectorAll('[role="status"]')].find((each) =>
        each.textContent?.startsWith('Net volume'),
      )
      if (!element) throw new Error('no status')
      new MutationObserver(() => void told.push(element.textContent ?? '')).observe(element, {
        characterData: true,
        childList: true,
        subtree: true,
      })
    })
    const length = page.getByRole('textbox', { name: /^Inside length/ })
    await length.fill('')
    await length.pressSequentially('1305.5', { delay: 60 })
    await page.waitForFunction(() => (window as unknown as { told: string[] }).told.length > 0)
    await page.waitForTimeout(300)
    const told = await page.evaluate(() => (window as unknown as { told: string[] }).told)
    expect(told).toEqual([expect.stringMatching(/^Net volume: [\d,]+.L$/)])
    expect(await page.locator('.bench-sheet [aria-live]').count()).toBe(0)
  })
})

describe('a long figure on a phone', () => {
  it('stays within the sheet', async () => {
    const page = await open('/bench/unit-conversion')
    await fillExample(page)
    await page.getByRole('region', { name: 'Result' }).getByText('378.5411784').first().waitFor()
    await expectSound(page, 'a figure of ten digits')
    await page.goto(`${app.url}/bench/wash-out`)
    await page
      .getByLabel('What to find', { exact: true })
      .selectOption({ label: 'What is left after a time' })
    for (const [name, value] of [
      ['Net volume of the water', '1000'],
      ['Flow of clean water', '25'],
      ['Concentration at the start', '10'],
      ['Time that it flows', '3000'],
    ] as const)
      await page.getByRole('textbox', { name: new RegExp(`^${name}`) }).fill(value)
    await page.getByRole('img', { name: /^Curve:/ }).waitFor()
    await expectSound(page, 'a figure of thirty zeros')
  })
})

describe('the result on a desk', () => {
  it('stands beside the fields, and not at the foot as well', async () => {
    const page = await open('/bench/bath-dose', deskSize)
    await fillExample(page)
    await page.getByRole('region', { name: 'Result' }).getByText(/^189/).waitFor()
    expect(await bar(page).isVisible()).toBe(false)
  })
})
