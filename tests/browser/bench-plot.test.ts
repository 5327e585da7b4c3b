import type { Browser, Page } from 'playwright-core'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { launchChromium } from '../support/chromium.ts'
import type { SessionOptions } from '../support/chromium.ts'
import { deskSize, expectSound, openSignedIn, phoneSize, picture } from '../support/journey.ts'
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

const open = (at: string, options: SessionOptions): Promise<Page> =>
  openSignedIn(browser, app, 'technician', at, options)
const field = (page: Page, name: string) => page.getByRole('textbox', { name: new RegExp(`^${name}`) })
const curve = (page: Page) => page.getByRole('img', { name: /^Curve:/ })

async function askWhatIsLeft(page: Page): Promise<void> {
  await page.getByLabel('What to find', { exact: true }).selectOption({ label: 'What is left after a time' })
  await field(page, 'Net volume of the water').fill('1000')
  await field(page, 'Flow of clean water').fill('25')
  await field(page, 'Concentration at the start').fill('10')
}

describe.each([deskSize, { ...phoneSize, theme: 'dark' as const }])('a curve at $width px', (size) => {
  it('is drawn once the question is whole, follows what is typed, and stands in a table too', async () => {
    const page = await open('/bench/wash-out', size)
    await askWhatIsLeft(page)
    expect(await curve(page).count()).toBe(0)
    await field(page, 'Time that it flows').fill('60')
    await curve(page).getByText('as typed: 2.231 mg/L', { exact: true }).waitFor()
    await field(page, 'Time that it flows').fill('120')
    // 10 mg/L × exp(−25 ÷ 1000 × 120)
    await curve(page).getByText('as typed: 0.4979 mg/L', { exact: true }).waitFor()
    await page.getByText('Show as a table').click()
    const table = page.getByRole('table', { name: 'How it changes' })
    await table.getByRole('row', { name: /as typed 120/ }).waitFor()
    expect(await table.getByRole('row').count()).toBeLessThanOrEqual(42)
    await expectSound(page, 'a curve')
    await field(page, 'Flow of clean water').fill('')
    await curve(page).waitFor({ state: 'detached' })
  })

  it('shows the days of a plan', async () => {
    const page = await open('/bench/salinity-change', size)
    await page.getByRole('button', { name: 'Fill in an example' }).click()
    await curve(page).waitFor()
    expect(await curve(page).locator('circle').count()).toBe(7)
    await expectSound(page, 'the curve of a plan')
  })

  it('prints in black on white', async () => {
    const page = await open('/bench/wash-out', size)
    await askWhatIsLeft(page)
    await field(page, 'Time that it flows').fill('60')
    await curve(page).waitFor()
    await page.emulateMedia({ media: 'print' })
    const colours = await curve(page).evaluate((svg) =>
      [...svg.querySelectorAll('*')].flatMap((each) => {
        const { stroke, fill } = getComputedStyle(each)
        return each.matches('path, polyline, circle, rect, text') ? [stroke, fill] : []
      }),
    )
    const coloured = colours.filter((colour) => {
      const [red, green, blue] = /rgb\((\d+), (\d+), (\d+)\)/.exec(colour)?.slice(1) ?? []
      return red !== green || green !== blue
    })
    expect(colours.length).toBeGreaterThan(20)
    expect(coloured).toEqual([])
    expect(colours).toContain('rgb(0, 0, 0)')
    await picture(page, 'curve-printed')
  })
})
