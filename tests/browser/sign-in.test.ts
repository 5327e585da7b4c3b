import type { Browser, Page } from 'playwright-core'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { installation } from '../../server/platform/http/request-context.ts'
import { password } from '../support/api.ts'
import { expectAccessible } from '../support/axe.ts'
import { launchChromium, newSession } from '../support/chromium.ts'
import { startServedApp } from '../support/served-app.ts'
import type { ServedApp } from '../support/served-app.ts'

let browser: Browser
let app: ServedApp

beforeAll(async () => {
  app = await startServedApp()
  await app.as('keeper')
  await app.as('veterinarian')
  browser = await launchChromium()
}, 180_000)
afterAll(async () => {
  await browser.close()
  await app.stop()
})

const desk = { width: 1440, height: 900, expectedErrors: [/401 \(Unauthorized\)/, /429 \(Too Many/] }
const phone = { ...desk, width: 390, height: 844 }

async function signIn(page: Page, email: string, word = password): Promise<void> {
  await page.getByRole('textbox', { name: 'E-mail' }).fill(email)
  await page.getByRole('textbox', { name: 'Password' }).fill(word)
  await page.getByRole('button', { name: 'Sign in' }).click()
}

describe.each([desk, phone])('sign-in at $width px', (size) => {
  it('is reached from anywhere, says plainly what is wrong, and leads to where one wanted to go', async () => {
    const { page } = await newSession(browser, size)
    await page.goto(`${app.url}/settings/own`)
    await page.waitForURL(/\/sign-in\?then=/)
    await expectAccessible(page, 'sign-in')

    await page.getByRole('button', { name: 'Sign in' }).click()
    expect(await page.getByText(/Type your e-mail address/).isVisible()).toBe(true)
    await expectAccessible(page, 'sign-in with faults')

    await signIn(page, 'keeper@harrow-point.example', 'not-the-password')
    await page.getByText('E-mail or password is not right.').waitFor()
    await expectAccessible(page, 'sign-in refused')

    await signIn(page, 'keeper@harrow-point.example')
    await page.getByRole('heading', { name: 'Your own settings' }).waitFor()
    expect(page.url()).toBe(`${app.url}/settings/own`)
    // the address typed short leads there too
    await page.goto(`${app.url}/settings`)
    await page.getByRole('heading', { name: 'Your own settings' }).waitFor()
    expect(page.url()).toBe(`${app.url}/settings/own`)
    expect(await page.title()).toBe('Your own settings · Pratique')
    await expectAccessible(page, 'own settings')
    expect(await page.evaluate(() => document.documentElement.scrollWidth)).toBeLessThanOrEqual(size.width)
  })
})

it('says the same of an account that is not there as of a wrong password, and says when it is locked', async () => {
  const { page } = await newSession(browser, desk)
  await page.goto(`${app.url}/sign-in`)
  const alert = page.getByRole('alert')
  await signIn(page, 'nobody@harrow-point.example', 'x')
  await alert.waitFor()
  const said = await alert.textContent()
  await app.person({ email: 'locked@harrow-point.example', printedName: 'Lou Lock', roles: ['keeper'] })
  for (let wrong = 1; wrong <= 5; wrong++) {
    const answer = page.waitForResponse(/\/api\/sign-in$/)
    await signIn(page, 'locked@harrow-point.example', `wrong-${String(wrong)}`)
    await answer
    if (wrong === 1) expect(await alert.textContent()).toBe(said)
  }
  const answer = page.waitForResponse(/\/api\/sign-in$/)
  await signIn(page, 'locked@harrow-point.example')
  expect((await answer).status()).toBe(429)
  await page.getByText(/Too many wrong tries\. Wait 15 min/).waitFor()
})

it('asks for a password of one’s own after a one-time password, and lets nobody past it', async () => {
  const { people } = app.composition
  const { oneTimePassword } = await people.service.enterPerson(
    { actor: installation, requestId: 'test' },
    {
      id: app.nextId(),
      email: 'new@harrow-point.example',
      printedName: 'Noor Newland',
      roles: ['technician'],
    },
  )
  expect(oneTimePassword).toBeTruthy()
  const { page } = await newSession(browser, desk)
  await page.goto(`${app.url}/sign-in`)
  await signIn(page, 'new@harrow-point.example', oneTimePassword ?? '')
  await page.waitForURL(/\/new-password$/)
  await expectAccessible(page, 'new password')
  await page.goto(`${app.url}/settings/own`)
  await page.waitForURL(/\/new-password$/)

  await page.getByLabel('One-time password').fill(oneTimePassword ?? '')
  await page.getByLabel('New password', { exact: true }).fill('short')
  await page.getByLabel('New password again').fill('other')
  await page.getByRole('button', { name: 'Keep this password' }).click()
  await page.getByText('Use at least 10 characters').first().waitFor()
  await page.getByLabel('New password', { exact: true }).fill('salt-and-tide-9')
  await page.getByLabel('New password again').fill('salt-and-tide-9')
  await page.getByRole('button', { name: 'Keep this password' }).click()
  await page.getByText('Your password is changed').waitFor()
  await page.waitForURL((url) => url.pathname !== '/new-password')
})

describe('the frame', () => {
  it('goes to every sheet by g and its number, and says honestly which are not there', async () => {
    const { page } = await newSession(browser, desk)
    await page.goto(`${app.url}/settings/own`)
    await signIn(page, 'veterinarian@harrow-point.example')
    await page.getByRole('heading', { name: 'Your own settings' }).waitFor()
    const sheets = page.getByRole('navigation', { name: 'Sheets' }).getByRole('link')
    await sheets.first().waitFor()
    expect(await sheets.count()).toBe(8)
    for (let number = 1; number <= 8; number++) {
      const name = ((await sheets.nth(number - 1).textContent()) ?? '').replace(/^\d/, '')
      await page.keyboard.press('g')
      await page.keyboard.press(String(number))
      await page.waitForFunction((title) => document.title.startsWith(title), name)
      const missing = page.url().includes('/not-in-this-version/')
      expect(await page.getByText(`${name} is not in this version`).isVisible()).toBe(missing)
    }
    await expectAccessible(page, 'a sheet')
    // the mark leads home from wherever one is
    await page.getByRole('link', { name: 'Pratique, to Today' }).click()
    await page.waitForFunction(() => document.title.startsWith('Today'))
    expect(await page.getByText('Nothing at this address').count()).toBe(0)
    await page.goto(`${app.url}/no/such/sheet`)
    await page.getByRole('heading', { name: 'Nothing at this address' }).waitFor()
    await expectAccessible(page, 'nothing at this address')
  })

  it('opens finding and the list of keys, follows the chosen light, and signs out', async () => {
    const { page } = await newSession(browser, desk)
    await page.goto(`${app.url}/settings/own`)
    await signIn(page, 'veterinarian@harrow-point.example')
    await page.getByRole('heading', { name: 'Your own settings' }).waitFor()
    await page.keyboard.press('Control+k')
    await page.getByRole('dialog', { name: 'Find' }).waitFor()
    await page.keyboard.press('Escape')
    await page.keyboard.press('?')
    await page.getByRole('dialog', { name: 'Keys' }).waitFor()
    await expectAccessible(page, 'list of keys')
    await page.keyboard.press('Escape')

    await page.getByRole('button', { name: 'Test veterinarian, menu' }).click()
    await expectAccessible(page, 'menu of the person')
    await page.getByRole('menuitemradio', { name: 'Night watch' }).click()
    expect(await page.evaluate(() => document.documentElement.dataset.theme)).toBe('night')
    await page.reload()
    await page.getByRole('button', { name: 'Test veterinarian, menu' }).click()
    expect(await page.evaluate(() => document.documentElement.dataset.theme)).toBe('night')
    await expectAccessible(page, 'own settings, night watch')
    // the way back leads past a sheet that was seen while signed in
    await page.goto(`${app.url}/animals`)
    await page.getByRole('button', { name: 'Test veterinarian, menu' }).click()
    await page.getByRole('menuitem', { name: 'Sign out' }).click()
    await page.waitForURL(/\/sign-in/)
    await page.goBack()
    await page.waitForURL(/\/sign-in/)
  })

  it('says on a page left open that somebody else signed in, and writes nothing from it', async () => {
    const { page } = await newSession(browser, desk)
    await page.goto(`${app.url}/`)
    await signIn(page, 'keeper@harrow-point.example')
    await page.getByRole('textbox', { name: 'Note for the next watch' }).fill('Half a sentence of the keeper')

    // another window of the same browser signs somebody else in
    const other = await page.context().newPage()
    const signInThere = async (email: string, printedName: string) => {
      const status = await other.evaluate(async (body) => {
        const headers = { 'content-type': 'application/json' }
        return (await fetch('/api/sign-in', { method: 'POST', headers, body })).status
      }, JSON.stringify({ email, password }))
      expect(status).toBe(200)
      await other.goto(`${app.url}/settings/own`)
      await other.getByRole('button', { name: `${printedName}, menu` }).waitFor()
      await page.bringToFront()
    }
    await other.goto(`${app.url}/settings/own`)
    await signInThere('veterinarian@harrow-point.example', 'Test veterinarian')
    const told = page.getByRole('alertdialog', { name: 'Test veterinarian is signed in on this device now' })
    await told.waitFor()
    await expectAccessible(page, 'another person is signed in')

    // the writer comes back: the page is theirs again, with what was typed
    await signInThere('keeper@harrow-point.example', 'Test keeper')
    await told.waitFor({ state: 'detached' })
    expect(await page.getByRole('textbox', { name: 'Note for the next watch' }).inputValue()).toBe(
      'Half a sentence of the keeper',
    )
  })

  it('asks for the password in place when the session ended in another window, and keeps what was typed', async () => {
    const { page } = await newSession(browser, desk)
    await page.goto(`${app.url}/`)
    await signIn(page, 'keeper@harrow-point.example')
    const note = page.getByRole('textbox', { name: 'Note for the next watch' })
    await note.fill('The rays left half of their shrimp')

    const other = await page.context().newPage()
    await other.goto(`${app.url}/settings/own`)
    await other.getByRole('button', { name: 'Test keeper, menu' }).click()
    await other.getByRole('menuitem', { name: 'Sign out' }).click()
    await other.waitForURL(/\/sign-in/)
    await page.bringToFront()
    const asked = page.getByRole('alertdialog', { name: 'Test keeper, you are signed out' })
    await asked.waitFor()
    await expectAccessible(page, 'signed out elsewhere')
    await asked.getByRole('textbox', { name: 'Password' }).fill('not-the-password')
    await asked.getByRole('button', { name: 'Sign in and go on' }).click()
    await asked.getByText('E-mail or password is not right.').waitFor()
    await page.keyboard.press('Escape')
    expect(await asked.isVisible()).toBe(true)
    await asked.getByRole('textbox', { name: 'Password' }).fill(password)
    await page.keyboard.press('Enter')
    await asked.waitFor({ state: 'detached' })
    expect(await note.inputValue()).toBe('The rays left half of their shrimp')
    await page.getByRole('button', { name: 'Leave the note' }).click()
    await page.getByText('The note stands on Today for two days').waitFor()
  })

  it('puts the list of sheets behind the mark on a phone', async () => {
    const { page } = await newSession(browser, phone)
    await page.goto(`${app.url}/settings/own`)
    await signIn(page, 'keeper@harrow-point.example')
    await page.getByRole('heading', { name: 'Your own settings' }).waitFor()
    await page.getByRole('button', { name: /^Sheets/ }).click()
    expect(await page.getByRole('menuitem').count()).toBe(8)
    const row = await page.getByRole('menuitem').first().boundingBox()
    expect(row?.height).toBeGreaterThanOrEqual(48)
    await expectAccessible(page, 'list of sheets')
  })
})
