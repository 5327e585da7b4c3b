import type { Browser, Page } from 'playwright-core'
import pg from 'pg'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { aTaxon, anAnimal } from '../builders/a-collection.ts'
import {
  aBathWater,
  aDraft,
  aProduct,
  aSchool,
  bathFields,
  readingsNow,
  signDraft,
} from '../builders/an-order.ts'
import { password } from '../support/api.ts'
import { expectAccessible } from '../support/axe.ts'
import { launchChromium, newSession } from '../support/chromium.ts'
import { startServedApp } from '../support/served-app.ts'
import type { ServedApp } from '../support/served-app.ts'

let browser: Browser
let app: ServedApp
let owner: pg.Client
const numbers = { signed: '', copper: '', draft: '', broken: '' }

const hoursFromNow = (hours: number) => new Date(Date.now() + hours * 3_600_000).toISOString()

beforeAll(async () => {
  app = await startServedApp()
  // the page says "now" by the browser's clock, so the server has to live at the same time
  app.clock.set(new Date())
  await app.composition.formulary.service.loadDefaults()
  for (const role of ['veterinarian', 'technician', 'keeper', 'registrar'] as const) await app.as(role)
  await app.person({
    email: 'vet2@harrow-point.example',
    printedName: 'Dr Late Licence',
    roles: ['veterinarian'],
  })
  owner = new pg.Client({ connectionString: app.ownerUrl })
  await owner.connect()
  const tank = await aBathWater(app, 'QT-3')
  const school = await aSchool(app, tank.id, 1)
  const prazi = await aProduct(app, {})
  const now = hoursFromNow(-0.1)
  await readingsNow(
    app,
    tank.waterBodyId,
    { 'dissolved-oxygen': ['6.9', 'mg/L'], temperature: ['23.4', 'degC'], salinity: ['33.1', 'PSS-78'] },
    now,
  )
  const shrimpTank = await aBathWater(app, 'QT-4')
  const fish = await aSchool(app, shrimpTank.id, 2)
  const shrimp = await aTaxon(app, {
    scientificName: 'Lysmata amboinensis',
    commonName: 'Cleaner shrimp',
    group: 'crustacean',
  })
  await anAnimal(app, { taxonId: shrimp, enclosureId: shrimpTank.id })
  const copper = await aProduct(app, {
    agent: 'copper-sulfate',
    productName: 'Copper sulfate pentahydrate, fine crystals from the treatment room of the quarantine wing',
    form: 'crystals',
    strength: { value: '99', unit: 'percent_w_w' },
    strengthBasis: 'salt',
  })
  const prazFields = bathFields({
    enclosureId: tank.id,
    animalIds: [school.id],
    productId: prazi.id,
    lotId: prazi.lotId,
    doses: 3,
    intervalHours: 48,
    startsAt: hoursFromNow(1),
  })
  const signed = await aDraft(app, prazFields)
  await signDraft(app, signed)
  const broken = await aDraft(app, prazFields)
  await signDraft(app, broken)
  await owner.query(`UPDATE signed_texts SET text = replace(text, '4.36', '43.6') WHERE subject_id = $1`, [
    broken.id,
  ])
  const stopped = await aDraft(
    app,
    bathFields({
      enclosureId: shrimpTank.id,
      animalIds: [fish.id],
      productId: copper.id,
      lotId: copper.lotId,
      target: { value: '0.15', unit: 'mg/L' },
      basis: 'free',
      division: { value: '0.001', unit: 'g' },
      startsAt: hoursFromNow(2),
    }),
  )
  await signDraft(app, stopped, {
    overrides: [{ ruleId: 'R09', reason: 'the shrimp moves to QT-5 before the first gram' }],
  })
  const draft = await aDraft(app, { ...prazFields, problem: 'Skin flukes, to be confirmed' })
  Object.assign(numbers, {
    signed: signed.number,
    copper: stopped.number,
    draft: draft.number,
    broken: broken.number,
  })
  browser = await launchChromium()
}, 180_000)
afterAll(async () => {
  await browser.close()
  await owner.end()
  await app.stop()
})

const expectedErrors = [/401 \(Unauthorized\)/, /409 \(Conflict\)/, /422 \(Unprocessable/]
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

describe.each([desk, phone])('orders at $width px', (size) => {
  it('are listed, searched and filtered by the address', async () => {
    const page = await signedIn('keeper', size, '/orders')
    await page.getByRole('link', { name: numbers.signed }).waitFor()
    await expectSound(page, 'the list of orders')
    await picture(page, `orders-${String(size.width)}`)
    expect(await page.getByText('This is for a veterinarian or a technician.').isVisible()).toBe(true)

    if (size === phone) await page.getByText('Filters', { exact: true }).click()
    await page.getByLabel('Where it stands').selectOption('draft')
    await page.waitForURL(/phase=draft/)
    await page.getByRole('link', { name: numbers.signed }).waitFor({ state: 'detached' })
    expect(await page.getByRole('link', { name: numbers.draft }).isVisible()).toBe(true)
    await page.getByLabel('Where it stands').selectOption('open')
    await page.getByRole('link', { name: numbers.copper }).waitFor()
    await page.getByLabel('Enclosure', { exact: true }).selectOption('QT-4')
    await page.getByRole('link', { name: numbers.signed }).waitFor({ state: 'detached' })
    const waiting = page.waitForEvent('download')
    await page.getByRole('link', { name: 'List as CSV' }).click()
    expect((await waiting).suggestedFilename()).toBe('orders.csv')
    await page.getByLabel('Number, enclosure or drug').fill('nothing like this')
    await page.getByText('Nothing matches').waitFor()
    await expectSound(page, 'no order found')
  })

  it('are read as signed: amounts, conditions, working, cautions, override, signature', async () => {
    const page = await signedIn('technician', size, `/orders/${numbers.copper}`)
    await page.getByText('Checked now: this is the text that was signed.').waitFor()
    expect(await page.getByText(/the shrimp moves to QT-5/).isVisible()).toBe(true)
    expect(await page.getByText(/Norrell Sound, licence VL-20417/).isVisible()).toBe(true)
    // signed and now are two amounts
    await page.getByText('by the water now').waitFor()
    await expectSound(page, 'a signed order')
    await picture(page, `order-signed-${String(size.width)}`)
    const amend = page.getByRole('button', { name: 'Amend' })
    expect(await amend.getAttribute('aria-disabled')).toBe('true')

    await page.goto(`${app.url}/orders/${numbers.signed}`)
    await page.getByRole('link', { name: 'Bath sheet of dose 1' }).waitFor()
    expect(await page.getByText('Dose 3').isVisible()).toBe(true)
    await picture(page, `order-doses-${String(size.width)}`)
  })

  it('say loudly that a record was changed after its signature', async () => {
    const page = await signedIn('keeper', size, `/orders/${numbers.broken}`)
    const alert = page.getByRole('alert').filter({ hasText: 'Record check failed' })
    await alert.waitFor()
    expect(await alert.textContent()).toContain('do not dose')
    await expectSound(page, 'a broken order')
    await picture(page, `order-broken-${String(size.width)}`)
  })
})
