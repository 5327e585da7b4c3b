import { stat } from 'node:fs/promises'
import type { Browser, Page } from 'playwright-core'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { aCase, aFish } from '../builders/a-case.ts'
import type { BuiltCase } from '../builders/a-case.ts'
import { aGroup } from '../builders/a-collection.ts'
import { anEnclosure } from '../builders/a-water.ts'
import { anObservation } from '../builders/an-observation.ts'
import { password } from '../support/api.ts'
import { expectAccessible } from '../support/axe.ts'
import { launchChromium } from '../support/chromium.ts'
import { deskSize, expectSound, openSignedIn, phoneSize, picture, refusals } from '../support/journey.ts'
import { startServedApp } from '../support/served-app.ts'
import type { ServedApp } from '../support/served-app.ts'

let browser: Browser
let app: ServedApp
/** One case a size for what changes it; one that is held; one whose batch is open. */
let shown: BuiltCase[]
const dayMs = 86_400_000

beforeAll(async () => {
  app = await startServedApp()
  for (const role of ['keeper', 'technician', 'veterinarian'] as const) await app.as(role)
  shown = []
  for (const days of [25, 12]) shown.push(await aCase(app, { at: ago(days), count: 8 }))
  const held = await aCase(app, { at: ago(18), count: 30 })
  await aCase(app, { at: ago(2), close: false })
  const { agent } = await app.as('keeper')
  await agent
    .post(`${held.url}/holds`)
    .send({ id: app.nextId(), happenedAt: ago(1), origin: 'online', device: 'test' })
    .expect(201)
  // more than one page of the log holds
  for (let minute = 0; minute < 61; minute++)
    await agent
      .post('/api/observations')
      .send(
        anObservation(app, held.enclosure.code, {
          happenedAt: ago(0.5 + minute / 1440),
          words: `look ${String(minute)}`,
        }),
      )
      .expect(201)
  await app.person({
    email: 'unlicensed@harrow-point.example',
    printedName: 'Dr Without',
    roles: ['veterinarian'],
  })
  await app.setSetting('notices.on-call', 'Dr Ines Marlow | 555 0141, Duty desk | ext. 41')
  browser = await launchChromium()
}, 180_000)
afterAll(async () => {
  await browser.close()
  await app.stop()
})

const ago = (days: number) => new Date(app.clock.now().getTime() - days * dayMs).toISOString()
const expectedErrors = [...refusals(403, 409, 422), /ERR_INTERNET_DISCONNECTED/, /ERR_FAILED/]
const desk = { ...deskSize, expectedErrors }
const phone = { ...phoneSize, expectedErrors }
const awayFromSignal = { ...phone, keepsSheets: true }
const signedIn = (who: string, size: typeof desk, at: string): Promise<Page> =>
  openSignedIn(browser, app, who, at, size)

describe.each([
  { size: desk, at: 0 },
  { size: phone, at: 1 },
])('quarantine at $size.width px', ({ size, at }) => {
  it('shows every case on one day ruler and as a table, and the day moves when something enters the water', async () => {
    const own = shown[at] as BuiltCase
    const page = await signedIn('veterinarian', size, '/quarantine')
    await page.getByRole('img', { name: /4.quarantine passages on one day ruler/ }).waitFor()
    await picture(page, 'board')
    await expectSound(page, 'board')
    if (size === desk) {
      const log = page.getByRole('complementary', { name: 'Observations' })
      await log.getByText(/^The newest 60 of \d+.observations\.$/).waitFor()
      expect([await log.getByText('look 59').count(), await log.getByText('look 60').count()]).toEqual([1, 0])
      await page.getByRole('button', { name: 'Older observations' }).click()
      await log.getByText('look 60').waitFor()
      expect(await page.getByRole('button', { name: 'Older observations' }).count()).toBe(0)
    }
    await page.getByRole('radio', { name: 'Table' }).click()
    const table = page.getByRole('table', { name: 'Quarantine' })
    await table.getByText('Held', { exact: true }).waitFor()
    await picture(page, 'board-table')
    await expectSound(page, 'board as a table')
    await page.getByRole('radio', { name: /^Held/ }).click()
    await page.waitForURL(/view=held/)
    await page.getByRole('radio', { name: /^Running/ }).click()
    await table.getByRole('link', { name: own.number, exact: true }).click()

    await page.getByRole('heading', { name: 'Before clearance' }).waitFor()
    await picture(page, 'case')
    await expectSound(page, 'case')
    await page.getByRole('button', { name: 'Report an event' }).click()
    const dialog = page.getByRole('dialog')
    await dialog.getByRole('combobox', { name: 'What happened' }).selectOption('Material or gear came in')
    await dialog.getByRole('radio', { name: 'Wet material' }).click()
    await dialog.getByRole('radio', { name: 'Into this water' }).click()
    await expectAccessible(page, 'form of an event')
    await picture(page, 'report')
    await dialog.getByRole('button', { name: 'Record the event' }).click()
    await dialog.waitFor({ state: 'detached' })
    await page
      .getByRole('heading', { name: /^Restarted on .* because wet material .* entered the water\.$/ })
      .waitFor()
    await page.getByText('Day 0 of 30').waitFor()
    const { body } = await (await app.as('veterinarian')).agent.get(own.url).expect(200)
    expect(body).toMatchObject({
      dayNumber: 0,
      legs: [{ endReason: { code: 'restarted-wet-material' } }, {}],
    })
    await picture(page, 'case-restarted')
  })
})

describe('a keeper with wet hands, at 390 px', () => {
  it('observes in three touches; without a signal the entry is kept, survives a reload and arrives once with its own time', async () => {
    const tank = await aCase(app, { at: ago(6), count: 12 })
    const { code } = tank.enclosure
    const vet = (await app.as('veterinarian')).agent
    const seen = async () => (await vet.get(`/api/observations?case=${tank.number}`).expect(200)).body
    const page = await signedIn('keeper', awayFromSignal, '/rounds')
    await page.getByRole('heading', { name: 'Quarantine: Wing' }).waitFor()
    await expectSound(page, 'rounds')
    await picture(page, 'rounds')

    await page.getByRole('link', { name: `Observe ${code}`, exact: true }).click()
    await page.getByText('Say one thing, then save.').waitFor()
    expect(await page.getByRole('radio', { checked: true }).count(), 'said beforehand').toBe(0)
    await expectSound(page, 'observation')
    await picture(page, 'observe')
    await page.getByRole('button', { name: /^All well/ }).click()
    await page.getByText('Before a bath').click()
    const weak = page.getByRole('group', { name: 'Moribund or not eating' })
    await weak.getByRole('button', { name: 'One less' }).click()
    await page.getByRole('radio', { name: 'None', exact: true }).last().click()
    await page.getByText('Before a bath: 2 of 2 said').waitFor()
    await expectSound(page, 'observation before a bath')
    await picture(page, 'observe-before-bath')
    await page.getByRole('button', { name: /^Save at/ }).click()
    await page.waitForURL(/\/rounds$/)
    await page.getByText(new RegExp(`${code}: recorded at`)).waitFor()
    const said = { feeding: 'all', breathing: 'normal', foundDead: 0, count: null, origin: 'online' }
    expect(await seen()).toMatchObject({ total: 1, rows: [{ ...said, unwell: 0, handled: false }] })

    // the worker that opens the application without a signal is there for whoever has signed in, on any sheet
    await page.goto(`${app.url}/rounds`)
    await page.evaluate(async () => {
      await navigator.serviceWorker.ready
    })
    await page.context().setOffline(true)
    await page.goto(`${app.url}/settings/own`)
    await page.getByRole('heading', { name: /^No signal, and this sheet is not kept/ }).waitFor()
    await page.getByRole('link', { name: 'Go to the round' }).click()
    await page.getByText(/This list is from/).waitFor()
    await page.goto(`${app.url}/enclosures/${code}/observe`)
    await page.getByText('Say one thing, then save.').waitFor()
    await page.getByText(/^No signal since/).waitFor()
    await page.getByRole('radio', { name: 'Some', exact: true }).click()
    await page.getByRole('radio', { name: 'Fast', exact: true }).click()
    await page.getByRole('checkbox', { name: /^For the veterinarian/ }).check()
    await picture(page, 'observe-offline')
    const savedAt = await page.evaluate(() => Date.now())
    await page.getByRole('button', { name: /^Save at/ }).click()
    await page.waitForURL(/\/rounds$/)
    await page.getByText(/1.entry kept on this device, not yet sent/).waitFor()
    await page.getByRole('link', { name: '1 entry not sent' }).waitFor()
    await page.reload()
    await page.getByText(/1.entry kept on this device, not yet sent/).waitFor()
    await page.getByText(/This list is from/).waitFor()
    await expectSound(page, 'rounds without a signal')
    await picture(page, 'rounds-offline')
    await page.goto(`${app.url}/enclosures/${code}/observe`)
    await page.getByRole('button', { name: /^All well/ }).waitFor()
    await page.goto(`${app.url}/unsent`)
    await page.getByText(/Some ate\. Breathing fast/).waitFor()
    await expectSound(page, 'entries on this device')
    await picture(page, 'unsent')
    expect((await seen()).total).toBe(1)

    await page.getByRole('button', { name: /^Test keeper/ }).click()
    await page.getByRole('menuitem', { name: 'Sign out' }).click()
    await page.getByRole('heading', { name: 'Sign out with 1 entry not sent?' }).waitFor()
    await page.getByRole('button', { name: 'Stay signed in' }).click()

    await page.waitForTimeout(1500)
    await page.context().setOffline(false)
    await page.getByRole('heading', { name: 'Everything is sent' }).waitFor()
    const { total, rows } = await seen()
    expect(total).toBe(2)
    expect(rows[0]).toMatchObject({
      feeding: 'some',
      breathing: 'fast',
      origin: 'outbox',
      forVeterinarian: true,
    })
    expect(Math.abs(new Date(rows[0].happenedAt).getTime() - savedAt)).toBeLessThan(2000)
    expect(new Date(rows[0].recordedAt).getTime()).toBeGreaterThan(savedAt + 1400)

    const desktop = await signedIn('veterinarian', desk, `/quarantine/${tank.number}`)
    await desktop.getByText('for the veterinarian').waitFor()
    await desktop.getByRole('button', { name: 'I have read it' }).click()
    await desktop.getByText(/^Read by Test veterinarian/).waitFor()
    expect((await seen()).rows[0].reviewed).toMatchObject({ by: 'Test veterinarian' })

    // one that was made by mistake is struck out with a reason, and stays readable
    await desktop.getByRole('button', { name: 'Strike out' }).first().click()
    const question = desktop.getByRole('dialog', { name: /^Strike out what was seen at/ })
    await question.getByLabel('Reason').fill('seen at the tank beside it')
    await expectSound(desktop, 'observation-strike')
    await question.getByRole('button', { name: 'Strike out' }).click()
    await desktop.getByText('Struck out: seen at the tank beside it').waitFor()
    expect((await seen()).rows[0].voidedReason).toBe('seen at the tank beside it')
  })

  it('is told that an urgent call was not sent, whom to telephone, and later who has seen it', async () => {
    const tank = await aCase(app, { at: ago(5), count: 4 })
    const { code } = tank.enclosure
    const page = await signedIn('keeper', awayFromSignal, '/rounds')
    await page.getByRole('link', { name: `Observe ${code}`, exact: true }).click()
    await page.getByRole('button', { name: 'Hold' }).waitFor()
    await page.waitForLoadState('networkidle')
    await page.context().setOffline(true)
    await page.getByRole('button', { name: 'Urgent' }).click()
    const dialog = page.getByRole('dialog')
    await dialog
      .getByRole('textbox', { name: 'What did you see?' })
      .fill('Two lie on the floor, one tail slack')
    await dialog.getByRole('button', { name: 'Call for help' }).click()
    await page.getByRole('heading', { name: 'NOT SENT' }).waitFor()
    await page.getByText('This rings nobody. Telephone now:').waitFor()
    expect(await page.getByRole('link', { name: /Dr Ines Marlow/ }).getAttribute('href')).toBe('tel:5550141')
    await expectSound(page, 'urgent call that was not sent')
    await picture(page, 'urgent')
    await page.getByRole('button', { name: 'I have telephoned' }).click()
    await page.getByRole('dialog').getByRole('combobox', { name: 'Whom' }).selectOption('Duty desk')
    await page.getByRole('dialog').getByRole('button', { name: 'Record it' }).click()
    await page.getByText(/^you telephoned Duty desk at/).waitFor()
    await page.getByRole('button', { name: 'Hold the case' }).click()
    await page.getByText(`${tank.number}: the hold is kept on this device, not yet sent`).waitFor()

    await page.context().setOffline(false)
    await page.getByText(/^Test keeper telephoned Duty desk at/).waitFor({ timeout: 20_000 })
    // nobody on the list has an e-mail address: with the server is not the same as sent
    await page.getByRole('heading', { name: 'NOT SENT' }).waitFor()
    const { body } = await (await app.as('veterinarian')).agent.get(tank.url).expect(200)
    expect(body).toMatchObject({ held: true })

    const desktop = await signedIn('veterinarian', desk, `/quarantine/${tank.number}`)
    await desktop.getByRole('link', { name: 'Open the call' }).click()
    await desktop.getByRole('button', { name: 'I have seen it and see to it' }).click()
    await desktop.getByText(/^Seen by Test veterinarian at/).waitFor()
    await page.getByRole('heading', { name: 'Seen', exact: true }).waitFor()
    await page.getByText(/^Seen by Test veterinarian at/).waitFor()
    await picture(page, 'urgent-seen')
    expect(
      (await (await app.as('keeper')).agent.get('/api/notices?state=all').expect(200)).body.rows,
    ).toHaveLength(1)
  })
})

describe.each([desk, phone])('the beginning and the end of a case at $width px', (size) => {
  it('a technician opens it for everybody in a tank, and a veterinarian clears it against what is unmet', async () => {
    const code = `N-${String(size.width)}`
    const tank = await anEnclosure(app, code, { boundary: 'Wing' })
    const taxonId = await aFish(app)
    const school = await aGroup(app, { taxonId, enclosureId: tank.id, count: 6, happenedAt: ago(3) })
    const page = await signedIn('technician', size, '/quarantine/new')
    await page.getByRole('combobox', { name: 'Protocol' }).selectOption({ index: 1 })
    await page.getByRole('combobox', { name: 'Or add everybody in an enclosure' }).fill(code)
    await page.getByRole('option', { name: new RegExp(code) }).click()
    await page.getByRole('button', { name: 'Add everybody there' }).click()
    await page.getByRole('button', { name: `Take ${school.accession} out of the batch` }).waitFor()
    await page.getByRole('radio', { name: 'Yes, the batch is complete' }).click()
    await expectSound(page, 'opening a case')
    await picture(page, 'open-case')
    await page.getByRole('button', { name: 'Open the case' }).click()
    await page.waitForURL(/\/quarantine\/Q-\d+$/)
    await page.getByRole('heading', { name: 'Before clearance' }).waitFor()
    await picture(page, 'opened')
    await page.getByText(/^Day 3 of \d+$/).waitFor({ timeout: 8000 })
    const number = new URL(page.url()).pathname.split('/').at(-1) ?? ''

    const other = await signedIn('unlicensed', size, `/quarantine/${number}/clearance`)
    await other.getByText('This case can’t be cleared yet').waitFor()
    await other
      .getByText(/licence/i)
      .first()
      .waitFor()

    const vet = await signedIn('veterinarian', size, `/quarantine/${number}`)
    await vet.getByRole('link', { name: /^Clear against \d+.unmet condition/ }).click()
    await vet
      .getByRole('textbox', { name: 'Why it is cleared all the same' })
      .fill('kept apart for a year before')
    // somebody who presses a way out by mistake keeps the reason
    await vet.getByRole('link', { name: number, exact: true }).click()
    await vet.getByRole('alertdialog', { name: 'Leave without keeping it?' }).waitFor()
    await vet.getByRole('button', { name: 'Go on writing' }).click()
    await vet.getByRole('textbox', { name: 'Your password' }).fill('not the password')
    await vet.getByRole('button', { name: /^Clear against/ }).click()
    await vet.locator('.signature .wrong').waitFor()
    await vet.getByRole('textbox', { name: 'Your password' }).fill(password)
    await expectSound(vet, 'clearance form')
    await picture(vet, 'clearance')
    await vet.getByRole('button', { name: /^Clear against/ }).click()
    await vet.waitForURL(/\/quarantine\/Q-\d+$/)
    await vet.getByRole('heading', { name: 'Clearance', exact: true }).waitFor()
    await vet.getByText(/because: kept apart for a year before/).waitFor()
    await expectSound(vet, 'cleared case')
    await picture(vet, 'cleared')
    const [download] = await Promise.all([
      vet.waitForEvent('download'),
      vet.getByRole('link', { name: 'Clearance certificate (PDF)' }).click(),
    ])
    const { size: bytes } = await stat(await download.path())
    expect(bytes).toBeGreaterThan(2000)
    const { body } = await (await app.as('veterinarian')).agent.get(`/api/cases/${number}`).expect(200)
    expect(body).toMatchObject({ status: 'cleared', clearance: { reason: 'kept apart for a year before' } })
  }, 120_000)
})
