import { mkdtempSync, readFileSync, rmSync, writeFileSync } from 'node:fs'
import { tmpdir } from 'node:os'
import path from 'node:path'
import { parse } from 'csv-parse/sync'
import type { Browser } from 'playwright-core'
import { afterAll, beforeAll, expect, it } from 'vitest'
import { aTaxon } from '../builders/a-collection.ts'
import { aParty, aPermit, pdfBytes } from '../builders/a-register.ts'
import { aBathWater, aProduct, readingsNow } from '../builders/an-order.ts'
import { textOf } from '../pdf/support/poppler.ts'
import { password } from '../support/api.ts'
import { launchChromium, newSession } from '../support/chromium.ts'
import type { BrowserSession, SessionOptions } from '../support/chromium.ts'
import { choose, deskSize, phoneSize, picture, refusals, signIn } from '../support/journey.ts'
import { startServedApp } from '../support/served-app.ts'
import type { ServedApp } from '../support/served-app.ts'

/*
 * The job from end to end, every act on a screen and each by whoever does it: what was there before is only the house,
 * its water, its drugs and the people.
 */

let browser: Browser
let app: ServedApp
let begun: Date
const folder = mkdtempSync(path.join(tmpdir(), 'pratique-story-'))
const agreement = path.join(folder, 'Health certificate HC-26-118.pdf')
const dayMs = 86_400_000

beforeAll(async () => {
  app = await startServedApp()
  begun = app.clock.now()
  await app.composition.formulary.service.loadDefaults()
  for (const role of ['veterinarian', 'technician', 'keeper', 'registrar'] as const) await app.as(role)
  await app.person({
    email: 'second@harrow-point.example',
    printedName: 'Second technician',
    roles: ['technician'],
  })
  const tank = await aBathWater(app, 'QT-3')
  await aTaxon(app, {
    scientificName: 'Zebrasoma flavescens',
    commonName: 'Yellow tang',
    group: 'teleost',
  })
  await aProduct(app, {
    agent: 'formalin',
    productName: 'Formalin 37 %',
    form: 'liquid',
    strength: { value: '37', unit: 'percent_w_w' },
    density: { value: '1.08', unit: 'g/mL' },
  })
  await aParty(app, 'Ledder Bay Marsh Trust')
  await aPermit(app, { permitNumber: 'NS-26-017', quantityAllowed: 20 })
  await readingsNow(app, tank.waterBodyId, {
    'dissolved-oxygen': ['6.9', 'mg/L'],
    temperature: ['24.4', 'degC'],
    salinity: ['33.1', 'PSS-78'],
    ph: ['8.1', 'pH'],
  })
  writeFileSync(agreement, pdfBytes())
  browser = await launchChromium()
}, 180_000)
afterAll(async () => {
  await browser.close()
  await app.stop()
  rmSync(folder, { recursive: true, force: true })
})

// who is signed in is asked first; without a signal every request fails
const expectedErrors = [...refusals(409, 422), /ERR_INTERNET_DISCONNECTED/]
const desk = { ...deskSize, expectedErrors }
const phone = { ...phoneSize, expectedErrors }

async function at(
  size: SessionOptions,
  name: string,
  address: string,
  daysLater = 0,
): Promise<BrowserSession> {
  const session = await newSession(browser, { ...size, daysLater })
  await signIn(session.page, app, name, address)
  return session
}

it('goes from arrival to clearance', async () => {
  const accession = await accessions()
  const number = await opensTheCase(accession)
  await observes()
  const order = await ordersABath(number)
  await givesTheBath(order)
  await tellsOfAnAddition(number)
  await clears(number)
  await takesTheHistoryOut(accession)
}, 400_000)

/** The registrar accessions a batch, with its paper and under its permit. */
async function accessions(): Promise<string> {
  const { page } = await at(desk, 'registrar', '/register')
  await page.getByRole('link', { name: 'Accession animals' }).click()
  await page.getByLabel('How they came').selectOption('loan-in')
  await page.getByRole('radio', { name: 'Being done now' }).click()
  await page.getByLabel('Date', { exact: true }).fill('2026-12-01')
  await choose(page, /Other party/, 'ledder', /Ledder Bay/)
  await page.getByLabel(/Number on their paper/).fill('LA-26-04')
  await choose(page, 'Taxon', 'tang', /Yellow tang/)
  await page.getByRole('radio', { name: 'Group', exact: true }).click()
  await page.getByLabel('Number alive').fill('14')
  await page.getByRole('radio', { name: 'Counted' }).click()
  await choose(page, 'Into enclosure', 'QT-3', /QT-3/)
  await page.getByRole('button', { name: 'Use a permit' }).click()
  await choose(page, 'Permit', 'NS-26-017', /NS-26-017/)
  await page.getByLabel('Animals under it').fill('14')
  await page.getByRole('button', { name: 'Add a paper' }).click()
  await page.getByLabel('File', { exact: true }).setInputFiles(agreement)
  await page.getByLabel('Kind of paper').selectOption('health-certificate')
  await page.getByRole('button', { name: 'Accession them' }).click()
  await page.getByRole('heading', { name: 'Loan in' }).waitFor()
  await picture(page, 'story-1-transaction')
  const animals = await page.getByRole('table', { name: 'Animals' }).textContent()
  const accession = /A-\d{4}/.exec(animals ?? '')?.[0] ?? ''
  expect(accession).not.toBe('')
  return accession
}

/** A technician opens the case of the batch. */
async function opensTheCase(accession: string): Promise<string> {
  const { page } = await at(desk, 'technician', '/quarantine')
  await page.getByRole('link', { name: 'Open a case' }).click()
  await page.getByLabel('Protocol').selectOption({ index: 1 })
  await choose(page, /Add an animal or group/, accession, new RegExp(accession))
  await page.getByRole('radio', { name: 'Yes, the batch is complete' }).click()
  await page.getByRole('button', { name: 'Open the case' }).click()
  await page.getByText('Day 0 of 30').waitFor()
  await page.getByText('31 Dec 2026').first().waitFor()
  await picture(page, 'story-2-case')
  return decodeURIComponent(page.url().split('/').at(-1) ?? '')
}

/** The keeper observes and flags on a phone, then once without a signal; both reach the veterinarian, once. */
async function observes(): Promise<void> {
  const { page, context } = await at({ ...phone, keepsSheets: true }, 'keeper', '/rounds')
  await page.getByRole('link', { name: /Observe QT-3/ }).click()
  await page.getByRole('radio', { name: 'Some', exact: true }).click()
  await page.getByRole('radio', { name: 'Fast', exact: true }).click()
  await page.getByLabel('What did you see?').fill('Flashing against the rock, two breathe fast')
  await page.getByRole('checkbox', { name: /For the veterinarian/ }).check()
  await picture(page, 'story-3-observation')
  await page.getByRole('button', { name: /^Save at/ }).click()
  await page.getByText(/QT-3: recorded at/).waitFor()

  await page.goto(`${app.url}/enclosures/QT-3/observe`)
  await page.getByRole('button', { name: /All well/ }).waitFor()
  await context.setOffline(true)
  await page.getByRole('button', { name: /All well/ }).click()
  await page.getByRole('button', { name: /^Save at/ }).click()
  await page
    .getByText(/1.entry kept on this device, not yet sent/)
    .first()
    .waitFor()
  await picture(page, 'story-4-without-signal')
  await context.setOffline(false)
  await page
    .getByText(/kept on this device, not yet sent/)
    .first()
    .waitFor({ state: 'detached' })
}

/** The veterinarian reads it, orders a bath, is warned, and signs. */
async function ordersABath(number: string): Promise<string> {
  const { page } = await at(desk, 'veterinarian', `/quarantine/${number}`)
  await page.getByText('Flashing against the rock, two breathe fast').waitFor()
  await page.getByRole('button', { name: 'I have read it' }).click()
  await page.getByText(/Read by Test veterinarian/).waitFor()
  await picture(page, 'story-5-read')

  await page.goto(`${app.url}/orders/new`)
  await choose(page, 'Enclosure whose water is treated', 'QT-3', /QT-3/)
  await page.getByRole('checkbox', { name: /Yellow tang/ }).check()
  await page.getByLabel('Problem treated').fill('Flashing, two breathe fast: flukes on gill mount')
  await choose(page, 'Drug product, into the water', 'formalin', /formalin/)
  await page.getByRole('combobox', { name: /Unit.*Target in the water/i }).selectOption('uL/L')
  // arithmetic is worked out when the field is left, and what is pressed next is not lost
  await page.getByLabel('Target in the water', { exact: true }).fill('40 + 60')
  await page.getByRole('radio', { name: 'For a time, then out' }).click()
  await page.getByLabel('Target is counted').selectOption('product')
  await page.getByRole('textbox', { name: /^Contact time/ }).fill('45')
  await page.getByLabel('First dose').fill('2026-12-01T14:30')
  await page.getByRole('radio', { name: 'Extralabel' }).click()
  await page.getByRole('radio', { name: 'tank', exact: true }).click()
  await page.getByRole('combobox', { name: /Unit.*Balance/i }).selectOption('mL')
  await page.getByLabel('Balance or measure reads to', { exact: true }).fill('1')
  await page.getByLabel('Stop the bath if').fill('any fish lies on its side or gasps at the surface')
  // 2,181.4 L × 100 µL/L = 218.14 mL, by hand
  await page.locator('.dose-head').getByText('218').first().waitFor()
  const signing = page.getByRole('region', { name: 'Sign as author of this order' })
  await signing.getByText(/Read .* more warnings?, and tick/).waitFor()
  await picture(page, 'story-6-warned')
  for (const read of await page.getByRole('checkbox', { name: /I have read this/ }).all()) await read.check()
  await signing.getByRole('checkbox', { name: /medical judgement/ }).check()
  await signing.getByLabel('Your password').fill(password)
  await signing.getByRole('button', { name: 'Sign order' }).click()
  await page.getByText('Checked now: this is the text that was signed.').waitFor()
  await picture(page, 'story-7-signed')
  const waiting = page.waitForEvent('download')
  await page.getByRole('link', { name: /print/i }).first().click()
  const paper = textOf(readFileSync(await (await waiting).path()))
  expect(paper).toContain('VL-20417')
  expect(paper).toMatch(/218\s?mL/)
  return /TO-\d+/.exec(page.url())?.[0] ?? ''
}

/** Found on Today; two people work it out, the second blind; given, and out in time. */
async function givesTheBath(order: string): Promise<void> {
  const { page } = await at(phone, 'technician', '/')
  await page.getByText(order).first().waitFor()
  await picture(page, 'story-8-today')
  await page.getByRole('link', { name: /formalin.* bath, QT-3/ }).click()
  await page.getByRole('combobox', { name: 'Lot in the hand' }).selectOption({ index: 1 })
  await page.getByRole('button', { name: 'Work it out with this lot' }).click()
  await page.getByText(/Test technician, .*: 218\s?mL, lot/).waitFor()

  const second = (await at(phone, 'second', `/orders/${order}/sheet?dose=1`)).page
  await second.getByText('The first result is not on this screen.').waitFor()
  expect(await second.content()).not.toMatch(/218/)
  await second.getByRole('textbox', { name: /Enclosure, from its label/ }).fill('QT-3')
  await second.getByRole('textbox', { name: /fill mark/ }).fill('0.68 m')
  await second.getByRole('textbox', { name: /Strength, from the container/ }).fill('37')
  await second.getByRole('textbox', { name: /Lot number/ }).fill('PZ-0317')
  await second.getByRole('textbox', { name: /Amount that you work out/ }).fill('218')
  await picture(second, 'story-9-blind')
  await second.getByRole('button', { name: 'Compare with the first' }).click()
  await second.getByText(/Second technician, .*: 218\s?mL\. The two agree\./).waitFor()

  await page.getByRole('textbox', { name: 'Weighed or measured' }).fill('218')
  await page.getByRole('button', { name: 'It is in the water: start the time' }).click()
  await page
    .getByRole('timer')
    .filter({ hasText: /^4[45]:\d\d$/ })
    .waitFor()
  await picture(page, 'story-10-running')
  await page.getByRole('button', { name: 'Stop the bath' }).click()
  const dialog = page.getByRole('alertdialog')
  await dialog.getByRole('textbox', { name: 'What was seen' }).fill('calm; out early for the next round')
  await dialog.getByRole('textbox', { name: 'What was done for the animals' }).fill('flushed')
  await dialog.getByRole('button', { name: 'Stop it now' }).click()
  await page.getByText(/Stopped at/).waitFor()
}

/** Five days later wet rock goes in: the clock begins again, and the case says why. */
async function tellsOfAnAddition(number: string): Promise<void> {
  later(5)
  const { page } = await at(desk, 'technician', `/quarantine/${number}`, 5)
  await page.getByText('Day 5 of 30').waitFor()
  await page.getByRole('button', { name: 'Report an event' }).click()
  const dialog = page.getByRole('dialog')
  await dialog.getByRole('combobox', { name: 'What happened' }).selectOption('Material or gear came in')
  await dialog.getByRole('radio', { name: 'Wet material' }).click()
  await dialog.getByRole('radio', { name: 'Into this water' }).click()
  await dialog.getByRole('button', { name: 'Record the event' }).click()
  await dialog.waitFor({ state: 'detached' })
  await page.getByRole('heading', { name: /^Restarted on 6.Dec.2026 because wet material/ }).waitFor()
  await page.getByText('5 Jan 2027').first().waitFor()
  await picture(page, 'story-11-restarted')
}

/** A month later: two clean samples, and the veterinarian clears. */
async function clears(number: string): Promise<void> {
  later(36)
  const { page } = await at(desk, 'veterinarian', `/quarantine/${number}`, 36)
  for (const day of ['2026-12-21', '2027-01-04']) {
    await page.getByRole('button', { name: 'Enter a result' }).click()
    const dialog = page.getByRole('dialog')
    await dialog.getByRole('combobox', { name: 'Test' }).selectOption({ index: 1 })
    await dialog.getByRole('radio', { name: 'Negative' }).click()
    await dialog.getByLabel('When the sample was taken').fill(`${day}T10:00`)
    await dialog.getByRole('button', { name: 'Record the result' }).click()
    await dialog.waitFor({ state: 'detached' })
  }
  await picture(page, 'story-12-before-clearance')
  await page.getByRole('link', { name: /^Clear/ }).click()
  const reason = page.getByLabel('Why it is cleared all the same')
  if (await reason.count()) await reason.fill('Looked at every day on paper while the network was down')
  await page.getByLabel('Your password').fill(password)
  await picture(page, 'story-13-clearance')
  await page.getByRole('button', { name: 'Clear from quarantine' }).click()
  await page.getByText('Cleared 6 Jan 2027').first().waitFor()
  const waiting = page.waitForEvent('download')
  await page.getByRole('link', { name: 'Clearance certificate (PDF)' }).click()
  const certificate = textOf(readFileSync(await (await waiting).path()))
  expect(certificate).toContain(number)
  expect(certificate).toContain('VL-20417')
  await picture(page, 'story-14-cleared')
}

/** The registrar takes the whole history out, as pages and as rows. */
async function takesTheHistoryOut(accession: string): Promise<void> {
  const { page } = await at(desk, 'registrar', `/register/histories/${accession}`, 36)
  await picture(page, 'story-15-history')
  const exported = async (format: string) => {
    await page.getByRole('radio', { name: format, exact: true }).click()
    const waiting = page.waitForEvent('download')
    await page.getByRole('button', { name: 'Export', exact: true }).click()
    return readFileSync(await (await waiting).path())
  }
  const text = textOf(await exported('PDF pages')).replaceAll('\u00a0', ' ')
  expect(text).toContain('On loan from Ledder Bay Marsh Trust')
  expect(text).toContain(accession)
  const rows = parse((await exported('CSV')).toString('utf8'), { columns: true }) as Record<string, string>[]
  expect(rows.at(-1)).toMatchObject({ accession, count_after: '14' })
}

/** Days after the test day, for the server; pages are opened as far on. */
function later(days: number): void {
  app.clock.set(new Date(begun.getTime() + days * dayMs))
}
