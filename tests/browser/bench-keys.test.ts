import type { Browser, Page } from 'playwright-core'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { calculators } from '../../shared/bench/calculators.ts'
import { say } from '../../shared/bench/words.ts'
import { anEnclosure } from '../builders/a-water.ts'
import { aBathWater, readingsNow } from '../builders/an-order.ts'
import { password } from '../support/api.ts'
import { launchChromium, newSession } from '../support/chromium.ts'
import { deskSize, openSignedIn, phoneSize, refusals } from '../support/journey.ts'
import { expectHeld, heldBy, tabTo } from '../support/keys.ts'
import { startServedApp } from '../support/served-app.ts'
import type { ServedApp } from '../support/served-app.ts'

let browser: Browser
let app: ServedApp

beforeAll(async () => {
  app = await startServedApp()
  await app.as('veterinarian')
  const tank = await aBathWater(app, 'QT-7')
  await readingsNow(app, tank.waterBodyId, { salinity: ['33.1', 'PSS-78'] }, '2026-12-01T15:20:00Z')
  await anEnclosure(app, 'QT-8')
  browser = await launchChromium()
}, 180_000)
afterAll(async () => {
  await browser.close()
  await app.stop()
})

const result = (page: Page) => page.getByRole('region', { name: 'Result' })
const heading = (page: Page, name: string) => page.getByRole('heading', { level: 1, name }).waitFor()
const press = async (page: Page, ...keys: string[]) => {
  for (const key of keys) await page.keyboard.press(key)
  expectHeld(await heldBy(page), keys.join(' '))
}
/** Another sheet has come: whoever uses keys stands at its beginning, and Tab goes to its first control. */
const atTheStart = async (page: Page) => {
  await page.waitForFunction(() => document.activeElement?.id === 'chart')
}

it('is used by keys alone, from signing in to an order, a print, and back', async () => {
  const { page } = await newSession(browser, { ...deskSize, expectedErrors: refusals() })
  await page.goto(`${app.url}/`)
  const mail = page.getByRole('textbox', { name: 'E-mail' })
  await mail.waitFor()
  if (!(await mail.evaluate((field) => field === document.activeElement))) await tabTo(page, 'E-mail')
  await page.keyboard.type('veterinarian@harrow-point.example')
  await tabTo(page, 'Password')
  await page.keyboard.type(password)
  await page.keyboard.press('Enter')
  await heading(page, 'Today')

  await tabTo(page, /Bench$/, 'link')
  await page.keyboard.press('Enter')
  await heading(page, 'Bench')
  await atTheStart(page)
  await tabTo(page, /^(Find|Search|Which)/)
  await page.keyboard.type('formalin')
  await page.waitForURL(/q=formalin/)
  await page.keyboard.press('Control+a')
  await page.keyboard.press('Delete')
  await page.waitForURL((url) => !url.search.includes('q='))
  expectHeld(await heldBy(page), 'emptying the search')

  // behind "more"
  await tabTo(page, /more/i)
  await press(page, 'Enter')
  await tabTo(page, 'Copper sulfate', 'link')
  await page.keyboard.press('Enter')
  await heading(page, 'Copper sulfate')
  await atTheStart(page)

  // an enclosure is typed and taken with the arrows
  await tabTo(page, /^Figures from an enclosure/, 'combobox')
  await page.keyboard.type('QT-7')
  await page.getByRole('option', { name: /QT-7/ }).waitFor()
  await press(page, 'ArrowDown', 'Enter')
  await page.getByText(/found .* ago by/).waitFor()
  expectHeld(await heldBy(page), 'taking an enclosure')
  await tabTo(page, 'Copper product')
  await page.keyboard.type('Copper sulfate p')
  await tabTo(page, /^Target in the water/)
  await page.keyboard.type('0.2')
  await tabTo(page, 'What the target is of')
  await page.keyboard.type('Free')
  await result(page)
    .getByText(/\d\sg$/)
    .first()
    .waitFor()

  // another unit asks whether the number is kept or converted, and gives the keys back
  await tabTo(page, /^Unit.*target in the water/i, undefined, 'Shift+Tab')
  await page.keyboard.press('ArrowDown')
  await page
    .getByRole('button', { name: /^Keep|^0\.2/ })
    .first()
    .waitFor()
  await page.waitForFunction(() => document.activeElement?.tagName === 'BUTTON')
  await press(page, 'Enter')

  await tabTo(page, /^Sources/)
  await press(page, 'Enter')
  await page.getByText(/FA165/).waitFor()
  await tabTo(page, 'Print as PDF', 'button')
  const printed = page.waitForEvent('download')
  await page.keyboard.press('Enter')
  await printed
  await page.getByRole('button', { name: 'Print as PDF' }).waitFor()
  expect((await heldBy(page)).name).toBe('Print as PDF')

  await tabTo(page, 'Use in an order', 'button')
  await page.keyboard.press('Enter')
  await page.waitForURL(/orders\/new/)
  await page.getByRole('region', { name: 'From the bench' }).waitFor()
  expect((await heldBy(page)).lost).toBe(false)
  await page.goBack()
  await heading(page, 'Copper sulfate')
  expect(await page.getByRole('textbox', { name: /^Target in the water/ }).inputValue()).toBe('0.2')
  expect((await heldBy(page)).lost).toBe(false)
})

it('takes a choice of two with the arrows, and opens the table of a curve', async () => {
  const page = await openSignedIn(browser, app, 'veterinarian', '/bench/bath-dose', deskSize)
  await heading(page, say(named('bath-dose'), 'name'))
  await tabTo(page, /^Target in the water/)
  await page.keyboard.type('25')
  await tabTo(page, 'What the target is of')
  await page.keyboard.type('The product')
  await tabTo(page, /^Net volume/)
  await page.keyboard.type('3785')
  await tabTo(page, /Liquid|Powder|Solid/, 'radio')
  await press(page, 'ArrowRight')
  await press(page, 'ArrowLeft')
  await page.goto(`${app.url}/bench/salinity-change`)
  await heading(page, say(named('salinity-change'), 'name'))
  await tabTo(page, 'Fill in an example', 'button')
  await press(page, 'Enter')
  await page.getByRole('img', { name: /^Curve:/ }).waitFor()
  await tabTo(page, 'Show as a table')
  await press(page, 'Enter')
  await page.getByRole('table', { name: 'How it changes' }).waitFor()
  await page.keyboard.press('Shift+Tab')
  await tabTo(page, 'Show as a table')
  // emptied again, the keys stay on the button that did it
  await tabTo(page, 'Empty the fields', 'button', 'Shift+Tab')
  await press(page, 'Enter')
  await result(page).getByText('No figure yet').waitFor()
  expect((await heldBy(page)).name).toBe('Empty the fields')
})

function named(id: string) {
  const of = calculators.find((each) => each.id === id)
  if (!of) throw new Error(`no calculator ${id}`)
  return of
}

/** Every control of the sheet that Tab should come to: of buttons side by side the one that is chosen, or the first. */
const shownControls = (page: Page) =>
  page.evaluate(() => {
    const selector =
      'a[href], button:not([disabled]), input:not([disabled]), select:not([disabled]), textarea:not([disabled]), summary, [tabindex="0"]'
    return [...document.querySelectorAll<HTMLElement>(`main :is(${selector})`)].flatMap((each, at) => {
      const within = each.closest('details:not([open])')
      const hidden = within !== null && each.tagName !== 'SUMMARY'
      return each.tabIndex >= 0 && !hidden && each.checkVisibility() ? [at] : []
    })
  })

describe.each([deskSize, phoneSize])('by Tab at $width px', (size) => {
  it('every control of every calculator is reached in the order of reading, named and in sight', async () => {
    const page = await openSignedIn(browser, app, 'veterinarian', '/bench', size)
    for (const of of calculators) {
      await page.goto(`${app.url}/bench/${of.id}`)
      await heading(page, say(of, 'name'))
      await page.getByRole('button', { name: 'Fill in an example' }).focus()
      await page.keyboard.press('Enter')
      await page.getByRole('button', { name: 'Print as PDF' }).waitFor()
      await page.evaluate(() => document.getElementById('chart')?.focus())
      const expected = await shownControls(page)
      const met: number[] = []
      while (met.length < expected.length) {
        await page.keyboard.press('Tab')
        const held = await heldBy(page)
        expectHeld(held, `${of.id}: Tab number ${String(met.length + 1)} to ${held.role} "${held.name}"`)
        if (held.at < 0) break
        met.push(held.at)
      }
      expect(met, of.id).toEqual(expected)
      expect(expected.length, of.id).toBeGreaterThan(6)
    }
  }, 240_000)
})
