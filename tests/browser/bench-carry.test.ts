import type { Browser, Page } from 'playwright-core'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { anEnclosure } from '../builders/a-water.ts'
import { aBathWater, readingsNow } from '../builders/an-order.ts'
import { launchChromium } from '../support/chromium.ts'
import { choose, deskSize, expectSound, openSignedIn, phoneSize } from '../support/journey.ts'
import { startServedApp } from '../support/served-app.ts'
import type { ServedApp } from '../support/served-app.ts'

let browser: Browser
let app: ServedApp

beforeAll(async () => {
  app = await startServedApp()
  const tank = await aBathWater(app, 'QT-7')
  await readingsNow(app, tank.waterBodyId, { salinity: ['33.1', 'PSS-78'] }, '2026-12-01T15:20:00Z')
  await readingsNow(app, tank.waterBodyId, { 'copper-free': ['0.12', 'mg/L'] }, '2026-11-28T15:20:00Z')
  await anEnclosure(app, 'QT-8')
  browser = await launchChromium()
}, 180_000)
afterAll(async () => {
  await browser.close()
  await app.stop()
})

const signedIn = (who: string, size: typeof deskSize, at: string): Promise<Page> =>
  openSignedIn(browser, app, who, at, size)
const field = (page: Page, name: string) => page.getByRole('textbox', { name: new RegExp(`^${name}`) })
const enclosure = 'Figures from an enclosure'

describe.each([deskSize, phoneSize])('figures of an enclosure at $width px', (size) => {
  it('stand in the fields with age and source, can be changed and taken back, and are unknown where nobody knows', async () => {
    const page = await signedIn('technician', size, '/bench/salinity-change')
    await choose(page, new RegExp(enclosure), 'QT-7')
    await page.getByText(/QT-7: 33\.1.*, read 3\sh ago by Test technician\./).waitFor()
    expect(await field(page, 'Salinity now').inputValue()).toBe('33.1')
    expect(await field(page, 'Net volume of the water').inputValue()).toBe('2181.4')
    expect(Number(await field(page, 'Error of the volume').inputValue())).toBeGreaterThan(0)
    await page
      .getByText(/QT-7: 2,180.*\(inside measures\), found .* ago by Test technician and confirmed/)
      .waitFor()
    await expectSound(page, 'figures of an enclosure')

    await field(page, 'Salinity now').fill('30')
    await page.getByText(/^Changed by you\. QT-7: 33\.1/).waitFor()
    await page.getByRole('button', { name: /^Take 33\.1.*Salinity now/ }).click()
    expect(await field(page, 'Salinity now').inputValue()).toBe('33.1')
    await field(page, 'Net volume of the water').fill('2000')
    await choose(page, new RegExp(enclosure), 'QT-8')
    await page.getByText('QT-8: no reading of salinity. Unknown.').waitFor()
    await page.getByText(/QT-8: no volume to dose by/).waitFor()
    expect(await field(page, 'Salinity now').inputValue()).toBe('')
    // what a person typed is theirs
    expect(await field(page, 'Net volume of the water').inputValue()).toBe('2000')

    await page.goto(`${app.url}/bench/copper-sulfate`)
    await page.getByLabel('What the target is of', { exact: true }).selectOption('copper')
    await choose(page, new RegExp(enclosure), 'QT-7')
    await page.getByText(/Too old: it counts for 24\shours/).waitFor()
    expect(await field(page, 'Free copper by a test').inputValue()).toBe('0.12')
    await expectSound(page, 'an old reading')
    await page.getByRole('button', { name: 'Empty the fields' }).click()
    expect(await page.getByRole('combobox', { name: new RegExp(enclosure) }).inputValue()).toBe('')

    await page.goto(`${app.url}/bench/tank-volume`)
    await page.getByRole('heading', { name: /Volume of a tank/ }).waitFor()
    expect(await page.getByRole('combobox', { name: new RegExp(enclosure) }).count()).toBe(0)
    await page.context().close()
  })
})
