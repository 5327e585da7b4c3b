import type { Browser, Page } from 'playwright-core'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { expectAccessible } from '../support/axe.ts'
import { launchChromium } from '../support/chromium.ts'
import { deskSize, openSignedIn, phoneSize, picture, refusals } from '../support/journey.ts'
import { startServedApp } from '../support/served-app.ts'
import type { ServedApp } from '../support/served-app.ts'

let browser: Browser
let app: ServedApp
beforeAll(async () => {
  app = await startServedApp()
  await app.as('administrator')
  await app.as('keeper')
  await app.as('veterinarian')
  browser = await launchChromium()
}, 180_000)
afterAll(async () => {
  await browser.close()
  await app.stop()
})

/** Pictures for whoever looks, in the ignored folder; only when asked for. */
/** A link out of a form with something typed in it asks first, and the way back keeps what was typed. */
async function staysUnlessLeft(page: Page, link: string): Promise<void> {
  const before = page.url()
  await page.getByRole('link', { name: link, exact: true }).click()
  await page.getByRole('alertdialog', { name: 'Leave without keeping it?' }).waitFor()
  await page.getByRole('button', { name: 'Go on writing' }).click()
  expect(page.url()).toBe(before)
}

const expectedErrors = refusals(409, 422)

describe.each([
  { ...deskSize, expectedErrors },
  { ...phoneSize, expectedErrors },
])('the administrator at $width px', (size) => {
  it('enters a person, is told what is wrong, enters a licence and voids it', async () => {
    const email = `jo${String(size.width)}@harrow-point.example`
    const page = await openSignedIn(browser, app, 'administrator', '/settings/people', size)
    await page.getByRole('link', { name: 'Test keeper' }).waitFor()
    await expectAccessible(page, 'people')
    await picture(page, 'people')
    expect(await page.evaluate(() => document.documentElement.scrollWidth)).toBeLessThanOrEqual(size.width)

    await page.getByRole('link', { name: 'Enter a person' }).click()
    await page.getByRole('button', { name: 'Enter this person' }).click()
    await page.getByText('Choose at least one role').waitFor()
    await page.getByRole('textbox', { name: 'Name', exact: true }).fill('Dr Jo Calder')
    await page.getByRole('textbox', { name: 'E-mail' }).fill('keeper@harrow-point.example')
    await page.getByRole('checkbox', { name: 'Veterinarian' }).check()
    await page.getByRole('button', { name: 'Enter this person' }).click()
    await page.getByText('Somebody already signs in with this e-mail').waitFor()
    await page.getByRole('textbox', { name: 'E-mail' }).fill(email)
    await staysUnlessLeft(page, 'Go back')
    await expectAccessible(page, 'new person')
    await page.getByRole('button', { name: 'Enter this person' }).click()
    await page.getByText(/^[a-z2-9]{4}-[a-z2-9]{4}-[a-z2-9]{4}$/).waitFor()
    await picture(page, 'new-person')
    await page.getByRole('link', { name: 'Dr Jo Calder' }).click()

    await page.getByRole('button', { name: 'Enter a licence' }).click()
    // which of the two it is nobody presumes
    expect(await page.getByLabel('What it is').inputValue()).toBe('')
    await page.getByRole('textbox', { name: 'Jurisdiction' }).fill('Norrell Sound')
    await page.getByRole('textbox', { name: 'Licence number' }).fill('VL-9')
    await page.getByLabel('First day').fill('2026-01-01')
    await page.getByLabel('Last day').fill('2025-01-01')
    await page.getByRole('button', { name: 'Enter a licence' }).click()
    await page.getByText('Say which of the two it is').waitFor()
    await page.getByLabel('What it is').selectOption('Licence to practise')
    await page.getByRole('button', { name: 'Enter a licence' }).click()
    await page.getByText('The last day has to be on or after the first day.').waitFor()
    await picture(page, 'licence-form')
    await page.getByLabel('Last day').fill('2027-01-01')
    await staysUnlessLeft(page, 'People and licences')
    await page.getByRole('button', { name: 'Enter a licence' }).click()
    await page.getByText('Norrell Sound, VL-9: valid').waitFor()
    await picture(page, 'person')
    await expectAccessible(page, 'person')
    await page.getByRole('button', { name: 'Void, VL-9' }).click()
    await page.getByRole('textbox', { name: 'Reason' }).fill('entered for the wrong person')
    await page.getByRole('button', { name: 'Void the licence' }).click()
    await page.getByText('Norrell Sound, VL-9: void').waitFor()
    expect(await page.getByText('entered for the wrong person').isVisible()).toBe(true)
  })

  it('proposes and confirms a setting, and finds it in the audit trail', async () => {
    const page = await openSignedIn(browser, app, 'administrator', '/settings/facility', size)
    const paper = page.getByRole('textbox', { name: 'New value of: Paper' })
    await paper.fill('A5')
    await paper.press('Enter')
    await page.getByText('Choose one of the values offered.').waitFor()
    await paper.fill('Letter')
    await paper.press('Enter')
    await page.getByRole('button', { name: 'Confirm' }).click()
    await page.getByText('Confirmed and in force').waitFor()
    await expectAccessible(page, 'facility settings')
    await picture(page, 'facility')

    await page.goto(`${app.url}/settings/audit?q=setting.confirm`)
    await page.getByRole('cell', { name: 'setting Paper' }).first().waitFor()
    await expectAccessible(page, 'audit trail')
    await picture(page, 'audit')
  })
})

it('tells somebody who may not manage people why the sheet is shut', async () => {
  const page = await openSignedIn(browser, app, 'keeper', '/settings/people', {
    ...deskSize,
    expectedErrors: refusals(403),
  })
  await page.getByText(/This is for an administrator/).waitFor()
})
