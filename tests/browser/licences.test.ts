import type { Browser, Locator, Page } from 'playwright-core'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { addDays } from '../../shared/domain/time/facility-date.ts'
import { aBathWater, aDraft, aProduct, aSchool, bathFields, readingsNow } from '../builders/an-order.ts'
import { pdfBytes } from '../builders/a-register.ts'
import { password } from '../support/api.ts'
import type { TestPerson } from '../support/api.ts'
import { launchChromium } from '../support/chromium.ts'
import { deskSize, expectSound, openSignedIn, phoneSize, refusals } from '../support/journey.ts'
import { startServedApp } from '../support/served-app.ts'
import type { ServedApp } from '../support/served-app.ts'

const today = '2026-12-01'
let browser: Browser
let app: ServedApp
let tank: Awaited<ReturnType<typeof aBathWater>>
let fields: Parameters<typeof bathFields>[0]
beforeAll(async () => {
  app = await startServedApp()
  await app.setSetting('facility.jurisdictions', 'Norrell Sound, Outer Skerries')
  for (const role of ['administrator', 'technician', 'veterinarian'] as const) await app.as(role)
  tank = await aBathWater(app, 'QT-3')
  const school = await aSchool(app, tank.id, 1)
  const product = await aProduct(app, {})
  const now = new Date(app.clock.now().getTime() - 360_000).toISOString()
  await readingsNow(
    app,
    tank.waterBodyId,
    { 'dissolved-oxygen': ['6.9', 'mg/L'], temperature: ['23.4', 'degC'], salinity: ['33.1', 'PSS-78'] },
    now,
  )
  fields = {
    enclosureId: tank.id,
    animalIds: [school.id],
    productId: product.id,
    lotId: product.lotId,
    startsAt: new Date(app.clock.now().getTime() + 3_600_000).toISOString(),
  }
  browser = await launchChromium()
}, 180_000)
afterAll(async () => {
  await browser.close()
  await app.stop()
})

const expectedErrors = refusals(403, 409, 422, 429)
const aVet = (name: string): Promise<TestPerson> =>
  app.person({
    email: `${name}@harrow-point.example`,
    printedName: `Dr ${name}`,
    roles: ['veterinarian'],
  })
const license = async (person: TestPerson, given: object = {}) =>
  (await app.as('administrator')).agent
    .post(`/api/people/${person.id}/licences`)
    .send({
      id: app.nextId(),
      class: 'veterinary',
      jurisdiction: 'Norrell Sound',
      number: 'VL-1',
      validFrom: '2026-01-01',
      validUntil: '2027-12-31',
      ...given,
    })
    .expect(201)

/** The signature of a draft that nothing but the signer keeps from being signed. */
async function signatureOf(page: Page): Promise<Locator> {
  const signing = page.getByRole('region', { name: 'Sign as author of this order' })
  await signing.getByRole('button', { name: 'Sign order' }).waitFor()
  await page.locator('.dose-head').getByText('4.36').first().waitFor()
  return signing
}
async function answerAll(page: Page) {
  for (const read of await page.getByRole('checkbox', { name: /I have read this/ }).all()) await read.check()
  for (const reason of await page.getByLabel('Why it is overridden').all())
    await reason.fill('given from this order alone')
  await page.getByRole('checkbox', { name: /medical judgement/ }).check()
}

describe.each([
  { ...deskSize, expectedErrors },
  { ...phoneSize, expectedErrors },
])('licences at $width px', (size) => {
  const suffix = String(size.width)

  it('are several of one person: entered with a paper, corrected, ended, and seen by that person', async () => {
    const vet = await aVet(`several${suffix}`)
    await license(vet, { number: 'VL-19', validUntil: addDays(today, 25) })
    const page = await openSignedIn(browser, app, 'administrator', `/settings/people/${vet.id}`, size)
    const licences = page.getByRole('region', { name: 'Licences and registrations' })
    await licences.getByText('Norrell Sound, VL-19: valid').waitFor()
    await licences.getByText(/Licence VL-19, Norrell Sound, ends in 25.days, on 26.Dec.2026/).waitFor()

    await page.getByRole('button', { name: 'Enter a licence' }).click()
    await page.getByLabel('What it is').selectOption('Controlled-substance registration')
    await page.getByRole('textbox', { name: 'Jurisdiction' }).fill('Norrell Sound')
    await page.getByRole('textbox', { name: 'Licence number' }).fill('CS-7')
    await page.getByLabel('First day').fill('2026-01-01')
    await page.getByLabel('Last day').fill('2027-01-01')
    await page.getByRole('button', { name: 'Enter a licence' }).click()
    await licences.getByText('Norrell Sound, CS-7: valid').waitFor()

    await licences.getByRole('button', { name: 'Attach a paper' }).last().click()
    await page.setInputFiles('input[type=file]', {
      name: 'licence.pdf',
      mimeType: 'application/pdf',
      buffer: pdfBytes(),
    })
    await page.getByLabel('Kind of paper').selectOption('Licence or registration')
    await page.getByRole('button', { name: 'Attach it' }).click()
    await licences.getByRole('link', { name: 'licence', exact: true }).waitFor()

    await page.getByRole('button', { name: 'Correct, VL-19' }).click()
    const number = page.getByRole('textbox', { name: 'Licence number' })
    expect(await number.inputValue()).toBe('VL-19')
    await number.fill('VL-91')
    await page.getByRole('button', { name: 'Keep the correction' }).click()
    await page.getByLabel('Why it is corrected').fill('digits exchanged')
    await expectSound(page, `licence-corrected-${suffix}`)
    await page.getByRole('button', { name: 'Keep the correction' }).click()
    await licences.getByText('Norrell Sound, VL-91: valid').waitFor()
    await licences.getByText('Corrected entry: digits exchanged').waitFor()
    // the earlier one stays readable
    await licences.getByText('Norrell Sound, VL-19: corrected by another entry').waitFor()

    await page.getByRole('button', { name: 'End, CS-7' }).click()
    await page.getByRole('button', { name: 'End the licence' }).click()
    await page.getByLabel('Last day on which it is valid').fill('2028-01-01')
    await page.getByRole('textbox', { name: 'Reason' }).fill('given up')
    await page.getByRole('button', { name: 'End the licence' }).click()
    await page.getByText('Type a day inside the period of the licence.').waitFor()
    await page.getByLabel('Last day on which it is valid').fill('2026-11-30')
    await page.getByRole('button', { name: 'End the licence' }).click()
    await licences.getByText('Norrell Sound, CS-7: ended before its time').waitFor()
    await expectSound(page, `person-licences-${suffix}`)

    await page.goto(`${app.url}/settings/people?q=several${suffix}`)
    await page
      .getByText(/Licence VL-91, Norrell Sound, ends in 25.days/)
      .first()
      .waitFor()
    await expectSound(page, `people-licences-${suffix}`)

    const own = await openSignedIn(browser, app, `several${suffix}`, '/settings/own', size)
    const mine = own.getByRole('region', { name: 'Licences and registrations' })
    await mine.getByText('Norrell Sound, VL-91: valid').waitFor()
    await mine.getByText(/ends in 25.days/).waitFor()
    const paper = mine.getByRole('link', { name: 'licence', exact: true })
    const file = await own.request.get(`${app.url}${(await paper.getAttribute('href')) ?? ''}`)
    expect([file.status(), file.headers()['content-type']]).toEqual([200, 'application/pdf'])
    expect(await mine.getByRole('button').count()).toBe(0)
    await expectSound(own, `own-licences-${suffix}`)
  })

  it('of which several are valid ask the signer which one signs, and none is presumed', async () => {
    const vet = await aVet(`chooses${suffix}`)
    await license(vet, { number: 'VL-31' })
    await license(vet, { number: 'VL-32', jurisdiction: 'Outer Skerries' })
    const draft = await aDraft(app, bathFields(fields), vet)
    const page = await openSignedIn(browser, app, `chooses${suffix}`, `/orders/${draft.number}/edit`, size)
    const signing = await signatureOf(page)
    await answerAll(page)
    const choice = signing.getByLabel('Licence you sign under')
    expect(await choice.inputValue()).toBe('')
    await signing.getByText('Choose the licence you sign under.').waitFor()
    expect(await signing.getByRole('button', { name: 'Sign order' }).getAttribute('aria-disabled')).toBe(
      'true',
    )
    await expectSound(page, `sign-choice-${suffix}`)
    await choice.selectOption({ label: 'Outer Skerries, licence VL-32, valid to 31 Dec 2027' })
    await signing.getByLabel('Your password').fill(password)
    await signing.getByRole('button', { name: 'Sign order' }).click()
    await page.getByText('Checked now: this is the text that was signed.').waitFor()
    await page
      .getByText(/Outer Skerries, licence VL-32/)
      .first()
      .waitFor()
  })

  it('of which one ended while the form was open refuse it with a sentence', async () => {
    const vet = await aVet(`ends${suffix}`)
    await license(vet, { number: 'VL-41' })
    const draft = await aDraft(app, bathFields(fields), vet)
    const page = await openSignedIn(browser, app, `ends${suffix}`, `/orders/${draft.number}/edit`, size)
    const signing = await signatureOf(page)
    await answerAll(page)
    await signing.getByLabel('Your password').fill(password)
    const admin = (await app.as('administrator')).agent
    const [one] = (await admin.get(`/api/people/${vet.id}`).expect(200)).body.licences
    await admin
      .post(`/api/people/${vet.id}/licences/${String(one.id)}/end`)
      .set('Idempotency-Key', app.nextId())
      .send({ endedOn: '2026-11-30', reason: 'withdrawn' })
      .expect(200)
    await signing.getByRole('button', { name: 'Sign order' }).click()
    await signing
      .getByText(/Your licence VL-41 \(Norrell Sound\) ended on 30.Nov.2026/)
      .first()
      .waitFor()
    await signing.getByLabel('Your password').waitFor({ state: 'detached' })
    await expectSound(page, `sign-ended-${suffix}`)
  })

  it('sign nothing after five wrong passwords, and it says until when, while a hold goes through', async () => {
    const vet = await aVet(`locked${suffix}`)
    await license(vet, { number: 'VL-51' })
    const draft = await aDraft(app, bathFields(fields), vet)
    const page = await openSignedIn(browser, app, `locked${suffix}`, `/orders/${draft.number}/edit`, size)
    const signing = await signatureOf(page)
    await answerAll(page)
    for (let i = 0; i < 5; i++) {
      await signing.getByLabel('Your password').fill(`wrong ${String(i)}`)
      const answered = page.waitForResponse(/\/signature$/)
      await signing.getByRole('button', { name: 'Sign order' }).click()
      await answered
    }
    await signing.getByText(/signing is locked for you until 1.Dec.2026, 14:[3-5]\d/).waitFor()
    await signing
      .getByText(/It opens by itself then; nobody can open it sooner/)
      .first()
      .waitFor()
    expect(await signing.getByLabel('Your password').count()).toBe(0)
    await expectSound(page, `sign-locked-${suffix}`)

    await page.goto(`${app.url}/settings/own`)
    await page.getByText(/signing is locked for you until/).waitFor()
    const admin = await openSignedIn(browser, app, 'administrator', `/settings/people/${vet.id}`, size)
    await admin.getByText(/Signing is locked until 1.Dec.2026, 14:[3-5]\d/).waitFor()
    await expectSound(admin, `person-locked-${suffix}`)
    // what is seen at the tank is stopped all the same
    const held = await vet.agent
      .post(`/api/orders/${draft.number}/holds`)
      .send({ id: app.nextId(), happenedAt: app.clock.now().toISOString() })
    expect(held.status).toBe(201)
  })
})
