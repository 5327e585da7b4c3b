import { mkdtempSync, readFileSync, writeFileSync } from 'node:fs'
import { tmpdir } from 'node:os'
import path from 'node:path'
import type { Browser, Download, Page } from 'playwright-core'
import { parse } from 'csv-parse/sync'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { aCase } from '../builders/a-case.ts'
import type { BuiltCase } from '../builders/a-case.ts'
import { aPlace, aStingray } from '../builders/a-collection.ts'
import { anAcquisition, aParty, aPermit, newLine, pdfBytes } from '../builders/a-register.ts'
import { textOf } from '../pdf/support/poppler.ts'
import { expectAccessible } from '../support/axe.ts'
import { launchChromium } from '../support/chromium.ts'
import { choose, deskSize, openSignedIn, phoneSize, refusals } from '../support/journey.ts'
import { startServedApp } from '../support/served-app.ts'
import type { ServedApp } from '../support/served-app.ts'

let browser: Browser
let app: ServedApp
let tank: string
let tankId: string
let taxon: string
let inCase: BuiltCase
const folder = mkdtempSync(path.join(tmpdir(), 'pratique-register-'))
const agreement = path.join(folder, 'Loan agreement LA-26-04.pdf')

const expectedErrors = refusals(409)
const desk = { ...deskSize, expectedErrors }
const phone = { ...phoneSize, expectedErrors }

beforeAll(async () => {
  app = await startServedApp()
  taxon = await aStingray(app)
  ;({ id: tankId, code: tank } = await aPlace(app))
  inCase = await aCase(app)
  await aParty(app, 'Ledder Bay Marsh Trust')
  await aPermit(app, { permitNumber: 'NS-26-017', quantityAllowed: 20 })
  for (const { width } of [desk, phone]) await anOverUse(`NS-25-${String(width)}`)
  await app.as('keeper')
  writeFileSync(agreement, pdfBytes())
  browser = await launchChromium()
}, 180_000)
/** Twelve stingrays under a permit for ten, with a history that was exported, and three more groups in one shipment. */
async function anOverUse(permitNumber: string): Promise<void> {
  const permit = await aPermit(app, { permitNumber, quantityAllowed: 10 })
  const place = { taxonId: taxon, enclosureId: tankId }
  const line = newLine(app, { ...place, count: 12 })
  const permitUses = [{ id: app.nextId(), permitId: permit.id, lineId: line.id, quantity: 12 }]
  const came = await anAcquisition(app, {
    lines: [line, newLine(app, place), newLine(app, place)],
    permitUses,
  })
  const registrar = await app.as('registrar')
  await registrar.agent
    .post(`/api/animals/${came.lines[0]?.accession ?? ''}/history/exports`)
    .send({ id: app.nextId(), format: 'pdf' })
    .expect(201)
}
afterAll(async () => {
  await browser.close()
  await app.stop()
})

const noSideways = async (page: Page, width: number) =>
  expect(await page.evaluate(() => document.documentElement.scrollWidth)).toBeLessThanOrEqual(width)

async function exportAs(page: Page, format: string): Promise<{ download: Download; bytes: Buffer }> {
  await page.getByRole('radio', { name: format, exact: true }).click()
  const waiting = page.waitForEvent('download')
  await page.getByRole('button', { name: 'Export', exact: true }).click()
  const download = await waiting
  return { download, bytes: readFileSync(await download.path()) }
}

describe.each([desk, phone])('the registrar at $width px', (size) => {
  it('accessions a batch with its paper and permit, and takes the history out', async () => {
    const page = await openSignedIn(browser, app, 'registrar', '/register', size)
    await page.getByRole('heading', { name: 'Register' }).waitFor()
    await expectAccessible(page, 'the list of transactions')
    await noSideways(page, size.width)

    await page.getByRole('link', { name: 'Accession animals' }).click()
    await page.getByRole('heading', { name: 'Accession animals' }).waitFor()
    await page.getByRole('button', { name: 'Accession them' }).click()
    await page.getByText(/fields have to change/).waitFor()
    await expectAccessible(page, 'the form with faults')
    await noSideways(page, size.width)

    await page.getByLabel('How they came').selectOption('loan-in')
    await page.getByRole('radio', { name: 'Being done now' }).click()
    await page.getByLabel('Date', { exact: true }).fill('2026-12-01')
    await choose(page, /Other party/, 'ledder', /Ledder Bay/)
    await page.getByLabel(/Number on their paper/).fill('LA-26-04')
    // one step back by mistake does not throw away what was typed
    await page.evaluate(() => history.back())
    await page.getByRole('alertdialog', { name: 'Leave without keeping it?' }).waitFor()
    // the question goes in the very event of the answer: whoever types on at once types into the form
    const isGone = await page.getByRole('button', { name: 'Go on writing' }).evaluate(async (button) => {
      ;(button as HTMLButtonElement).click()
      await Promise.resolve()
      return document.querySelector('dialog[open]') === null
    })
    expect(isGone).toBe(true)
    expect(await page.getByLabel(/Number on their paper/).inputValue()).toBe('LA-26-04')
    await choose(page, 'Taxon', 'sting', /Southern stingray/)
    await page.getByRole('radio', { name: 'Group', exact: true }).click()
    await page.getByLabel('Number alive').fill('24')
    await page.getByRole('radio', { name: 'Counted' }).click()
    await choose(page, 'Into enclosure', inCase.enclosure.code)
    await page.getByText(`${inCase.number} is in quarantine in this water.`).waitFor()
    await choose(page, 'Into enclosure', tank, new RegExp(tank))
    await page.getByText(`${inCase.number} is in quarantine in this water.`).waitFor({ state: 'detached' })
    await page.getByRole('button', { name: 'Use a permit' }).click()
    await choose(page, 'Permit', 'NS-26-017', /NS-26-017/)
    await page.getByLabel('Animals under it').fill('24')
    await page.getByRole('button', { name: 'Add a paper' }).click()
    await page.getByLabel('File', { exact: true }).setInputFiles(agreement)
    await page.getByLabel('Kind of paper').selectOption('loan-agreement')
    expect(await page.getByLabel('What it is called').inputValue()).toBe('Loan agreement LA-26-04')
    await expectAccessible(page, 'the form filled in')

    // 24 under a permit for 20 are refused before they come, and kept once they have
    await page.getByRole('button', { name: 'Accession them' }).click()
    await page.getByText(/If it has already happened, say so/).waitFor()
    await page.getByRole('radio', { name: 'Already done' }).click()
    await page.getByRole('button', { name: 'Accession them' }).click()
    await page.getByRole('heading', { name: 'Loan in' }).waitFor()
    expect(await page.getByText('waits for an explanation').isVisible()).toBe(true)
    expect(await page.getByRole('link', { name: 'Loan agreement LA-26-04' }).isVisible()).toBe(true)
    await expectAccessible(page, 'the transaction')
    await noSideways(page, size.width)

    const accession = /A-\d{4}/.exec(
      (await page.getByRole('table', { name: 'Animals' }).textContent()) ?? '',
    )?.[0]
    expect(accession).toBeTruthy()
    await page.getByRole('link', { name: accession ?? '' }).click()
    await page.getByRole('heading', { name: 'Southern stingray' }).waitFor()
    expect(await page.getByRole('heading', { name: /On loan from Ledder Bay Marsh Trust/ }).isVisible()).toBe(
      true,
    )
    expect(await page.getByText('0 + 24 − 0 = 24').isVisible()).toBe(true)
    await expectAccessible(page, 'the history')
    await noSideways(page, size.width)

    const csv = await exportAs(page, 'CSV')
    expect(csv.download.suggestedFilename()).toBe(`${accession ?? ''}-2026-12-01.csv`)
    const rows = parse(csv.bytes.toString('utf8'), { columns: true }) as Record<string, string>[]
    expect(rows).toMatchObject([{ accession, event: 'loan-in', count_change: '24', count_after: '24' }])
    const json = await exportAs(page, 'JSON')
    expect(JSON.parse(json.bytes.toString('utf8'))).toMatchObject({ history: { accession, closing: 24 } })

    const pdf = await exportAs(page, 'PDF pages')
    const text = textOf(pdf.bytes).replaceAll('\u00a0', ' ')
    expect(text).toContain('On loan from Ledder Bay Marsh Trust')
    const recordCheck = /Record check ((?:[0-9A-F]{4} ?){4})/.exec(text)?.[1]?.trim() ?? ''
    await page.goto(`${app.url}/check`)
    await page.getByLabel('Record check on the paper').fill(recordCheck)
    await page.getByRole('button', { name: 'Look it up' }).click()
    await page.getByText('The record still stands as printed').waitFor()
    await expectAccessible(page, 'a print looked up')
    await noSideways(page, size.width)
  })

  it('explains what a permit did not cover, and finds what left the house', async () => {
    const page = await openSignedIn(browser, app, 'registrar', '/register/permits', size)
    await page.getByRole('heading', { name: 'Permits' }).waitFor()
    await page
      .getByText(/animals? over/)
      .first()
      .waitFor()
    await expectAccessible(page, 'the list of permits')
    await noSideways(page, size.width)
    await page
      .getByRole('row', { name: new RegExp(`NS-25-${String(size.width)}`) })
      .getByRole('link')
      .click()
    await page.getByRole('heading', { name: 'Use-up' }).waitFor()
    await expectAccessible(page, 'a permit')
    await noSideways(page, size.width)
    await page
      .getByRole('button', { name: /^Explain the use in/ })
      .first()
      .click()
    await page
      .getByLabel('What happened, and who was told')
      .fill('Four more were in the box; the authority was told')
    await expectAccessible(page, 'an explanation')
    await page.getByRole('button', { name: 'Keep the explanation' }).click()
    await page
      .getByText(/Explained by Test registrar/)
      .first()
      .waitFor()

    await page.goto(`${app.url}/register/exports`)
    await page
      .getByRole('link', { name: /-2026-12-01\.pdf$/ })
      .first()
      .waitFor()
    await expectAccessible(page, 'the list of exports')
    await noSideways(page, size.width)
    await page.goto(`${app.url}/register/parties`)
    await page.getByText('Ledder Bay Marsh Trust').waitFor()
    await expectAccessible(page, 'the other parties')
  })
})

it('shows a keeper the register without its acts, and says who may', async () => {
  const page = await openSignedIn(browser, app, 'keeper', '/register', desk)
  await page.getByRole('heading', { name: 'Register' }).waitFor()
  expect(await page.getByRole('link', { name: 'Accession animals' }).count()).toBe(0)
  expect(await page.getByText('This is for a registrar.').isVisible()).toBe(true)
  await page.goto(`${app.url}/register/exports`)
  await page.getByText('This is for a veterinarian or a registrar.').waitFor()
})
