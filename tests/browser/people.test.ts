import path from 'node:path'
import type { Browser, Page } from 'playwright-core'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { password } from '../support/api.ts'
import { expectAccessible } from '../support/axe.ts'
import { launchChromium, newSession } from '../support/chromium.ts'
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
const picture = async (page: Page, name: string) => {
  const folder = process.env['PRATIQUE_PICTURES']
  if (folder) await page.screenshot({ path: path.join(folder, `${name}.png`), fullPage: true })
}

async function signIn(page: Page, email: string, to: string): Promise<void> {
  await page.goto(`${app.url}${to}`)
  await page.getByRole('textbox', { name: 'E-mail' }).fill(email)
  await page.getByRole('textbox', { name: 'Password' }).fill(password)
  await page.getByRole('button', { name: 'Sign in' }).click()
}

// The first question of a page is who is signed in; refusals of forms are what this journey is about
const expectedRefusals = [/401 \(Unauthorized\)/, /409 \(Conflict\)/, /422 \(Unprocessable/]
const sizes = [
  { width: 1440, height: 900, expectedErrors: expectedRefusals },
  { width: 390, height: 844, expectedErrors: expectedRefusals },
]

describe.each(sizes)('the administrator at $width px', (size) => {
  it('enters a person, is told what is wrong, enters a licence and voids it', async () => {
    const { page } = await newSession(browser, size)
    const email = `jo${String(size.width)}@harrow-point.example`
    await signIn(page, 'administrator@harrow-point.example', '/settings/people')
    await page.getByRole('link', { name: 'Test keeper' }).waitFor()
    await expectAccessible(page, 'people')
    await picture(page, `people-${String(size.width)}`)
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
    await expectAccessible(page, 'new person')
    await page.getByRole('button', { name: 'Enter this person' }).click()
    await page.getByText(/^[a-z2-9]{4}-[a-z2-9]{4}-[a-z2-9]{4}$/).waitFor()
    await picture(page, `new-person-${String(size.width)}`)
    await page.getByRole('link', { name: 'Dr Jo Calder' }).click()

    await page.getByRole('button', { name: 'Enter a licence' }).click()
    await page.getByRole('textbox', { name: 'Jurisdiction' }).fill('Norrell Sound')
    await page.getByRole('textbox', { name: 'Licence number' }).fill('VL-9')
    await page.getByLabel('First day').fill('2026-01-01')
    await page.getByLabel('Last day').fill('2025-01-01')
    await page.getByRole('button', { name: 'Enter a licence' }).click()
    await page.getByText('The last day has to be on or after the first day.').waitFor()
    await page.getByLabel('Last day').fill('2027-01-01')
    await page.getByRole('button', { name: 'Enter a licence' }).click()
    await page.getByText('Norrell Sound, VL-9: valid').waitFor()
    await picture(page, `person-${String(size.width)}`)
    await expectAccessible(page, 'person')
    await page.getByRole('button', { name: 'Void' }).click()
    await page.getByRole('textbox', { name: 'Reason' }).fill('entered for the wrong person')
    await page.getByRole('button', { name: 'Void the licence' }).click()
    await page.getByText('Norrell Sound, VL-9: void').waitFor()
    expect(await page.getByText('entered for the wrong person').isVisible()).toBe(true)
  })

  it('proposes and confirms a setting, and finds it in the audit trail', async () => {
    const { page } = await newSession(browser, size)
    await signIn(page, 'administrator@harrow-point.example', '/settings/facility')
    const paper = page.getByRole('textbox', { name: 'New value of: Paper' })
    await paper.fill('A5')
    await paper.press('Enter')
    await page.getByText('Choose one of the values offered.').waitFor()
    await paper.fill('Letter')
    await paper.press('Enter')
    await page.getByRole('button', { name: 'Confirm' }).click()
    await page.getByText('Confirmed and in force').waitFor()
    await expectAccessible(page, 'facility settings')
    await picture(page, `facility-${String(size.width)}`)

    await page.goto(`${app.url}/settings/audit?q=setting.confirm`)
    await page.getByRole('cell', { name: 'setting Paper' }).first().waitFor()
    await expectAccessible(page, 'audit trail')
    await picture(page, `audit-${String(size.width)}`)
  })
})

it('tells somebody who may not manage people why the sheet is shut', async () => {
  const { page } = await newSession(browser, {
    width: 1440,
    height: 900,
    expectedErrors: [...expectedRefusals, /403 \(Forbidden\)/],
  })
  await signIn(page, 'keeper@harrow-point.example', '/settings/people')
  await page.getByText(/This is for an administrator/).waitFor()
})
