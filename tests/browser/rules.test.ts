import type { Browser, Page } from 'playwright-core'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { cautionRules } from '../../shared/domain/cautions/caution-rules.ts'
import { password } from '../support/api.ts'
import { aFormalinHouse } from '../builders/a-bath.ts'
import { putInForce } from '../builders/a-threshold.ts'
import { readingsNow } from '../builders/an-order.ts'
import { launchChromium } from '../support/chromium.ts'
import { textOf } from '../pdf/support/poppler.ts'
import { deskSize, expectSound, openSignedIn, phoneSize, picture, refusals } from '../support/journey.ts'
import { startServedApp } from '../support/served-app.ts'
import type { ServedApp } from '../support/served-app.ts'

let browser: Browser
let app: ServedApp

beforeAll(async () => {
  app = await startServedApp()
  for (const role of ['veterinarian', 'technician', 'keeper'] as const) await app.as(role)
  browser = await launchChromium()
}, 180_000)
afterAll(async () => {
  await browser.close()
  await app.stop()
})

const expectedErrors = [...refusals(403, 409, 422, 500), /Failed to load resource/]
const desk = { ...deskSize, expectedErrors }
const phone = { ...phoneSize, expectedErrors }
const open = (who: string, size: typeof desk, at = '/settings/rules'): Promise<Page> =>
  openSignedIn(browser, app, who, at, size)
const ruleAt = (page: Page, id: string) =>
  page.locator('details.rule').filter({ hasText: new RegExp(`^${id} `) })

describe.each([desk, phone])('the rules at $width px', (size) => {
  const isDesk = size === desk
  // each size has a threshold of its own: the two share one facility
  const [rule, value, waits] = isDesk
    ? (['R01', '6', /Confirm 6\smg\/L for R01/] as const)
    : (['R41', '4', /Confirm 4/] as const)

  it('stand with all there is to say of each, and are found by search and filters', async () => {
    const page = await open('keeper', size)
    await page.getByText(`${String(cautionRules.length)} of ${String(cautionRules.length)} rules`).waitFor()
    await expectSound(page, 'the rules')
    await ruleAt(page, 'R02').locator('summary').first().click()
    const opened = await ruleAt(page, 'R02').innerText()
    for (const said of [
      'Formalin that stays in the water takes oxygen',
      'at signing and before each dose',
      'A veterinarian may override it with a signed reason',
      'V: the source itself was opened',
      'Oxygen would fall too low',
      'Aerate, and log oxygen continuously.',
      'Oldest oxygen reading at signing',
    ])
      expect(opened.replaceAll('\u00a0', ' ')).toContain(said)
    await expectSound(page, 'a rule unfolded')
    // a keeper reads; nothing is offered
    expect(await page.getByRole('button', { name: 'Propose another value' }).count()).toBe(0)
    if (!isDesk) await page.getByText('Filters', { exact: true }).click()
    await page.getByLabel('Override', { exact: true }).selectOption('no')
    await page.waitForURL(/override=no/)
    const fixed = cautionRules.filter(({ overridable }) => !overridable)
    await page.getByText(`${String(fixed.length)} of ${String(cautionRules.length)} rules`).waitFor()
    await page.getByLabel('Rule, finding, source or threshold').fill('no rule says this')
    await page.getByRole('button', { name: 'Show all' }).click()
    await page.getByText(`${String(cautionRules.length)} of ${String(cautionRules.length)} rules`).waitFor()
  })

  it('a threshold is proposed by a technician and put in force by a veterinarian, with the keyboard alone', async () => {
    const tech = await open('technician', size, `/settings/rules?q=${rule}`)
    const proposing = tech
      .getByRole('button', { name: new RegExp(`Propose another value for ${rule}`) })
      .first()
    await proposing.focus()
    await tech.keyboard.press('Enter')
    await tech.getByRole('button', { name: 'Propose it' }).click()
    await tech.getByText('Fill this in.').first().waitFor()
    await tech.getByLabel(/^New value/).fill('100000')
    await tech.getByLabel('Why').fill('the meters here read low')
    await tech.keyboard.press('Tab')
    await tech.keyboard.press('Enter')
    await tech.getByText(/It can be at most/).waitFor()
    await expectSound(tech, 'a threshold proposed')
    await tech.getByLabel(/^New value/).fill(value)
    await tech.getByRole('button', { name: 'Propose it' }).click()
    await tech.getByText(/Waits for confirmation: .*proposed by Test technician/).waitFor()
    const shut = tech.getByRole('button', { name: waits })
    expect(await shut.getAttribute('aria-disabled')).toBe('true')

    const vet = await open('veterinarian', size, '/settings/rules?standing=waiting')
    await vet.getByRole('button', { name: waits }).focus()
    await vet.keyboard.press('Enter')
    await vet.getByText(/^Now /).waitFor()
    const dialog = vet.getByRole('dialog')
    await dialog.getByRole('button', { name: 'Confirm' }).click()
    await vet.getByText('Fill this in.').first().waitFor()
    await dialog.getByLabel('How it was checked').fill('checked against the log of the meters')
    await dialog.getByLabel('Your password, again').fill('not this one')
    await vet.keyboard.press('Enter')
    await dialog.getByRole('button', { name: 'Confirm' }).click()
    await dialog
      .getByText(/password/i)
      .nth(1)
      .waitFor()
    await expectSound(vet, 'a threshold confirmed')
    await dialog.getByLabel('Your password, again').fill(password)
    await dialog.getByRole('button', { name: 'Confirm' }).click()
    await dialog.waitFor({ state: 'detached' })
    await vet.goto(`${app.url}/settings/rules?standing=confirmed&q=${rule}`)
    await vet.getByText(/Confirmed by Test veterinarian on 1\sDec\s2026 for Norrell\sSound/).waitFor()
    await vet
      .getByText(/^History of/)
      .first()
      .click()
    await vet.getByText(/proposed by Test technician, .*the meters here read low/).waitFor()
    await expectSound(vet, 'the history of a threshold')
  })

  it('say that they cannot be read, and are fetched again', async () => {
    const page = await open('keeper', size, '/settings/own')
    await page.route('**/api/caution-rules', (route) => route.abort())
    await page.goto(`${app.url}/settings/rules`)
    await page.getByRole('button', { name: 'Try again' }).waitFor({ timeout: 30_000 })
    await picture(page, 'rules-unreadable')
    await page.unroute('**/api/caution-rules')
    await page.getByRole('button', { name: 'Try again' }).click()
    await page.getByText(`${String(cautionRules.length)} of ${String(cautionRules.length)} rules`).waitFor()
  })
})

describe('the rules where they are looked for', () => {
  it('are in the menu of every person, whatever the role', async () => {
    const page = await open('keeper', desk, '/')
    await page.getByRole('button', { name: /Test keeper, menu/ }).click()
    await page.getByRole('menuitem', { name: 'Rules of the cautions' }).click()
    await page.waitForURL(/settings\/rules/)
    await page.getByRole('heading', { name: 'Rules of the cautions' }).waitFor()
  })

  it('loosening what was read at its source asks for the jurisdiction that allows it', async () => {
    const page = await open('veterinarian', desk, '/settings/rules?q=R05')
    await page.getByRole('button', { name: /Propose another value for R05, .*penaeid.*tank/i }).click()
    await page.getByLabel(/^New value/).fill('120')
    await page.getByLabel('Why').fill('the label of the place allows more')
    await page.getByRole('button', { name: 'Propose it' }).click()
    await page.getByRole('button', { name: /Confirm 120/ }).click()
    const dialog = page.getByRole('dialog')
    await dialog.getByText('It loosens the rule').waitFor()
    await dialog.getByLabel('How it was checked').fill('read in the label of the place')
    await dialog.getByLabel('Your password, again').fill(password)
    await dialog.getByRole('button', { name: 'Confirm' }).click()
    await dialog.getByText('Fill this in.').waitFor()
    await dialog.getByLabel('Jurisdiction').fill('Elsewhere')
    await dialog.getByRole('button', { name: 'Confirm' }).click()
    await dialog.getByText(/does not accept this jurisdiction|Fill this in/).waitFor()
    await dialog.getByLabel('Your password, again').fill(password)
    await dialog.getByRole('button', { name: 'Confirm' }).click()
    await dialog.getByText(/does not accept this jurisdiction/).waitFor()
    await dialog.getByLabel('Jurisdiction').fill('Norrell Sound')
    await dialog.getByLabel('Your password, again').fill(password)
    await dialog.getByRole('button', { name: 'Confirm' }).click()
    await page.locator('.tag').getByText('Loosened here').first().waitFor()
  })

  it('are printed by the browser unfolded, without what is pressed', async () => {
    const page = await open('keeper', desk)
    await page.getByText(`${String(cautionRules.length)} of`).waitFor()
    const last = ruleAt(page, 'R50').getByText('Doses that stay in the water make a strength together')
    expect(await last.isVisible()).toBe(false)
    await page.emulateMedia({ media: 'print' })
    expect(await last.isVisible()).toBe(true)
    expect(await page.getByRole('button', { name: 'Open every rule' }).isVisible()).toBe(false)
    expect(await page.locator('.bridge').isVisible()).toBe(false)
    await picture(page, 'rules-printed')
    // whichever way the paper lies: the frame of a wide window scrolls, and paper does not
    for (const landscape of [false, true]) {
      const paper = await page.pdf({ format: 'A3', landscape })
      const text = textOf(paper)
      for (const { id } of cautionRules) expect(text).toContain(`${id} `)
      expect(text.replaceAll('\u00a0', ' ')).toContain(
        'Doses that stay in the water make a strength together',
      )
      expect(text).not.toContain('Filters')
    }
  })
})

describe('a limit that the facility changed after an order was signed', () => {
  it.each([desk, phone])('stands on the bath sheet apart from the signed one, at $width px', async (size) => {
    const rest = await atAnotherTank(size === desk)
    const page = await open('technician', size, `/orders/${rest}/sheet?dose=1&part=whole`)
    const step = page.getByRole('listitem').filter({ hasText: /Oxygen at least/ })
    await step.getByText(/Since signing the facility has changed this limit to/).waitFor()
    const said = (await step.innerText()).replace(/\s+/g, ' ')
    expect(said).toContain('Oxygen at least 7 mg/L')
    expect(said).toContain('changed this limit to 8 mg/L (lowest oxygen)')
    // 7.4 mg/L would do by the signed limit: what is found is found by the one in force, after the sentence that names it
    expect(said.indexOf('7.4 mg/L')).toBeGreaterThan(said.indexOf('changed this limit'))
    await expectSound(page, 'a limit changed since')
  })
})

let house: Awaited<ReturnType<typeof aFormalinHouse>> | undefined
/** A bath signed at 7 mg/L, in water of 7.4 mg/L, where 8 mg/L is in force by now. */
async function atAnotherTank(isFirst: boolean): Promise<string> {
  if (isFirst) house = await aFormalinHouse(app)
  if (!house) throw new Error('no house')
  await putInForce(app, 'R01', 'oxygenFloorMgPerL', '7')
  const bath = await house.tankWithSchool()
  const number = await house.signedBath(bath, { contactMinutes: 30 })
  await house.freshWater(bath)
  await readingsNow(
    app,
    bath.tank.waterBodyId,
    { 'dissolved-oxygen': ['7.4', 'mg/L'] },
    '2026-12-01T18:19:00Z',
  )
  await putInForce(app, 'R01', 'oxygenFloorMgPerL', '8')
  return number
}
