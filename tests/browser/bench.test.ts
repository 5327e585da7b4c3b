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

const signedIn = (size: typeof deskSize, at: string): Promise<Page> =>
  openSignedIn(browser, app, 'technician', at, size)

const field = (page: Page, name: string) => page.getByRole('textbox', { name: new RegExp(`^${name}`) })
const result = (page: Page) => page.getByRole('region', { name: 'Result' })
/** A choice is a list, or buttons side by side where its answers are few and short. */
const choose = async (page: Page, name: string, label: string) => {
  const list = page.getByRole('combobox', { name: new RegExp(`^${name}( \\(optional\\))?$`) })
  const button = page.getByRole('radiogroup', { name }).getByRole('radio', { name: label, exact: true })
  await list.or(button).first().waitFor()
  await ((await list.isVisible()) ? list.selectOption({ label }) : button.click())
}
const unit = async (page: Page, name: string, label: string) => {
  await page.getByLabel(new RegExp(`^Unit.*${name}`, 'i')).selectOption({ label })
}

describe.each([deskSize, phoneSize])('the bench at $width px', (size) => {
  it('gives the grams of copper sulfate and the millilitres of formalin, with working and sources', async () => {
    const page = await signedIn(size, '/bench')
    await page.getByRole('heading', { name: 'Bench' }).waitFor()
    await expectSound(page, 'the bench')
    await picture(page, 'bench')
    await page.getByRole('link', { name: 'Copper sulfate', exact: true }).click()
    await choose(page, 'Copper product', 'Copper sulfate pentahydrate')
    await field(page, 'Target in the water').fill('0.2')
    await field(page, 'Net volume of the water').fill('11400')
    await result(page).getByText('Copper and copper sulfate differ by 3.93 times', { exact: false }).waitFor()
    await choose(page, 'What the target is of', 'Free copper (Cu²⁺)')
    // 2,280 mg of copper ÷ 0.2545, computed from IUPAC weights
    await result(page)
      .getByText(/^8\.959/)
      .waitFor()
    expect(await page.getByRole('table', { name: 'Working' }).innerText()).toContain('2,280')
    await page.getByText(/^Sources/).click()
    await page.getByText(/FA165/).waitFor()
    await expectSound(page, 'copper sulfate')
    await picture(page, 'copper-sulfate')

    await page.goto(`${app.url}/bench/bath-dose`)
    await field(page, 'Target in the water').fill('25 ppm')
    await choose(page, 'What the target is of', 'The product as it stands on the shelf')
    await field(page, 'Net volume of the water').fill('3785')
    await page.getByRole('radio', { name: 'Liquid' }).click()
    await result(page).getByText('Parts per million can mean three things', { exact: false }).waitFor()
    await field(page, 'Target in the water').fill('25')
    await unit(page, 'Target in the water', 'µL/L')
    const open = result(page).getByText('Answer first which unit “Target in the water” is in', {
      exact: false,
    })
    await open.waitFor()
    await page.getByRole('button', { name: '25 µL/L' }).first().click()
    await open.waitFor({ state: 'detached' })
    await result(page)
      .getByText(/^94\.63/)
      .waitFor()
    await page.context().close()
  })

  it('gives the minutes of a wash-out, the litres of a salinity change day by day, and the millilitres of an injection', async () => {
    const page = await signedIn(size, '/bench/wash-out')
    await choose(page, 'What to find', 'The time it takes')
    await field(page, 'Net volume of the water').fill('1000')
    await field(page, 'Flow of clean water').fill('25')
    await field(page, 'Share to wash out').fill('95')
    // check value wash.05: 119.829 min
    await result(page)
      .getByText(/^119\.8/)
      .first()
      .waitFor()
    await expectSound(page, 'wash-out')
    await picture(page, 'wash-out')

    await page.goto(`${app.url}/bench/salinity-change`)
    await choose(page, 'How it is changed', 'In daily steps')
    await field(page, 'Salinity now').fill('35')
    await field(page, 'Salinity wanted').fill('16')
    await field(page, 'Salinity of the replacement water').fill('0')
    await field(page, 'Net volume of the water').fill('2000')
    await field(page, 'Largest change in a day').fill('3')
    await page.getByRole('table', { name: 'Step by step' }).waitFor()
    expect(await page.getByRole('table', { name: 'Step by step' }).getByRole('row').count()).toBe(8)
    await field(page, 'Salinity now').fill('1.026')
    await result(page).getByText('This looks like a specific gravity.', { exact: false }).waitFor()
    await field(page, 'Salinity now').fill('35')
    await expectSound(page, 'a change of salinity')
    await picture(page, 'salinity-change')

    await page.goto(`${app.url}/bench/injection`)
    await field(page, 'Dose').fill('10')
    await field(page, 'Weight of the animal').fill('1.35')
    await field(page, 'Strength of the solution').fill('22.7')
    await field(page, 'Smallest step of the syringe').fill('0.01')
    await result(page)
      .getByText(/^0\.59/)
      .first()
      .waitFor()
    await expectSound(page, 'an injection')
    await picture(page, 'injection')
    await page.context().close()
  })

  it('asks for what a specific gravity, a pH and an ammonia test leave open', async () => {
    const page = await signedIn(size, '/bench/specific-gravity')
    await choose(page, 'What to find', 'Salinity')
    await field(page, 'Specific gravity read').fill('1.025')
    await field(page, 'Temperature of the water').fill('25')
    await result(page).getByText('60/60 °F (15.56 °C)', { exact: false }).waitFor()
    await field(page, 'Reference temperature of the instrument').fill('25')
    // check value sginv.06: 33.19, EOS-80 inverted (computed)
    await result(page)
      .getByText(/^33\.2/)
      .waitFor()

    await page.goto(`${app.url}/bench/un-ionised-ammonia`)
    await field(page, 'Total ammonia by a test').fill('1')
    await field(page, 'pH of the water').fill('8')
    await field(page, 'Temperature of the water').fill('25')
    await field(page, 'Salinity of the water').fill('35')
    await result(page).getByText('Choose what the test counts ammonia as', { exact: false }).waitFor()
    await choose(page, 'What the test counts it as', 'As nitrogen (NH₃-N, TAN)')
    await result(page).getByText('Choose what the pH meter was calibrated with', { exact: false }).waitFor()
    await choose(page, 'What the pH meter was calibrated with', 'Not known')
    // published examples at pH 8, 25 °C, S 35: 0.0440 free, 0.0556 total
    await result(page)
      .getByText(/^0\.0556/)
      .first()
      .waitFor()
    await result(page)
      .getByText(/0\.0440/)
      .first()
      .waitFor()
    await page.getByText('Act on the higher figure', { exact: false }).waitFor()
    await expectSound(page, 'un-ionised ammonia')
    await picture(page, 'un-ionised-ammonia')
  })

  it('remembers a unit, empties its fields, and says when there is no such calculator', async () => {
    const page = await signedIn(size, '/bench/turnover')
    await unit(page, 'Volume of the water', 'US gal')
    await page.getByRole('button', { name: 'Fill in an example' }).click()
    await result(page)
      .getByText(/^62\.5/)
      .waitFor()
    await page.getByRole('button', { name: 'Empty the fields' }).click()
    await result(page).getByText('No figure yet').waitFor()
    await page.reload()
    const kept = page.getByLabel(/^Unit.*Volume of the water/i)
    expect(await kept.inputValue()).toBe('gal_us')
    await page.goto(`${app.url}/bench/no-such-thing`)
    await page.getByText('There is no calculator at this address.').waitFor()
    await page.context().close()
  })
})
