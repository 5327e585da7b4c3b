import { readFileSync } from 'node:fs'
import type { Browser, Page } from 'playwright-core'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { anEnclosure } from '../builders/a-water.ts'
import { aBathWater, readingsNow } from '../builders/an-order.ts'
import { textOf } from '../pdf/support/poppler.ts'
import { launchChromium } from '../support/chromium.ts'
import type { SessionOptions } from '../support/chromium.ts'
import { choose, deskSize, expectSound, openSignedIn, phoneSize, refusals } from '../support/journey.ts'
import { startServedApp } from '../support/served-app.ts'
import type { ServedApp } from '../support/served-app.ts'

let browser: Browser
let app: ServedApp

beforeAll(async () => {
  app = await startServedApp()
  for (const role of ['veterinarian', 'keeper', 'registrar'] as const) await app.as(role)
  const tank = await aBathWater(app, 'QT-7')
  await readingsNow(app, tank.waterBodyId, { salinity: ['33.1', 'PSS-78'] }, '2026-12-01T15:20:00Z')
  await readingsNow(app, tank.waterBodyId, { 'copper-free': ['0.12', 'mg/L'] }, '2026-11-28T15:20:00Z')
  await anEnclosure(app, 'QT-8')
  for (const code of ['QT-1440', 'QT-390']) await anEnclosure(app, code)
  browser = await launchChromium()
}, 180_000)
afterAll(async () => {
  await browser.close()
  await app.stop()
})

const signedIn = (who: string, size: SessionOptions, at: string): Promise<Page> =>
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

const result = (page: Page) => page.getByRole('region', { name: 'Result' })
const fromBench = (page: Page) => page.getByRole('region', { name: 'From the bench' })
const button = (page: Page, name: string) => page.getByRole('button', { name })

describe.each([deskSize, phoneSize])('a result of the bench at $width px', (size) => {
  it('goes into a draft of an order, which works the amount out by itself, and the bench is as it was on coming back', async () => {
    const page = await signedIn('technician', size, '/bench/copper-sulfate')
    await choose(page, new RegExp(enclosure), 'QT-7')
    await page.getByText(/found .* ago by Test technician and confirmed/).waitFor()
    await page.getByLabel('Copper product', { exact: true }).selectOption('pentahydrate')
    await page.getByLabel('What the target is of', { exact: true }).selectOption('copper')
    await field(page, 'Target in the water').fill('0.2')
    await field(page, 'Smallest step of the balance').fill('0.01')
    // (0.2 − 0.12) mg/L × 2,181.4 L ÷ 0.2545 = 0.686 g, worked by hand
    await result(page)
      .getByText(/^0\.6[89]/)
      .first()
      .waitFor()
    await expectSound(page, 'a result to carry')
    await button(page, 'Use in an order').click()
    await page.waitForURL(/orders\/new/)
    await fromBench(page)
      .getByText(/From the bench: Copper sulfate, 0\.6[89]\sg/)
      .waitFor()
    await fromBench(page)
      .getByText(/enclosure, target, what the target is of, smallest step/)
      .waitFor()
    expect(await page.getByRole('combobox', { name: 'Enclosure' }).inputValue()).toContain('QT-7')
    expect(await field(page, 'Target').inputValue()).toBe('0.2')
    expect(await page.getByLabel('Target is counted', { exact: true }).inputValue()).toBe('free')
    expect(await field(page, 'Balance or measure reads to').inputValue()).toBe('0.01')
    await fromBench(page).getByText('What was asked on the bench, and its working').click()
    await fromBench(page)
      .getByText(/Net volume of the water: 2,181\.4\sL \(QT-7: .* found 30\sNov\s2026, 10:00, UTC−4/)
      .waitFor()
    await expectSound(page, 'an order from the bench')
    // nothing is kept by itself
    const { body } = await (await app.as('technician')).agent.get('/api/orders').expect(200)
    const before = body.rows.length
    await page.goBack()
    await result(page)
      .getByText(/^0\.6[89]/)
      .first()
      .waitFor()
    await page.getByText(/QT-7: 0\.12.*, read 3\sdays ago/).waitFor()
    await page.goForward()
    await button(page, 'Keep as proposal').click()
    await page.waitForURL(/orders\/TO-\d+\/edit/)
    await fromBench(page)
      .getByText(/From the bench: Copper sulfate/)
      .waitFor()
    const after = await (await app.as('technician')).agent.get('/api/orders').expect(200)
    expect(after.body.rows.length).toBe(before + 1)
    await page.context().close()
  })

  it('goes into a determination of a volume with its sheet, and stands in its note', async () => {
    const code = `QT-${String(size.width)}`
    const page = await signedIn('keeper', size, '/bench/tank-volume')
    await button(page, 'Fill in an example').click()
    await page.getByText('Choose the enclosure first.').waitFor()
    await choose(page, 'For which enclosure', code)
    await expectSound(page, 'a volume to carry')
    await button(page, 'Use as this water’s volume').click()
    await page.waitForURL(/\/volume$/)
    await fromBench(page)
      .getByText(/From the bench: Volume of a tank and its system, /)
      .waitFor()
    const part = page.getByRole('group', { name: code })
    expect(await part.getByRole('textbox', { name: 'Depth of the water' }).inputValue()).toBe('45')
    expect(await page.getByRole('textbox', { name: /^Note/ }).inputValue()).toMatch(/^From the bench/)
    await expectSound(page, 'a volume from the bench')
    // nothing was typed here: going back asks nothing
    await page.goBack()
    await result(page).waitFor()
    await page.goForward()
    await part.waitFor()
    expect(await part.getByRole('textbox', { name: 'Depth of the water' }).inputValue()).toBe('45')
    // errors that nobody stated are open: the sump, the pipe, the displaced share
    const errors = page.getByRole('textbox', { name: /error/i })
    for (const error of await errors.all()) if ((await error.inputValue()) === '') await error.fill('10')
    await page.getByRole('button', { name: /^Propose/ }).click()
    await page.waitForURL(/\/volumes$/)
    const { body } = await (await app.as('keeper')).agent.get(`/api/enclosures/${code}/volumes`).expect(200)
    expect(body.volumes).toHaveLength(1)
    expect(body.volumes[0].note).toMatch(/^From the bench: Volume of a tank and its system, 299/)
    // 270 L × 0.88 + 60 L + 1.81 L, worked by hand
    expect(body.volumes[0].netVolumeLitres).toBeCloseTo(299.406, 2)
    await page.context().close()
  })

  it('goes into the form of readings as one, with how it was worked out as its note', async () => {
    const code = `QT-${String(size.width)}`
    const page = await signedIn('keeper', size, '/bench/specific-gravity')
    await button(page, 'Fill in an example').click()
    await choose(page, 'For which enclosure', code)
    await button(page, 'Use as a reading of salinity').click()
    await page.waitForURL(/\/measure$/)
    await fromBench(page)
      .getByText(/worked out, not measured.*Set the time to when the water was measured/)
      .waitFor()
    const salinity = page.getByRole('textbox', { name: /^Salinity/ })
    const figure = await salinity.inputValue()
    // 1.025 × 997.05 kg/m³ at 25 °C is the density of sea water of 33.2
    expect(figure).toBe('33.2')
    await expectSound(page, 'a reading from the bench')
    // nothing was typed here: going back asks nothing
    await page.goBack()
    await result(page)
      .getByText(/^33\.2/)
      .first()
      .waitFor()
    await page.goForward()
    await salinity.waitFor()
    expect(await salinity.inputValue()).toBe('33.2')
    await page.getByRole('button', { name: /Record 1\sreading/ }).click()
    await page.getByRole('heading', { name: code, level: 1 }).waitFor()
    const { body } = await (await app.as('keeper')).agent.get(`/api/enclosures/${code}/readings`).expect(200)
    expect(body.rows).toHaveLength(1)
    expect(body.rows[0]).toMatchObject({ parameter: 'salinity', value: { value: figure, unit: 'PSS-78' } })
    expect(body.rows[0].note).toMatch(/^From the bench: Specific gravity.*Asked: .*1\.025.*Working: /)
    await page.context().close()
  })

  it('is printed by keyboard, and says so where it could not be', async () => {
    const page = await signedIn('registrar', { ...size, expectedErrors: refusals(503) }, '/bench/bath-dose')
    await button(page, 'Fill in an example').click()
    const print = button(page, 'Print as PDF')
    await print.focus()
    const [download] = await Promise.all([page.waitForEvent('download'), page.keyboard.press('Enter')])
    expect(download.suggestedFilename()).toBe('bath-dose.pdf')
    const text = textOf(readFileSync(await download.path())).replaceAll('\n', ' ')
    expect(text).toContain('Not a treatment order, not signed.')
    expect(text).toContain('by Test registrar')
    expect(text).toContain('1.1317')
    await page.route('**/api/bench/bath-dose/sheet', (route) =>
      route.fulfill({
        status: 503,
        contentType: 'application/problem+json',
        body: JSON.stringify({ code: 'print-busy', title: 'Too much is being printed at once', status: 503 }),
      }),
    )
    await print.click()
    await page.getByRole('alert').getByText('Too much is being printed at once').waitFor()
    await expectSound(page, 'a sheet to print')
    await page.context().close()
  })

  it('goes only where the person may write', async () => {
    const page = await signedIn('registrar', size, '/bench/bath-dose')
    await button(page, 'Fill in an example').click()
    await button(page, 'Use in an order').waitFor()
    expect(await button(page, 'Use in an order').getAttribute('aria-disabled')).toBe('true')
    await expectSound(page, 'a result that may not be carried')
    await page.goto(`${app.url}/bench/tank-volume`)
    await button(page, 'Fill in an example').click()
    await button(page, 'Use as this water’s volume').waitFor()
    expect(await button(page, 'Use as this water’s volume').getAttribute('aria-disabled')).toBe('true')
    expect(await page.getByRole('combobox', { name: 'For which enclosure' }).count()).toBe(0)
    await page.context().close()
  })
})
