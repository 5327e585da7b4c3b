import path from 'node:path'
import type { Browser, Page } from 'playwright-core'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { aCase } from '../builders/a-case.ts'
import type { BuiltCase } from '../builders/a-case.ts'
import { password } from '../support/api.ts'
import { expectAccessible } from '../support/axe.ts'
import { launchChromium, newSession } from '../support/chromium.ts'
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
  browser = await launchChromium()
}, 180_000)
afterAll(async () => {
  await browser.close()
  await app.stop()
})

const ago = (days: number) => new Date(app.clock.now().getTime() - days * dayMs).toISOString()
const desk = { width: 1440, height: 900 }
const phone = { width: 390, height: 844 }

/** Pictures for whoever looks, in the ignored folder; only when asked for. */
const picture = async (page: Page, name: string) => {
  const folder = process.env['PRATIQUE_PICTURES']
  if (folder) await page.screenshot({ path: path.join(folder, `${name}.png`), fullPage: true })
}

async function signedIn(role: string, size: typeof desk, to: string): Promise<Page> {
  const { page } = await newSession(browser, {
    ...size,
    expectedErrors: [/401 \(Unauthorized\)/, /403 \(Forbidden\)/, /409 \(Conflict\)/, /422 \(Unprocessable/],
  })
  await page.goto(`${app.url}${to}`)
  await page.getByRole('textbox', { name: 'E-mail' }).fill(`${role}@harrow-point.example`)
  await page.getByRole('textbox', { name: 'Password' }).fill(password)
  await page.getByRole('button', { name: 'Sign in' }).click()
  await page.waitForURL((url) => url.pathname === to)
  return page
}

/** Accessible, and nothing sticks out at the side. */
async function expectSound(page: Page, where: string): Promise<void> {
  await expectAccessible(page, where)
  const [width, wanted] = await page.evaluate(() => [document.documentElement.scrollWidth, window.innerWidth])
  expect(width, `${where}: width`).toBeLessThanOrEqual(wanted ?? 0)
}

describe.each([
  { size: desk, at: 0 },
  { size: phone, at: 1 },
])('quarantine at $size.width px', ({ size, at }) => {
  it('shows every case on one day ruler and as a table, and the day moves when something enters the water', async () => {
    const own = shown[at] as BuiltCase
    const page = await signedIn('veterinarian', size, '/quarantine')
    await page.getByRole('img', { name: /4.quarantine passages on one day ruler/ }).waitFor()
    await picture(page, `board-${String(size.width)}`)
    await expectSound(page, 'board')
    await page.getByRole('radio', { name: 'Table' }).click()
    const table = page.getByRole('table', { name: 'Quarantine' })
    await table.getByText('Held', { exact: true }).waitFor()
    await picture(page, `board-table-${String(size.width)}`)
    await expectSound(page, 'board as a table')
    await page.getByRole('radio', { name: /^Held/ }).click()
    await page.waitForURL(/view=held/)
    await page.getByRole('radio', { name: /^Running/ }).click()
    await table.getByRole('link', { name: own.number, exact: true }).click()

    await page.getByRole('heading', { name: 'Before clearance' }).waitFor()
    await picture(page, `case-${String(size.width)}`)
    await expectSound(page, 'case')
    await page.getByRole('button', { name: 'Report an event' }).click()
    const dialog = page.getByRole('dialog')
    await dialog.getByRole('combobox', { name: 'What happened' }).selectOption('Material or gear came in')
    await dialog.getByRole('radio', { name: 'Wet material' }).click()
    await dialog.getByRole('radio', { name: 'Into this water' }).click()
    await expectAccessible(page, 'form of an event')
    await picture(page, `report-${String(size.width)}`)
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
    await picture(page, `case-restarted-${String(size.width)}`)
  })
})
