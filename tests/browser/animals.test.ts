import type { Browser, Page } from 'playwright-core'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { aGroup, anAnimal, aPlace, aStingray } from '../builders/a-collection.ts'
import type { TestPlace } from '../builders/a-collection.ts'
import { expectAccessible } from '../support/axe.ts'
import { launchChromium } from '../support/chromium.ts'
import { deskSize, openSignedIn, phoneSize, refusals } from '../support/journey.ts'
import { startServedApp } from '../support/served-app.ts'
import type { ServedApp } from '../support/served-app.ts'

let browser: Browser
let app: ServedApp
let taxonId: string
let hall: TestPlace
let pool: TestPlace
const dayMs = 86_400_000

beforeAll(async () => {
  app = await startServedApp()
  for (const role of ['keeper', 'registrar', 'veterinarian'] as const) await app.as(role)
  taxonId = await aStingray(app)
  hall = await aPlace(app)
  pool = await aPlace(app)
  browser = await launchChromium()
}, 180_000)
afterAll(async () => {
  await browser.close()
  await app.stop()
})

const ago = (days: number) => new Date(app.clock.now().getTime() - days * dayMs).toISOString()

const signedIn = (role: string, size: typeof deskSize): Promise<Page> =>
  openSignedIn(browser, app, role, '/animals', { ...size, expectedErrors: refusals(404, 409) })

describe.each([deskSize, phoneSize])('animals at $width px', (size) => {
  const name = `Sail ${String(size.width)}`

  it('are found, weighed with a slip that is asked back, and moved', async () => {
    const ray = await anAnimal(app, {
      taxonId,
      enclosureId: hall.id,
      name,
      happenedAt: ago(60),
      sex: 'female',
    })
    const keeper = await app.as('keeper')
    await keeper.agent
      .post(`${ray.url}/weights`)
      .send({
        id: app.nextId(),
        weight: { value: '41.2', unit: 'kg' },
        basis: 'measured',
        happenedAt: ago(20),
      })
      .expect(201)

    const page = await signedIn('keeper', size)
    await page.getByRole('searchbox').fill(name)
    await page.getByRole('searchbox').press('Enter')
    await page.waitForURL(/\?q=Sail/)
    await page.getByRole('status').getByText('1 row', { exact: true }).waitFor()
    await expectAccessible(page, 'list of animals')
    await page.getByRole('link', { name: ray.accession }).click()
    await page.getByRole('heading', { level: 1, name: `${name}, Southern stingray` }).waitFor()
    await page
      .getByRole('img', { name: /^Weight of one animal over time, 1 weight\. Last 41\.2.kg/ })
      .waitFor()
    await expectAccessible(page, 'sheet of an animal')

    await page.getByRole('button', { name: 'Weigh' }).first().click()
    const dialog = page.getByRole('dialog')
    await dialog.getByRole('textbox', { name: 'Weight', exact: true }).fill('412')
    await dialog.getByText(/very unlike the weight before/).waitFor()
    await expectAccessible(page, 'form of a weight that is asked back')
    await dialog.getByRole('textbox', { name: 'Weight', exact: true }).fill('41.80')
    await dialog.getByRole('radio', { name: 'measured' }).click()
    await dialog.getByRole('button', { name: 'Record the weight' }).click()
    await dialog.waitFor({ state: 'detached' })
    await page.getByRole('img', { name: /2 weights\. Last 41\.80.kg/ }).waitFor()

    await page.getByRole('button', { name: 'Move', exact: true }).first().click()
    await dialog.getByRole('combobox', { name: 'To' }).fill(pool.code)
    await dialog.getByRole('option', { name: new RegExp(`^${pool.code}`) }).click()
    await dialog.getByRole('button', { name: 'Record the move' }).click()
    await dialog.waitFor({ state: 'detached' })
    await page.getByRole('table', { name: 'Places' }).getByRole('link', { name: pool.code }).waitFor()
    const sheet = await keeper.agent.get(ray.url).expect(200)
    expect(sheet.body).toMatchObject({
      place: { code: pool.code },
      newestWeight: { value: '41.80', unit: 'kg', weightKg: 41.8 },
    })
  })

  it('are recorded dead as they were seen, and the registrar explains the one too many', async () => {
    const school = await aGroup(app, { taxonId, enclosureId: hall.id, count: 2, happenedAt: ago(30) })
    const page = await signedIn('keeper', size)
    await page.goto(`${app.url}/animals/${school.accession}`)
    await page.getByRole('button', { name: 'Record deaths' }).click()
    const dialog = page.getByRole('dialog')
    for (let body = 0; body < 3; body++) await dialog.getByRole('button', { name: 'One more' }).click()
    await dialog.getByText(/is kept as you saw it/).waitFor()
    await dialog.getByRole('radio', { name: 'found dead' }).click()
    await expectAccessible(page, 'form of deaths')
    await dialog.getByRole('button', { name: 'Record the deaths' }).click()
    await dialog.waitFor({ state: 'detached' })
    await page.getByText('3 were seen, 2 were in the ledger.').waitFor()
    await page.getByText('No longer in the house').waitFor()
    await expectAccessible(page, 'sheet of a group')

    const office = await signedIn('registrar', size)
    await office.goto(`${app.url}/animals/${school.accession}`)
    await office.getByRole('button', { name: 'Explain' }).click()
    const asked = office.getByRole('dialog')
    await asked.getByRole('combobox', { name: 'It turned out that' }).selectOption('count-corrected')
    await asked.getByRole('textbox', { name: 'Why' }).fill('one had hatched unseen')
    await asked.getByRole('button', { name: 'Record the explanation' }).click()
    await asked.waitFor({ state: 'detached' })
    await office.getByRole('heading', { name: 'To be explained' }).waitFor({ state: 'detached' })
    const counts = await (await app.as('registrar')).agent.get(`${school.url}/counts`).expect(200)
    expect(counts.body.lines).toHaveLength(4)
  })

  it('say plainly that a number is not known, and where to look', async () => {
    const page = await signedIn('veterinarian', size)
    await page.goto(`${app.url}/animals/A-9999`)
    await page.getByRole('heading', { name: 'No animal has this number' }).waitFor()
    await page.getByRole('link', { name: 'To the list of animals' }).click()
    await page.getByRole('heading', { name: 'Animals and groups' }).waitFor()
  })
})
