import type { Browser, Page } from 'playwright-core'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { anAnimal, aStingray } from '../builders/a-collection.ts'
import { aBathWater, aProduct } from '../builders/an-order.ts'
import { launchChromium } from '../support/chromium.ts'
import { deskSize, expectSound, openSignedIn, phoneSize, picture } from '../support/journey.ts'
import { startServedApp } from '../support/served-app.ts'
import type { ServedApp } from '../support/served-app.ts'

let browser: Browser
let app: ServedApp
let ray: { accession: string; url: string }
let unweighed: { accession: string }

beforeAll(async () => {
  app = await startServedApp()
  const tank = await aBathWater(app, 'QT-3')
  const taxonId = await aStingray(app)
  ray = await anAnimal(app, { taxonId, enclosureId: tank.id })
  unweighed = await anAnimal(app, { taxonId, enclosureId: tank.id })
  const { agent } = await app.as('keeper')
  await agent
    .post(`${ray.url}/weights`)
    .send({
      id: app.nextId(),
      weight: { value: '42.5', unit: 'kg' },
      basis: 'measured',
      happenedAt: '2026-11-30T14:00:00Z',
    })
    .expect(201)
  await aProduct(app, {
    agent: 'enrofloxacin',
    productName: 'Enrofloxacin injection',
    form: 'liquid',
    strength: { value: '22.7', unit: 'mg/mL' },
    strengthBasis: 'base',
  })
  await aProduct(app, {})
  browser = await launchChromium()
}, 180_000)
afterAll(async () => {
  await browser.close()
  await app.stop()
})

const choose = async (page: Page, name: string, typed: string, option: RegExp) => {
  await page.getByRole('combobox', { name }).fill(typed)
  await page.getByRole('option', { name: option }).first().click()
}

describe.each([deskSize, phoneSize])('a dose by weight at $width px', (size) => {
  it('is worked out by the newest weight, divided over places, and keeps nothing', async () => {
    const page = await openSignedIn(browser, app, 'veterinarian', '/orders', size)
    await page.getByRole('link', { name: 'Work out a dose by weight' }).click()
    await page.getByRole('heading', { name: 'Dose by weight' }).waitFor()
    await page.getByText('Choose the animal first', { exact: false }).waitFor()
    await expectSound(page, 'an empty dose by weight')
    await choose(page, 'Animal or group', ray.accession, new RegExp(ray.accession))
    await page.getByRole('radio', { name: 'Injection' }).click()
    await page.getByText('42.5\u00a0kg', { exact: false }).first().waitFor()
    await page.getByLabel('Where the needle goes in').selectOption({ label: 'Into muscle' })
    await choose(page, 'Drug product, to the animal itself', 'Enro', /Enrofloxacin injection/)
    await page.getByRole('textbox', { name: 'Dose for the weight' }).fill('10')
    await page.getByLabel('Dose is counted').selectOption('base')
    await page.getByRole('textbox', { name: 'Syringe or balance reads to' }).fill('0.2')
    await page.getByRole('textbox', { name: /^Largest volume at one place/ }).fill('8')
    // 10 mg/kg × 42.5 kg ÷ 22.7 mg/mL = 18.7225 mL, on a syringe of 0.2 mL
    await page
      .getByText(/^18\.8/)
      .first()
      .waitFor()
    const places = page.getByRole('listitem').filter({ hasText: /^Place \d/ })
    await places.nth(2).waitFor()
    const said = (await places.allInnerTexts()).map((each) => Number(/: ([\d.]+)/.exec(each)?.[1]))
    expect(said).toHaveLength(3)
    expect(said.reduce((sum, each) => sum + each, 0)).toBeCloseTo(18.8, 9)
    expect(Math.max(...said)).toBeLessThanOrEqual(8)
    await page.getByText('This is no order.', { exact: false }).waitFor()
    await expectSound(page, 'a dose by weight')
    await picture(page, 'dose-by-weight')

    await page.getByRole('radio', { name: 'By mouth' }).click()
    await page.getByRole('combobox', { name: 'Drug product' }).fill('Prazi')
    await page.getByRole('option', { name: /Praziquantel powder/ }).waitFor()
    const orders = await (await app.as('veterinarian')).agent.get('/api/orders').expect(200)
    expect(orders.body.rows).toEqual([])
    await page.context().close()
  })

  it('says of an animal that nobody weighed that it has to be, and of a wrong unit what is wrong', async () => {
    const page = await openSignedIn(browser, app, 'technician', '/orders/by-weight', size)
    await choose(page, 'Animal or group', unweighed.accession, new RegExp(unweighed.accession))
    await page.getByRole('radio', { name: 'Injection' }).click()
    await choose(page, 'Drug product, to the animal itself', 'Enro', /Enrofloxacin injection/)
    await page.getByText('Nobody weighed this animal.', { exact: false }).first().waitFor()
    await expectSound(page, 'a dose without a weight')
    await page.context().close()
  })

  it('is not for a keeper, who is told why', async () => {
    const page = await openSignedIn(browser, app, 'keeper', '/orders/by-weight', size)
    await page.getByRole('heading', { name: 'Treatment order' }).waitFor()
    expect(await page.getByRole('combobox', { name: 'Animal or group' }).count()).toBe(0)
    await page.context().close()
  })
})
