import type { Browser, Page } from 'playwright-core'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { aProduct } from '../builders/an-order.ts'
import { password } from '../support/api.ts'
import { expectAccessible } from '../support/axe.ts'
import { launchChromium, newSession } from '../support/chromium.ts'
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

const expectedErrors = [
  /401 \(Unauthorized\)/,
  /403 \(Forbidden\)/,
  /409 \(Conflict\)/,
  /422 \(Unprocessable/,
]
const desk = { width: 1440, height: 900, expectedErrors }
const phone = { width: 390, height: 844, expectedErrors }

const picture = async (page: Page, name: string) => {
  const folder = process.env['PRATIQUE_PICTURES']
  if (folder) await page.screenshot({ path: `${folder}/${name}.png`, fullPage: true })
}

async function signedIn(email: string, size: typeof desk, at: string): Promise<Page> {
  const { page } = await newSession(browser, size)
  await page.goto(`${app.url}${at}`)
  await page.getByRole('textbox', { name: 'E-mail' }).fill(`${email}@harrow-point.example`)
  await page.getByRole('textbox', { name: 'Password' }).fill(password)
  await page.getByRole('button', { name: 'Sign in' }).click()
  await page.waitForURL((url) => url.pathname === at.replace(/\?.*/, ''))
  return page
}

/** Accessible, and nothing sticks out at the side. */
async function expectSound(page: Page, where: string): Promise<void> {
  await expectAccessible(page, where)
  const { scrolls, width } = await page.evaluate(() => ({
    scrolls: document.documentElement.scrollWidth,
    width: window.innerWidth,
  }))
  expect(scrolls, `${where} at ${String(width)} px`).toBeLessThanOrEqual(width)
}

describe.each([desk, phone])('the formulary at $width px', (size) => {
  it('shows each range with its source and mark, and who confirmed it; a lot can be noted', async () => {
    const page = await signedIn('veterinarian', size, '/pharmacy/formulary')
    await page.getByRole('heading', { name: 'Formulary' }).waitFor()
    await expectSound(page, 'the formulary')
    await picture(page, `formulary-${String(size.width)}`)
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
    await picture(page, `dose-line-${String(size.width)}`)

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
