import type { Browser, Page } from 'playwright-core'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { aBathWater, aProduct, aSchool, bathFields, signDraft } from '../builders/an-order.ts'
import { textOf } from '../pdf/support/poppler.ts'
import { launchChromium } from '../support/chromium.ts'
import { fetchPdf } from '../support/fetch-pdf.ts'
import { choose, deskSize, expectSound, openSignedIn, phoneSize } from '../support/journey.ts'
import { startServedApp } from '../support/served-app.ts'
import type { ServedApp } from '../support/served-app.ts'

let browser: Browser
let app: ServedApp
let prazi: { id: string; lotId: string }

beforeAll(async () => {
  app = await startServedApp()
  await app.as('veterinarian')
  prazi = await aProduct(app, {})
  browser = await launchChromium()
}, 180_000)
afterAll(async () => {
  await browser.close()
  await app.stop()
})

const field = (page: Page, name: string) => page.getByRole('textbox', { name: new RegExp(`^${name}`) })
const button = (page: Page, name: string) => page.getByRole('button', { name })
const fromBench = (page: Page) => page.getByRole('region', { name: 'From the bench' })

describe.each([deskSize, phoneSize])('a bath worked out on the bench at $width px', (size) => {
  it('is kept with the order that it goes into: in the draft, under the signature and on paper', async () => {
    const code = `QT-${String(size.width)}`
    const tank = await aBathWater(app, code)
    const school = await aSchool(app, tank.id, size.width)
    const page = await openSignedIn(browser, app, 'veterinarian', '/bench/bath-dose', size)
    await choose(page, /Figures from an enclosure/, code)
    await page.getByText(/found .* ago by Test technician and confirmed/).waitFor()
    await field(page, 'Target in the water').fill('2')
    await page.getByLabel('What the target is of', { exact: true }).selectOption('active')
    await page
      .getByRole('radiogroup', { name: 'Form of the product' })
      .getByText(/powder|solid/i)
      .click()
    await field(page, 'Strength on the label').fill('100')
    await page.getByLabel('What the strength is of', { exact: true }).selectOption('active')
    await field(page, 'Smallest step of the balance').fill('0.01')
    // 2 mg/L × 2,181.4 L = 4.3628 g, worked by hand
    await button(page, 'Use in an order').click()
    await page.waitForURL(/orders\/new/)
    await fromBench(page)
      .getByText(/its working are kept beside it/)
      .waitFor()
    await button(page, 'Keep as draft').click()
    await page.waitForURL(/orders\/TO-\d+\/edit/)
    const number = /TO-\d+/.exec(page.url())?.[0] ?? ''
    // left out and put back, without a trace
    await button(page, 'Leave the bench’s working out of this order').click()
    await page.getByText('The bench’s working is left out of this order.').waitFor()
    await button(page, 'Put it back').click()
    await fromBench(page).waitFor()

    // somebody opens it who has not come from the bench: what the other fields say is filled in meanwhile
    const { agent } = await app.as('veterinarian')
    const { version, draft } = (await agent.get(`/api/orders/${number}`).expect(200)).body
    expect(draft.bench).toMatchObject({
      calculator: 'bath-dose',
      inputs: { target: { value: '2', unit: 'mg/L' } },
    })
    const fields = bathFields({
      enclosureId: tank.id,
      animalIds: [school.id],
      productId: prazi.id,
      lotId: prazi.lotId,
    })
    const saved = await agent
      .put(`/api/orders/${number}/draft`)
      .send({ expectedVersion: version, fields })
      .expect(200)
    await page.reload()
    await fromBench(page)
      .getByText(/^From the bench: Bath dose, 4\.36\sg/)
      .waitFor()
    // and it does not hang on where the window came from
    await page.goto(`${app.url}/orders`)
    await page.goto(`${app.url}/orders/${number}/edit`)
    await fromBench(page)
      .getByText(/^Bath dose: 4\.36\sg/)
      .waitFor()
    await fromBench(page)
      .getByText(/own amount is 4\.36\sg; the bench came to 4\.36\sg\. They are the same\./)
      .waitFor()
    await fromBench(page).getByText('What was asked on the bench').click()
    await fromBench(page)
      .getByText(/^Net volume of the water: 2,181\.4\sL/)
      .waitFor()
    await expectSound(page, 'a draft with its bench')

    const signed = await signDraft(app, { number, version: saved.body.version })
    expect(signed.status, JSON.stringify(signed.body)).toBe(201)
    await page.goto(`${app.url}/orders/${number}`)
    await fromBench(page)
      .getByText(/Worked out beforehand on the bench: Bath dose: 4\.36\sg/)
      .waitFor()
    await expectSound(page, 'a signed order with its bench')
    const paper = textOf(await fetchPdf(await app.as('veterinarian'), `/api/orders/${number}/print`))
    expect(paper.replaceAll(/\s+/g, ' ')).toMatch(/Worked out beforehand on the bench Bath dose: 4\.36 g/)
    await page.context().close()
  })
})
