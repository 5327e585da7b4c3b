import type { Browser, Page } from 'playwright-core'
import pg from 'pg'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { installation } from '../../server/platform/http/request-context.ts'
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
import { localMomentOf } from '../../src/lib/local-moment.ts'
import { password } from '../support/api.ts'
import { launchChromium } from '../support/chromium.ts'
import { deskSize, expectSound, openSignedIn, phoneSize, picture, refusals } from '../support/journey.ts'
import { startServedApp } from '../support/served-app.ts'
import type { ServedApp } from '../support/served-app.ts'

let browser: Browser
let app: ServedApp
let owner: pg.Client
const numbers = { signed: '', copper: '', draft: '', broken: '' }

const hoursFromNow = (hours: number) => new Date(app.clock.now().getTime() + hours * 3_600_000).toISOString()

beforeAll(async () => {
  app = await startServedApp()
  await app.composition.formulary.service.loadDefaults()
  for (const role of ['veterinarian', 'technician', 'keeper', 'registrar'] as const) await app.as(role)
  const late = await app.person({
    email: 'vet2@harrow-point.example',
    printedName: 'Dr Late Licence',
    roles: ['veterinarian'],
  })
  await app.composition.people.service.enterLicence({ actor: installation, requestId: 'test' }, late.id, {
    id: app.nextId(),
    class: 'veterinary',
    jurisdiction: 'Norrell Sound',
    number: 'VL-19002',
    validFrom: '2020-01-01',
    validUntil: '2026-09-30',
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
  await readingsNow(app, shrimpTank.waterBodyId, { salinity: ['33.0', 'PSS-78'] }, now)
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

const expectedErrors = refusals(403, 409, 422)
const desk = { ...deskSize, expectedErrors }
const phone = { ...phoneSize, expectedErrors }

/** A date and time so many hours from now, as the facility's clock shows it. */
const localIn = (hours: number) => localMomentOf(hoursFromNow(hours), 'America/Halifax')

const signedIn = (name: string, size: typeof desk, at: string): Promise<Page> =>
  openSignedIn(browser, app, name, at, size)

describe.each([desk, phone])('orders at $width px', (size) => {
  it('are listed, searched and filtered by the address', async () => {
    const page = await signedIn('keeper', size, '/orders')
    await page.getByRole('link', { name: numbers.signed }).waitFor()
    await expectSound(page, 'the list of orders')
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
    // left out for whoever may calculate second, until they ask; remembered from then on, at the other size too
    const show = page.getByRole('button', { name: 'I do not calculate second: show the amount' })
    if (await show.isVisible()) await show.click()
    // signed and now are two amounts
    await page.getByText('by the water now').waitFor()
    await expectSound(page, 'a signed order')
    await picture(page, `order-signed-${String(size.width)}`)
    const amend = page.getByRole('button', { name: 'Amend' })
    expect(await amend.getAttribute('aria-disabled')).toBe('true')

    await page.goto(`${app.url}/orders/${numbers.signed}`)
    await page.getByRole('link', { name: 'Bath sheet of dose 1' }).waitFor()
    expect(await page.getByText('Dose 3').isVisible()).toBe(true)
  })

  it('say loudly that a record was changed after its signature', async () => {
    const page = await signedIn('keeper', size, `/orders/${numbers.broken}`)
    const alert = page.getByRole('alert').filter({ hasText: 'Record check failed' })
    await alert.waitFor()
    expect(await alert.textContent()).toContain('do not dose')
    await expectSound(page, 'a broken order')
    await picture(page, `order-broken-${String(size.width)}`)
  })

  it('is written like an earlier one, with everything open that was true only then', async () => {
    const page = await signedIn('technician', size, `/orders/${numbers.signed}`)
    await page.getByRole('link', { name: 'Write one like it' }).click()
    await page.getByText(`Begun as ${numbers.signed}.`).waitFor()
    expect(await page.getByLabel('Target in the water', { exact: true }).inputValue()).toBe('2')
    expect(await page.getByLabel('First dose').inputValue()).toBe('')
    const animals = page.getByRole('checkbox', { name: /Yellow tang/ })
    await animals.first().waitFor()
    expect(await animals.first().isChecked()).toBe(false)
    expect(await page.getByRole('radio', { name: 'Extralabel' }).isChecked()).toBe(false)
    await expectSound(page, 'an order like an earlier one')
    await picture(page, `order-copied-${String(size.width)}`)
  })

  it('is written by a veterinarian: judged while typed, a stop overridden, warnings read, signed', async () => {
    const page = await signedIn('veterinarian', size, '/orders/new')
    await page.getByRole('combobox', { name: 'Enclosure whose water is treated' }).fill('QT-4')
    await page.getByRole('option', { name: /QT-4/ }).first().click()
    await page.getByRole('checkbox', { name: /Yellow tang/ }).check()
    await expectSound(page, 'an empty order')
    await page.getByLabel('Problem treated').fill('White spot, seen on gill mount')
    await page.getByRole('combobox', { name: 'Drug product, into the water' }).fill('copper')
    await page.getByRole('option', { name: /copper sulfate/ }).click()

    // parts per million says nothing, and the form says what to type
    const target = page.getByLabel('Target in the water', { exact: true })
    await target.fill('2 ppm')
    await page.getByLabel('Target is counted').focus()
    await page
      .getByText(/Parts per million can mean three things/)
      .first()
      .waitFor()
    await target.fill('0.15')
    // without a basis nothing is worked out, and no reason helps
    await page.getByText('This stop can’t be overridden').first().waitFor()
    await page.getByLabel('Target is counted').selectOption('free')
    await page.getByRole('radio', { name: 'Left in the water' }).click()
    await page.getByLabel('First dose').fill(localIn(3))
    await page.getByRole('radio', { name: 'Extralabel' }).click()
    await page.getByRole('radio', { name: 'tank', exact: true }).click()
    await page.getByLabel('Balance or measure reads to', { exact: true }).fill('0.001')
    await page.getByLabel('Stop the bath if').fill('any fish on its side')
    // 0.15 mg/L × 2,181.4 L ÷ 25.45 % ÷ 99 % = 1.299 g, by hand
    await page.locator('.dose-head').getByText('1.299').first().waitFor()
    const signing = page.getByRole('region', { name: 'Sign as author of this order' })
    await signing.getByText(/stops? (is|are) open: remove/).waitFor()
    await expectSound(page, 'an order with its cautions')
    // the shrimp, and each order that gives copper into this water already: a reason for every one
    const reasons = page.getByLabel('Why it is overridden')
    for (const reason of await reasons.all()) await reason.fill('given from this order alone')
    await reasons.first().fill('the shrimp moves to QT-5 before the first gram')
    for (const read of await page.getByRole('checkbox', { name: /I have read this/ }).all())
      await read.check()
    expect(await signing.textContent()).toContain('Norrell Sound, licence VL-20417, valid to')
    await picture(page, `order-form-${String(size.width)}`)
    await signing.getByLabel('Your password').fill('wrong password')
    await signing.getByRole('button', { name: 'Sign order' }).click()
    // extralabel: asked for before anything is sent
    await signing.getByText('An extralabel order is signed only with this statement.').first().waitFor()
    await signing.getByRole('checkbox', { name: /medical judgement/ }).check()
    await signing.getByRole('button', { name: 'Sign order' }).click()
    await signing
      .getByText(/password/i)
      .last()
      .waitFor()
    await page
      .locator('.wrong')
      .filter({ hasText: /password/i })
      .waitFor()
    // what was typed and answered survived the refusal
    expect(await reasons.first().inputValue()).toContain('QT-5')
    await signing.getByLabel('Your password').fill(password)
    await signing.getByRole('button', { name: 'Sign order' }).click()
    await page.getByText('Checked now: this is the text that was signed.').waitFor()
    expect(
      await page.getByText(/Overridden by Test veterinarian, reason: the shrimp moves/).isVisible(),
    ).toBe(true)
  })

  it('cannot be signed with a licence that ended, and says so', async () => {
    const page = await signedIn('vet2', size, `/orders/${numbers.draft}/edit`)
    await page.getByText(/licence VL-19002 \(Norrell Sound\) ended on 30.Sep.2026/).waitFor()
    const sign = page.getByRole('button', { name: 'Sign order' })
    expect(await sign.getAttribute('aria-disabled')).toBe('true')
    expect(await page.getByLabel('Your password').count()).toBe(0)
    await expectSound(page, 'an order that cannot be signed')
  })

  it('holds both texts when two people wrote one draft, and asks before unsaved text is left', async () => {
    const page = await signedIn('veterinarian', size, `/orders/${numbers.draft}/edit`)
    const problem = page.getByLabel('Problem treated')
    await problem.waitFor()
    const other = await app.person({
      email: `other-vet-${String(size.width)}@harrow-point.example`,
      printedName: 'Other veterinarian',
      roles: ['veterinarian'],
    })
    const order = (await other.agent.get(`/api/orders/${numbers.draft}`).expect(200)).body
    await other.agent
      .put(`/api/orders/${numbers.draft}/draft`)
      .send({
        expectedVersion: order.version,
        fields: { ...order.draft, problem: `Typed by a colleague at ${String(size.width)}` },
      })
      .expect(200)
    await problem.fill('Typed by the veterinarian')
    await page.getByRole('button', { name: 'Keep as draft' }).click()
    await page.getByRole('heading', { name: /Somebody else saved this draft/ }).waitFor()
    expect(await page.getByText(`Typed by a colleague at ${String(size.width)}`).isVisible()).toBe(true)
    await expectSound(page, 'two texts of one draft')
    await picture(page, `order-stale-${String(size.width)}`)
    await page.getByRole('button', { name: 'Save mine over it' }).click()
    await page.getByRole('heading', { name: /Somebody else saved this draft/ }).waitFor({ state: 'detached' })
    expect(await problem.inputValue()).toBe('Typed by the veterinarian')
    await expect
      .poll(async () => (await other.agent.get(`/api/orders/${numbers.draft}`)).body.draft.problem)
      .toBe('Typed by the veterinarian')

    await problem.fill('Typed and not kept')
    await page.getByRole('link', { name: 'Back to the order' }).click()
    await page.getByRole('alertdialog').getByText('Leave without keeping it?').waitFor()
    await page.getByRole('button', { name: 'Go on writing' }).click()
    expect(await problem.inputValue()).toBe('Typed and not kept')
    await page.getByRole('link', { name: 'Back to the order' }).click()
    await page.getByRole('button', { name: 'Leave', exact: true }).click()
    await page.getByText('Not signed. Nothing may be dosed by it.').first().waitFor()
    await expectSound(page, 'a draft, to be read')
    await picture(page, `order-draft-${String(size.width)}`)
  })

  it('is held by a keeper in one touch, and the hold lifted by a veterinarian', async () => {
    const aMinuteOn = () => app.clock.set(new Date(app.clock.now().getTime() + 60_000))
    aMinuteOn()
    const keeper = await signedIn('keeper', size, `/orders/${numbers.signed}`)
    await keeper.getByRole('button', { name: 'Hold this order' }).click()
    await keeper.getByText(/Held by Test keeper/).waitFor()
    await picture(keeper, `order-held-${String(size.width)}`)
    expect(await keeper.getByRole('button', { name: 'Lift the hold' }).getAttribute('aria-disabled')).toBe(
      'true',
    )
    aMinuteOn()
    const vet = await signedIn('veterinarian', size, `/orders/${numbers.signed}`)
    await vet.getByRole('button', { name: 'Lift the hold' }).click()
    await vet.getByLabel('Why it may go on').fill(`Looked at ${String(size.width)}, breathes normally`)
    await vet.getByRole('dialog').getByRole('button', { name: 'Lift the hold' }).click()
    await vet.getByText(new RegExp(`Hold lifted: Looked at ${String(size.width)}`)).waitFor()
    expect(await vet.getByText(/^Held by/).count()).toBe(0)
  })
})

describe('the form of an order', () => {
  it('is filled in and kept with the keyboard alone, by a technician as a proposal', async () => {
    const page = await signedIn('technician', desk, '/orders')
    const keys = page.keyboard
    /** Goes on with Tab until a control of that name has the focus. */
    const tabTo = async (name: string) => {
      const control = page
        .getByLabel(name, { exact: true })
        .or(page.getByRole('button', { name, exact: true }))
        .or(page.getByRole('link', { name, exact: true }))
        .or(page.getByRole('radio', { name, exact: true }))
        .or(page.getByRole('checkbox', { name }))
        .first()
      await control.waitFor()
      for (let i = 0; i < 60; i++) {
        await keys.press('Tab')
        if (await control.evaluate((node) => node === document.activeElement)) return
      }
      throw new Error(`Tab never came to ${name}`)
    }
    await tabTo('Propose an order')
    await keys.press('Enter')
    await page.getByText('A veterinarian takes up your proposal and signs it.').waitFor()
    await tabTo('Enclosure whose water is treated')
    await keys.type('QT-3')
    await keys.press('ArrowDown')
    await keys.press('Enter')
    await page.getByRole('checkbox', { name: /Yellow tang/ }).waitFor()
    await tabTo('A-0001 Yellow tang')
    await keys.press('Space')
    await tabTo('Problem treated')
    await keys.type('Flukes seen on a scrape')
    await tabTo('Drug product, into the water')
    await keys.type('prazi')
    await keys.press('ArrowDown')
    await keys.press('Enter')
    await tabTo('Target in the water')
    await keys.type('2')
    await tabTo('Target is counted')
    await keys.type('as active')
    await tabTo('For a time, then out')
    await keys.press('ArrowRight')
    await keys.press('Enter')
    await tabTo('Balance or measure reads to')
    await keys.type('0.01')
    await page.locator('.dose-head').getByText('4.36').first().waitFor()
    await tabTo('Keep as proposal')
    await keys.press('Enter')
    await page.waitForURL(/\/orders\/TO-\d+\/edit$/)
    const number = /TO-\d+/.exec(page.url())?.[0] ?? ''
    const kept = (await (await app.as('keeper')).agent.get(`/api/orders/${number}`).expect(200)).body
    expect(kept).toMatchObject({
      phase: 'proposed',
      draft: {
        problem: 'Flukes seen on a scrape',
        target: { value: '2', unit: 'mg/L' },
        basis: 'active',
        timing: 'indefinite',
        division: { value: '0.01', unit: 'g' },
      },
    })
    expect(kept.draft.animalIds).toHaveLength(1)
    // a technician is told who signs
    const sign = page.getByRole('region', { name: 'Sign as author of this order' })
    expect(await sign.textContent()).toContain('This is for a veterinarian')
  })
})
