import type { Browser } from 'playwright-core'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { anEnclosure } from '../builders/a-water.ts'
import { launchChromium } from '../support/chromium.ts'
import { choose, deskSize, openSignedIn, phoneSize } from '../support/journey.ts'
import { startServedApp } from '../support/served-app.ts'
import type { ServedApp } from '../support/served-app.ts'

let browser: Browser
let app: ServedApp

beforeAll(async () => {
  app = await startServedApp()
  await app.as('veterinarian')
  await anEnclosure(app, 'QT-7')
  browser = await launchChromium()
}, 180_000)
afterAll(async () => {
  await browser.close()
  await app.stop()
})

// the browser's own line about a request without a network
const expectedErrors = [/ERR_INTERNET_DISCONNECTED/, /status of 401 /, /Failed to fetch dynamically imported/]

describe.each([deskSize, phoneSize])('without a network at $width px', (size) => {
  it('a calculator that is open goes on, and says what it cannot do', async () => {
    const at = '/bench/tank-volume'
    const page = await openSignedIn(browser, app, 'veterinarian', at, { ...size, expectedErrors })
    await page.getByRole('button', { name: 'Fill in an example' }).click()
    await choose(page, 'For which enclosure', 'QT-7')
    await page.context().setOffline(true)
    // 130 × 50 × 45 cm × 0.88 + 60 L + 1.806 L
    await page.getByRole('textbox', { name: /^Inside length/ }).fill('130')
    const result = page.getByRole('region', { name: 'Result' })
    await result.getByText(/^319/).first().waitFor()
    await page.getByRole('table', { name: 'Working' }).waitFor()

    await page.getByRole('button', { name: 'Print as PDF' }).click()
    await page.getByRole('alert').getByText('The server did not answer').first().waitFor()
    await page.getByRole('button', { name: 'Use as this water’s volume' }).click()
    await page
      .getByRole('alert')
      .getByText(/no network/i)
      .waitFor()
    // nothing of it is lost
    expect(new URL(page.url()).pathname).toBe(at)
    expect(await page.getByRole('textbox', { name: /^Inside length/ }).inputValue()).toBe('130')
    await page.context().setOffline(false)
    await page
      .getByRole('alert')
      .filter({ hasText: /no network/i })
      .waitFor({ state: 'detached' })
    await page.getByRole('button', { name: 'Use as this water’s volume' }).click()
    await page.waitForURL(/\/volume$/)
    await page.getByRole('region', { name: 'From the bench' }).waitFor()
  })
})
