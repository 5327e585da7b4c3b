import type { Browser, Page } from 'playwright-core'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { aProduct } from '../builders/an-order.ts'
import { launchChromium } from '../support/chromium.ts'
import { deskSize, expectSound, openSignedIn, phoneSize, picture, refusals } from '../support/journey.ts'
import { startServedApp } from '../support/served-app.ts'
import type { ServedApp } from '../support/served-app.ts'

let browser: Browser
let app: ServedApp

beforeAll(async () => {
  app = await startServedApp()
  await app.composition.formulary.service.loadDefaults()
  await app.as('veterinarian')
  await aProduct(app, {})
  await aProduct(app, {
    agent: 'copper-sulfate',
    productName: 'Copper sulfate pentahydrate, fine crystals from the treatment room of the quarantine wing',
    form: 'crystals',
    strength: { value: '99', unit: 'percent_w_w' },
    strengthBasis: 'salt',
  })
  browser = await launchChromium()
}, 180_000)
afterAll(async () => {
  await browser.close()
  await app.stop()
})

const expectedErrors = refusals(403, 409, 422)
const desk = { ...deskSize, expectedErrors }
const phone = { ...phoneSize, expectedErrors }
const signedIn = (who: string, size: typeof desk, at: string): Promise<Page> =>
  openSignedIn(browser, app, who, at, size)

describe.each([desk, phone])('the formulary at $width px', (size) => {
  it('shows each range with its source and mark, and who confirmed it; a lot can be noted', async () => {
    const page = await signedIn('veterinarian', size, '/pharmacy/formulary')
    await page.getByRole('heading', { name: 'Formulary' }).waitFor()
    await expectSound(page, 'the formulary')
    await picture(page, 'formulary')
    if (size === phone) await page.getByText('Filters', { exact: true }).click()
    await page.getByLabel('Drug', { exact: true }).selectOption('formalin')
    await page.waitForURL(/drug=formalin/)
    const line = size === desk ? /external parasites, bath/ : /left in the water/
    const row = page.getByRole('row').filter({ hasText: line }).first()
    await page.getByLabel('Drug', { exact: true }).selectOption(size === desk ? 'formalin' : 'praziquantel')
    await row.waitFor()
    await row.getByRole('link').click()
    await page.getByText(/^(V|V2|C|M|P): /).waitFor()
    await page.getByRole('button', { name: 'Confirm for this facility' }).click()
    await page.getByLabel('How it was checked').fill('Read in the edition of 2015 beside the label')
    await page.getByRole('dialog').getByRole('button', { name: 'Confirm for this facility' }).click()
    await page.getByText(/Test veterinarian, \d/).waitFor()
    expect(await page.getByText('Confirmed here').isVisible()).toBe(true)
    await expectSound(page, 'a dose line')
    await picture(page, 'dose-line')

    await page.goto(`${app.url}/pharmacy/formulary?q=copper`)
    await page
      .getByRole('button', { name: /Note what happened to lot/ })
      .first()
      .click()
    await page.getByRole('button', { name: 'Note it' }).click()
    await page.getByText('Choose what happened.').waitFor()
    await page.getByLabel('What happened', { exact: true }).selectOption('looked-at')
    await page.getByRole('button', { name: 'Note it' }).click()
    await page
      .getByText(/looked at and found clear/)
      .first()
      .waitFor()
  })
})
