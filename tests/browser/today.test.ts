import path from 'node:path'
import type { Browser, Page } from 'playwright-core'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { anObservation } from '../builders/an-observation.ts'
import { password } from '../support/api.ts'
import { expectAccessible } from '../support/axe.ts'
import { launchChromium, newSession } from '../support/chromium.ts'
import { startServedApp } from '../support/served-app.ts'
import type { ServedApp } from '../support/served-app.ts'

let browser: Browser
let app: ServedApp
beforeAll(async () => {
  app = await startServedApp({ demo: true })
  browser = await launchChromium()
}, 300_000)
afterAll(async () => {
  await browser.close()
  await app.stop()
})

/** Pictures for whoever looks, in the ignored folder; only when asked for. */
const picture = async (page: Page, name: string) => {
  const folder = process.env['PRATIQUE_PICTURES']
  if (folder) await page.screenshot({ path: path.join(folder, `${name}.png`), fullPage: true })
}

const desk = { width: 1440, height: 900 }
const phone = { width: 390, height: 844 }

/** Signed in and on Today. */
async function todayOf(who: string, size: typeof desk): Promise<Page> {
  const { page, context } = await newSession(browser, size)
  const reply = await context.request.post(`${app.url}/api/sign-in`, {
    data: { email: `${who}@harrow-point.example`, password },
    headers: { origin: app.url },
  })
  expect(reply.status()).toBe(200)
  await page.goto(app.url)
  await page.getByRole('heading', { level: 1, name: 'Today' }).waitFor()
  await page.locator('.today-bands, .list-empty').first().waitFor()
  return page
}

/** What each of the practice accounts finds, at least: lanes and a piece of work of theirs. */
const accounts = [
  { who: 'vet', lanes: ['To sign and decide', 'Doses and samples'], work: /^Draft TO-/ },
  { who: 'vet2', lanes: ['To sign and decide'], work: /^You have no valid licence/ },
  { who: 'tech', lanes: ['Doses and samples'], work: / bath, / },
  { who: 'tech2', lanes: ['Doses and samples'], work: /^Confirm the volume/ },
  { who: 'keeper', lanes: ['Doses and samples'], work: /was not carried out/ },
  { who: 'registrar', lanes: ['Register'], work: /^Explain, / },
  { who: 'admin', lanes: ['People and settings'], work: /has no valid licence$/ },
]

describe.each([desk, phone])('Today at $width px', (size) => {
  it.each(accounts)('shows $who what is theirs', async ({ who, lanes, work }) => {
    const page = await todayOf(who, size)
    for (const lane of lanes) await page.getByRole('list', { name: lane }).first().waitFor()
    await page.getByRole('link', { name: work }).first().waitFor()
    await page.getByText(/waits? for you/).waitFor()
    await expectAccessible(page, `Today of ${who}`)
    const width = await page.evaluate(() => document.documentElement.scrollWidth)
    expect(width, `${who}: width`).toBeLessThanOrEqual(size.width)
    await picture(page, `today-${who}-${String(size.width)}`)
  })
})

it('keeps the lane that somebody chose, also on the hour ruler', async () => {
  const page = await todayOf('vet', desk)
  const ruler = page.getByRole('navigation', { name: 'Due today' })
  await ruler.waitFor()
  await page.getByRole('radio', { name: 'Technician' }).click()
  await ruler
    .getByRole('link', { name: / bath, / })
    .first()
    .waitFor({ state: 'attached' })
  await page.reload()
  await page.getByRole('radio', { name: 'Technician', checked: true }).waitFor()
  const heads = await page.locator('.today-lane-heads p').allTextContents()
  expect(heads[0]).toBe('Doses and samples')
  await page.getByRole('radio', { name: 'Veterinarian' }).click()
  await page.getByRole('radio', { name: 'Veterinarian', checked: true }).waitFor()
})

it('an urgent call stands over everything until somebody says that they see to it', async () => {
  const keeper = await todayOf('keeper', phone)
  const noticeId = app.nextId()
  const sent = await keeper.request.post(`${app.url}/api/observations`, {
    data: anObservation(app, 'QT-1', {
      noticeId,
      urgent: true,
      words: 'Two lie on the floor.',
      happenedAt: app.clock.now().toISOString(),
    }),
    headers: { origin: app.url },
  })
  expect(sent.status()).toBe(201)
  const vet = await todayOf('vet', phone)
  const call = vet.getByRole('article').filter({ hasText: 'Two lie on the floor.' })
  await call.getByText(/Nobody has answered yet|NOT SENT/).waitFor()
  await expectAccessible(vet, 'Today with an urgent call')
  await picture(vet, 'today-urgent-390')
  await call.getByRole('button', { name: 'I have seen it and see to it' }).click()
  await call.waitFor({ state: 'detached' })
  await keeper.reload()
  await keeper.locator('.today-bands').waitFor()
  expect(
    await keeper.getByText('Two lie on the floor.').and(keeper.locator('.today-call-words')).count(),
  ).toBe(0)
})

it('a note for the next watch is left, read by name, and known to have been read', async () => {
  const words = 'UV on QS-2 off before three.'
  const keeper = await todayOf('keeper', desk)
  await keeper.getByRole('textbox', { name: 'Note for the next watch' }).fill(words)
  await keeper.getByRole('button', { name: 'Leave the note' }).click()
  const note = keeper.getByRole('article').filter({ hasText: words })
  await note.getByText('Nobody has said yet that they have read it.').waitFor()
  const tech = await todayOf('tech', phone)
  const read = tech.getByRole('article').filter({ hasText: words })
  await expectAccessible(tech, 'Today with a handover note')
  await picture(tech, 'today-handover-390')
  await read.getByRole('button', { name: 'I have read it' }).click()
  await read.waitFor({ state: 'detached' })
  await keeper.reload()
  await note.getByText(/Read by Soren Brandt \d\d:\d\d/).waitFor()
  await picture(keeper, 'today-handover-1440')
})

it('a hold is lifted from here, with a reason', async () => {
  const page = await todayOf('vet', desk)
  const held = page.getByRole('listitem').filter({ has: page.getByRole('link', { name: /^TO-\d+ is held/ }) })
  await held.getByRole('button', { name: 'Lift the hold' }).click()
  await page.getByRole('textbox', { name: 'Why it may go on' }).fill('Breathes normally again')
  await page.getByRole('dialog').getByRole('button', { name: 'Lift the hold' }).click()
  await page.getByText(/^Hold of TO-\d+ lifted$/).waitFor()
  await held.waitFor({ state: 'detached' })
})

it('is worked with the keyboard alone, and finds anything from anywhere', async () => {
  const page = await todayOf('keeper', desk)
  await page.keyboard.press('Control+k')
  await page.getByRole('searchbox').waitFor()
  await page.keyboard.type('QT-2')
  await page
    .getByRole('link', { name: /^QT-2 / })
    .first()
    .waitFor()
  await expectAccessible(page, 'Find', 'dialog')
  await picture(page, 'find-1440')
  await page.keyboard.press('ArrowDown')
  for (let i = 0; i < 12; i++) {
    const name = await page.evaluate(() => document.activeElement?.textContent ?? '')
    if (name.startsWith('QT-2 ')) break
    await page.keyboard.press('ArrowDown')
  }
  await page.keyboard.press('Enter')
  await page.waitForURL(/\/enclosures\/QT-2$/)
  await page.getByRole('heading', { level: 1 }).waitFor()
  await page.keyboard.press('g')
  await page.keyboard.press('1')
  await page.getByRole('heading', { level: 1, name: 'Today' }).waitFor()
  // the first piece of work is reached by Tab and opened by Enter
  const first = page.locator('.today-title').first()
  const href = await first.getAttribute('href')
  for (let i = 0; i < 40; i++) {
    await page.keyboard.press('Tab')
    if (await first.evaluate((link) => link === document.activeElement)) break
  }
  await page.keyboard.press('Enter')
  await page.waitForURL(`**${href ?? ''}`)
})
