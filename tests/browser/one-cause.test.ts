import type { Browser } from 'playwright-core'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { aFormalinHouse } from '../builders/a-bath.ts'
import type { BathTank, FormalinHouse } from '../builders/a-bath.ts'
import { aDraft } from '../builders/an-order.ts'
import { launchChromium } from '../support/chromium.ts'
import { deskSize, expectSound, openSignedIn, phoneSize, refusals } from '../support/journey.ts'
import { startServedApp } from '../support/served-app.ts'
import type { ServedApp } from '../support/served-app.ts'

let browser: Browser
let app: ServedApp
let house: FormalinHouse
let bath: BathTank
beforeAll(async () => {
  app = await startServedApp()
  house = await aFormalinHouse(app)
  bath = await house.tankWithSchool()
  browser = await launchChromium()
}, 180_000)
afterAll(async () => {
  await browser.close()
  await app.stop()
})

const expectedErrors = refusals(409)
const desk = { ...deskSize, expectedErrors }
const phone = { ...phoneSize, expectedErrors }

describe.each([desk, phone])('cautions of one cause at $width px', (size) => {
  it('are one block on the order form, under the stop, with one tick and a reason of its own', async () => {
    const draft = await aDraft(
      app,
      house.fieldsOf(bath, { setting: 'pond', target: { value: '200', unit: 'uL/L' }, contactMinutes: 30 }),
    )
    const page = await openSignedIn(browser, app, 'veterinarian', `/orders/${draft.number}/edit`, size)
    const block = page
      .locator('.caution-stop')
      .filter({ hasText: /one cause, \d rules/ })
      .filter({ hasText: 'Stop R03:' })
    await block.waitFor()
    expect(await block.innerText()).toMatch(/Warning R06:/)
    const tick = block.getByRole('checkbox', { name: /I have read each of these: .*R06|I have read this/ })
    await tick.focus()
    await page.keyboard.press('Space')
    expect(await tick.isChecked()).toBe(true)
    await block.getByLabel('Why R03 is overridden').fill('the keeper read the pond by hand')
    await expectSound(page, 'one cause on the form')
  })

  it('are one row of the bath sheet, each rule with what was found', async () => {
    const other = await house.tankWithSchool()
    const number = await house.signedBath(other)
    const page = await openSignedIn(
      browser,
      app,
      'technician',
      `/orders/${number}/sheet?dose=1&part=whole`,
      size,
    )
    const row = page.getByRole('listitem').filter({ hasText: 'R01: Oxygen at least' })
    await row.waitFor()
    const said = (await row.innerText()).replace(/\s+/g, ' ')
    expect(said).toContain('R31: Water tested')
    // where it is resolved stands once
    expect(await row.getByRole('link').count()).toBe(1)
    await expectSound(page, 'one cause on the sheet')
  })
})
