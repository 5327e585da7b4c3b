import type { Browser, Page } from 'playwright-core'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import {
  aBathWater,
  aDraft,
  aProduct,
  aSchool,
  bathFields,
  readingsNow,
  signDraft,
} from '../builders/an-order.ts'
import type { BuiltEnclosure } from '../builders/a-water.ts'
import { password } from '../support/api.ts'
import { launchChromium } from '../support/chromium.ts'
import type { SessionOptions } from '../support/chromium.ts'
import { deskSize, expectSound, openSignedIn, phoneSize, refusals } from '../support/journey.ts'
import { startServedApp } from '../support/served-app.ts'
import type { ServedApp } from '../support/served-app.ts'

let browser: Browser
let begunMs: number
let app: ServedApp
let tank: BuiltEnclosure & { sumpId: string }
let formalin: { id: string; lotId: string }
let school: { id: string }

beforeAll(async () => {
  app = await startServedApp()
  for (const role of ['veterinarian', 'technician', 'keeper'] as const) await app.as(role)
  await app.person({
    email: 'second@harrow-point.example',
    printedName: 'Second technician',
    roles: ['technician'],
  })
  tank = await aBathWater(app, 'QT-3')
  school = await aSchool(app, tank.id, 1)
  formalin = await aProduct(app, {
    agent: 'formalin',
    productName: 'Formalin 37 %',
    form: 'liquid',
    strength: { value: '37', unit: 'percent_w_w' },
    density: { value: '1.08', unit: 'g/mL' },
  })
  // another container, at which nobody has looked today
  const { agent } = await app.as('technician')
  await agent
    .post(`/api/products/${formalin.id}/lots`)
    .send({ id: app.nextId(), lotNumber: 'FM-2202', expiresOn: '2028-03-31', receivedOn: '2026-11-10' })
    .expect(201)
  begunMs = app.clock.now().getTime()
  browser = await launchChromium()
}, 180_000)
afterAll(async () => {
  await browser.close()
  await app.stop()
})

const expectedErrors = [
  ...refusals(409, 422),
  /403 \(Forbidden\) \(.*\/second-calculation/,
  /ERR_INTERNET_DISCONNECTED/,
]
const desk = { ...deskSize, expectedErrors }
const phone = { ...phoneSize, expectedErrors }
const signedIn = (who: string, size: SessionOptions, at: string): Promise<Page> =>
  openSignedIn(browser, app, who, at, size)

/** A formalin bath of 45 min at 100 µL/L, a hazard: 2,181.4 L × 100 µL/L = 218.14 mL, worked by hand. */
async function aSignedBath(given: object = {}): Promise<string> {
  const draft = await aDraft(
    app,
    bathFields({
      enclosureId: tank.id,
      animalIds: [school.id],
      productId: formalin.id,
      lotId: formalin.lotId,
      target: { value: '100', unit: 'uL/L' },
      basis: 'product',
      timing: 'timed',
      contactMinutes: 45,
      division: { value: '1', unit: 'mL' },
      startsAt: '2026-12-01T18:20:00Z',
      stopIf: 'any fish lies on its side, or gasps at the surface, or 45 minutes are over',
      ...given,
    }),
  )
  const signed = await signDraft(app, draft)
  if (signed.status !== 201) throw new Error(JSON.stringify(signed.body))
  return draft.number
}

const freshWater = () =>
  readingsNow(app, tank.waterBodyId, {
    'dissolved-oxygen': ['6.9', 'mg/L'],
    temperature: ['20.4', 'degC'],
    salinity: ['33.1', 'PSS-78'],
    ph: ['8.1', 'pH'],
    alkalinity: ['2.4', 'meq/L'],
  })

/** Everything that the server sends to a page from now on. */
function listen(page: Page): string[] {
  const heard: string[] = []
  page.on('response', (response) => {
    if (response.url().includes('/api/'))
      void response.text().then(
        (text) => heard.push(text),
        () => undefined,
      )
  })
  return heard
}

/** What could tell an amount: ids and instants hold digits of their own by chance. */
const withoutIdsAndInstants = (text: string) =>
  text
    .replaceAll(/[\da-f]{8}(-[\da-f]{4}){3}-[\da-f]{12}/gi, 'an-id')
    .replaceAll(/\d{4}-\d\d-\d\dT[\d:.]+Z/g, 'an-instant')

/** The sheet of the first dose as the server has it. */
const asTheServerHasIt = async (number: string) =>
  (await (await app.as('veterinarian')).agent.get(`/api/orders/${number}/doses/1`).expect(200)).body

async function fillSecond(page: Page, amount: string) {
  await page.getByRole('textbox', { name: /Enclosure, from its label/ }).fill('QT-3')
  await page.getByRole('textbox', { name: /fill mark/ }).fill('0.68 m')
  await page.getByRole('textbox', { name: /Strength, from the container/ }).fill('37')
  await page.getByRole('textbox', { name: /Lot number/ }).fill('FM-2202')
  await page.getByRole('textbox', { name: /Amount that you work out/ }).fill(amount)
}

/** Minutes after everything was set up. */
const later = (minutes: number) => new Date(begunMs + minutes * 60_000)

// every state is looked at by the accessibility checker, which takes its time on a small machine
const patience = 240_000

describe('a bath at the tank', { timeout: patience }, () => {
  it('is worked out twice, given, timed by the server and stopped by a keeper, all on phones', async () => {
    app.clock.set(later(0))
    const number = await aSignedBath({ doses: 2, intervalHours: 48 })
    const sheetAt = `/orders/${number}/sheet`
    const tech = await signedIn('technician', phone, sheetAt)
    await tech.waitForURL(/dose=1/)

    // conditions are steps; what is not known leads to where it is entered
    await tech.getByText(/Water tested: oxygen within/).waitFor()
    const reading = tech.getByRole('link', { name: 'Enter a reading' }).first()
    expect(await reading.getAttribute('href')).toBe('/enclosures/QT-3/measure')
    await expectSound(tech, 'bath-conditions')
    await freshWater()
    await tech.reload()

    // the first calculation, with the lot in the hand
    await tech
      .getByRole('combobox', { name: 'Lot in the hand' })
      .selectOption({ label: 'FM-2202, use by 31 Mar 2028' })
    // it is judged by that one at once: at this bottle nobody has looked
    await tech.getByRole('button', { name: 'I looked: clear, not kept cold' }).waitFor()
    await tech.getByRole('button', { name: 'Work it out with this lot' }).click()
    await tech.getByText(/Test technician, .*: 218\s?mL, lot FM-2202/).waitFor()
    await tech.getByRole('button', { name: 'I looked: clear, not kept cold' }).click()
    await tech.getByRole('button', { name: 'I looked: clear, not kept cold' }).waitFor({ state: 'detached' })
    await tech.getByText('A veterinarian, technician or keeper who is not you').waitFor()
    await expectSound(tech, 'bath-first')

    // the same person is no second person
    await tech.goto(`${app.url}${sheetAt}?dose=1&part=second`)
    await tech.getByText('You made the first calculation').waitFor()
    await tech.getByText(/another person’s: any veterinarian, technician or keeper/).waitFor()
    expect(await tech.getByRole('textbox', { name: /Amount that you work out/ }).count()).toBe(0)
    await tech
      .getByText(/you may repeat it yourself from \d\d:\d\d: read label, mark and container again/)
      .waitFor()
    await expectSound(tech, 'bath-same-person')
    // with nobody to be reached they read everything again, and not before the time is over
    await tech.getByRole('button', { name: 'Nobody else can be reached: I repeat it myself' }).click()
    await fillSecond(tech, '218')
    await tech.getByRole('button', { name: 'Compare with the first' }).click()
    await tech.getByText(/You made the first calculation. Ask another person/).waitFor()
    await tech.goto(`${app.url}${sheetAt}?dose=1`)

    // the second person sees nothing of the first, on the page or on the wire
    const other = await signedIn('second', phone, '/settings/own')
    const heard = listen(other)
    await other.goto(`${app.url}${sheetAt}?dose=1`)
    await other.getByText('The first result is not on this screen.').waitFor()
    const amountField = other.getByRole('textbox', { name: /Amount that you work out/ })
    expect(await amountField.isDisabled()).toBe(true)
    expect(await other.getByRole('button', { name: 'Hold' }).count()).toBe(1)
    await expectSound(other, 'bath-second')
    await fillSecond(other, '2180')
    await other.getByRole('button', { name: 'Compare with the first' }).click()
    await other.getByText('The two do not agree. Nothing is given.').waitFor()
    await other.getByText(/The amounts differ by more than 2/).waitFor()
    await expectSound(other, 'bath-second-differs')
    await other.getByText('Both begin again', { exact: true }).waitFor()
    expect(await amountField.count()).toBe(0)
    const theirs = `${heard.join(' ')} ${await other.content()}`
      // the number of its port may hold any digits
      .replaceAll(app.url, '')
      .replaceAll('2,180', '')
      .replaceAll('2180', '')
    const seen = withoutIdsAndInstants(theirs)
    expect(heard.length).toBeGreaterThan(2)
    expect(seen).not.toMatch(/218|PZ-0317/)

    // both begin again: the second waits until the first is there anew
    await tech.getByText('the two do not agree').waitFor()
    await expectSound(tech, 'bath-first-differs')
    await tech.getByRole('button', { name: 'Begin again: work it out anew' }).click()
    await other.getByText('The first result is not on this screen.').waitFor()
    expect(await amountField.inputValue()).toBe('')
    await fillSecond(other, '219')
    await other.getByRole('button', { name: 'Compare with the first' }).click()
    await other.getByText(/Second technician, .*: 219\s?mL\. The two agree\./).waitFor()

    // what is weighed is typed, and a slip of ten is refused
    await tech.getByRole('textbox', { name: 'Weighed or measured' }).fill('2180')
    await expectSound(tech, 'bath-give')
    await tech.getByRole('button', { name: 'It is in the water: start the time' }).click()
    await tech.getByText(/has to be 218\s?mL/).waitFor()
    await tech.getByRole('textbox', { name: 'Weighed or measured' }).fill('218')
    await tech.getByRole('button', { name: 'It is in the water: start the time' }).click()

    // the time is the server's: it survives a reload, and a page whose own clock stands still
    const time = tech.getByRole('timer')
    await time.filter({ hasText: /^4[45]:\d\d$/ }).waitFor()
    await tech.getByText('Stop the bath if').waitFor()
    await expectSound(tech, 'bath-running')
    app.clock.set(later(20))
    await tech.reload()
    await time.filter({ hasText: /^2[56]:\d\d$/ }).waitFor()

    // a keeper sees what has to be seen, and stops without a password
    const keeper = await signedIn('keeper', { ...phone, keepsSheets: true }, `${sheetAt}?dose=1`)
    await keeper
      .getByRole('timer')
      .filter({ hasText: /^2[56]:\d\d$/ })
      .waitFor()
    app.clock.set(later(50))
    await keeper.reload()
    await keeper
      .getByRole('timer')
      .filter({ hasText: /over by \d:/ })
      .waitFor()
    await keeper.getByText('Take the animals out, or flush the water now.').first().waitFor()
    await expectSound(keeper, 'bath-time-up')
    // without a signal, and after a reload: the time goes on, and the stop is kept with its own time
    await keeper.evaluate(async () => {
      await navigator.serviceWorker.ready
    })
    await keeper.reload()
    await keeper.getByRole('timer').waitFor()
    await keeper.context().setOffline(true)
    await keeper.reload()
    await keeper.getByText(/^No signal\. This is the bath as it was at 15:1\d/).waitFor()
    await keeper
      .getByRole('timer')
      .filter({ hasText: /over by \d:/ })
      .waitFor()
    const stop = keeper.getByRole('button', { name: 'Stop the bath' })
    expect(await stop.evaluate((node) => node.getBoundingClientRect().bottom <= window.innerHeight)).toBe(
      true,
    )
    await stop.click()
    const dialog = keeper.getByRole('alertdialog')
    await dialog.getByRole('textbox', { name: 'What was seen' }).fill('two on their side')
    await dialog.getByRole('textbox', { name: 'What was done for the animals' }).fill('flushed, air on full')
    await expectSound(keeper, 'bath-stop')
    expect(await keeper.getByLabel('Password').count()).toBe(0)
    await dialog.getByRole('button', { name: 'Stop it now' }).click()
    await keeper.getByText(/^Ended at 15:1\d: not sent yet/).waitFor()
    expect(await stop.count()).toBe(0)
    await expectSound(keeper, 'bath-stop-unsent')
    expect(await asTheServerHasIt(number)).toMatchObject({ state: 'running' })
    await keeper.getByRole('button', { name: 'Hold' }).click()
    await keeper.getByRole('dialog').getByRole('button', { name: 'Hold it now' }).click()
    await keeper.getByText(/^Held at 15:1\d: not sent yet/).waitFor()
    await keeper.context().setOffline(false)
    await keeper.getByText(/Stopped at 15:1\d, Test keeper/).waitFor({ timeout: 30_000 })
    await keeper.getByText('Held: do not dose').waitFor()
    expect(await keeper.getByText(/not sent yet/).count()).toBe(0)
    await keeper.getByText('Seen: two on their side').waitFor()
    await keeper.getByText('Done: flushed, air on full').waitFor()
    await expectSound(keeper, 'bath-stopped')
  })

  it('is recorded afterwards with its own time, with what would have stopped it; held orders say so', async () => {
    app.clock.set(later(60))
    const number = await aSignedBath({ startsAt: '2026-12-01T13:00:00Z' })
    const page = await signedIn('keeper', phone, `/orders/${number}/sheet?dose=1`)
    await page.getByRole('button', { name: 'Record what happened' }).click()
    const dialog = page.getByRole('dialog')
    await dialog.getByRole('radio', { name: 'It was given' }).click()
    await dialog.getByRole('textbox', { name: 'How much was given' }).fill('220')
    await dialog.getByLabel('When', { exact: true }).fill('2026-12-01T09:05')
    await dialog.getByLabel(/When the bath ended/).fill('2026-12-01T09:45')
    await dialog.getByRole('textbox', { name: 'In words' }).fill('before the day’s rounds')
    await expectSound(page, 'bath-record')
    await dialog.getByRole('button', { name: 'Record it' }).click()
    await page.getByText('Recorded as given').waitFor()
    await page.getByText(/Test keeper, 09:05, entered 15:2\d/).waitFor()
    await page.getByText('Out of the bath at 09:45, Test keeper').waitFor()
    await page.getByText('For the veterinarian to review').waitFor()
    await page.getByText('The order was signed after this dose').waitFor()
    await expectSound(page, 'bath-recorded')

    const held = await aSignedBath()
    await page.goto(`${app.url}/orders/${held}/sheet?dose=1`)
    await page.getByRole('button', { name: 'Hold' }).click()
    await page.getByRole('dialog').getByRole('textbox', { name: 'What you saw' }).fill('fast breathing')
    await page.getByRole('dialog').getByRole('button', { name: 'Hold it now' }).click()
    await page.getByRole('heading', { name: 'Held: do not dose' }).waitFor()
    await page.getByText('fast breathing').waitFor()
    await page.getByText(/can still be recorded/).waitFor()
    expect(await page.getByRole('button', { name: 'Work it out with this lot' }).count()).toBe(0)
    await expectSound(page, 'bath-held')

    // ten times too much is kept and marked; a slip of the hand is struck out and stays readable
    await page.getByRole('button', { name: 'Record what happened' }).click()
    await dialog.getByRole('radio', { name: 'It was given' }).click()
    await dialog.getByRole('textbox', { name: 'How much was given' }).fill('2180')
    await dialog.getByRole('button', { name: 'Record it' }).click()
    await page.getByText('Another amount was given than was worked out').waitFor()
    await page.getByText(/That is about 10 times as much/).waitFor()
    await expectSound(page, 'bath-tenfold')
    await page.getByRole('button', { name: 'Strike out this record' }).click()
    await page.getByRole('textbox', { name: 'Why' }).fill('typed one digit too many')
    await page.getByRole('button', { name: 'Strike it out' }).click()
    await page.getByText(/^Struck out by Test keeper/).waitFor()
    await page.getByText('“typed one digit too many”').waitFor()
    await expectSound(page, 'bath-struck')

    const vet = await signedIn('veterinarian', phone, `/orders/${await aSignedBath()}/sheet?dose=1`)
    await vet.getByRole('button', { name: 'Override for this dose' }).first().click()
    await vet.getByRole('dialog').getByLabel('Why it is given all the same').fill('air is on hard')
    await vet.getByRole('dialog').getByLabel('Your password').fill(password)
    await expectSound(vet, 'bath-override')
    await vet.getByRole('dialog').getByRole('button', { name: 'Sign the override' }).click()
    await vet.getByRole('heading', { name: 'Overridden for this dose' }).waitFor()
  })

  it('of an agent left in the water asks when it is out, from which quarantine counts', async () => {
    app.clock.set(later(65))
    const praziquantel = await aProduct(app, {})
    const number = await aSignedBath({
      productId: praziquantel.id,
      lotId: praziquantel.lotId,
      target: { value: '2', unit: 'mg/L' },
      basis: 'active',
      timing: 'indefinite',
      contactMinutes: null,
      division: { value: '0.01', unit: 'g' },
    })
    const { agent } = await app.as('technician')
    await agent
      .post(`/api/orders/${number}/doses/1/record`)
      .send({
        id: app.nextId(),
        kind: 'recorded',
        happenedAt: '2026-12-01T18:00:00Z',
        amount: { value: '4.36', unit: 'g' },
        lotId: praziquantel.lotId,
      })
      .expect(201)
    const page = await signedIn('keeper', phone, `/orders/${number}/sheet?dose=1`)
    await page.getByRole('heading', { name: 'The drug is in the water' }).waitFor()
    await expectSound(page, 'bath-in-the-water')
    await page.getByRole('button', { name: 'The drug is out of the water' }).click()
    const dialog = page.getByRole('dialog')
    await dialog.getByRole('textbox', { name: 'How it was taken out' }).fill('carbon on, half changed')
    await dialog.getByRole('button', { name: 'Record it' }).click()
    await page.getByText(/Drug out of the water at 15:2\d, Test keeper/).waitFor()
    await page.getByText('Done: carbon on, half changed').waitFor()
    expect(await page.getByRole('heading', { name: 'The drug is in the water' }).count()).toBe(0)
  })

  it('reads well at a desk, every dose at hand', async () => {
    app.clock.set(later(70))
    const number = await aSignedBath({ doses: 3, intervalHours: 24, startsAt: '2026-12-01T20:00:00Z' })
    const page = await signedIn('veterinarian', desk, `/orders/${number}/sheet?dose=1`)
    await page.getByRole('navigation', { name: 'Doses of this order' }).waitFor()
    await page.getByText('The volume is the one of the signature.').waitFor()
    await expectSound(page, 'bath')
    const print = page.getByRole('link', { name: 'Bath sheet on paper' })
    expect(await print.getAttribute('href')).toBe(`/api/orders/${number}/doses/1/print`)
    await page.getByRole('link', { name: /^2, / }).click()
    await page.getByText(/dose 2 of 3/).waitFor()
  })
})
