import type { Browser, Page } from 'playwright-core'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { launchChromium } from '../support/chromium.ts'
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

const field = (page: Page, name: string) => page.getByRole('textbox', { name: new RegExp(`^${name}`) })
const result = (page: Page) => page.getByRole('region', { name: 'Result' })
/** A choice is a list, or buttons side by side where its answers are few and short. */
const choose = async (page: Page, name: string, label: string) => {
  const list = page.getByRole('combobox', { name: new RegExp(`^${name}( \\(optional\\))?$`) })
  const button = page.getByRole('radiogroup', { name }).getByRole('radio', { name: label, exact: true })
  await list.or(button).first().waitFor()
  await ((await list.isVisible()) ? list.selectOption({ label }) : button.click())
}

describe.each([deskSize, phoneSize])('the water on the bench at $width px', (size) => {
  it('says how much of the saturation a reading is, and asks where the air pressure comes from', async () => {
    const page = await openSignedIn(browser, app, 'technician', '/bench/oxygen-saturation', size)
    await choose(page, 'What to find', 'Percent of saturation, from a reading')
    await field(page, 'Temperature of the water').fill('25')
    await field(page, 'Salinity').fill('35')
    await field(page, 'Oxygen measured').fill('6')
    await result(page).getByText('A weather report gives it reduced to sea level', { exact: false }).waitFor()
    await choose(page, 'Where the air pressure comes from', 'A barometer here, not reduced to sea level')
    await field(page, 'Air pressure by the barometer').fill('1013.25')
    // check value do.sat02: 88.6 % ± 0.02
    await result(page)
      .getByText(/^88\.6/)
      .first()
      .waitFor()
    await field(page, 'Altitude of the barometer').fill('500')
    await page.getByText('is not what the weather makes at this altitude', { exact: false }).waitFor()
    expect(await page.getByRole('table', { name: 'Working' }).innerText()).toContain('Garcia and Gordon')
    await expectSound(page, 'oxygen saturation')
    await picture(page, 'oxygen-saturation')
    await page.context().close()
  })

  it('gives the salinity of a conductivity once it is said whether the meter compensates', async () => {
    const page = await openSignedIn(browser, app, 'technician', '/bench/salinity-from-conductivity', size)
    await choose(page, 'What the meter shows', 'Conductivity as it is, without compensation')
    await field(page, 'Conductivity').fill('53.071')
    await field(page, 'Temperature of the sample').fill('25')
    // check value cond.10
    await result(page)
      .getByText(/^35\.00/)
      .first()
      .waitFor()
    await choose(page, 'What the meter shows', 'Conductivity compensated to 25 °C')
    await page.getByText('meters compensate along a straight line', { exact: false }).waitFor()
    await expectSound(page, 'salinity from conductivity')
    await picture(page, 'salinity-from-conductivity')
    await page.context().close()
  })
})
