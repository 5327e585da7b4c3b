import { rm } from 'node:fs/promises'
import type { Browser, Page } from 'playwright-core'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { addressOf, everySheet } from '../../server/cli/every-sheet.mjs'
import { findUnsafeWriting } from '../../shared/domain/quantities/find-unsafe-writing.ts'
import type { Writing } from '../../shared/domain/quantities/find-unsafe-writing.ts'
import { expectAccessible } from '../support/axe.ts'
import { launchChromium, newSession } from '../support/chromium.ts'
import { routesOfTheClient } from '../support/client-routes.ts'
import { enter } from '../support/journey.ts'
import { buildWithParts } from '../support/parts-build.ts'
import { startServedApp } from '../support/served-app.ts'
import type { ServedApp } from '../support/served-app.ts'

let browser: Browser
let app: ServedApp
let pagesFolder: string
beforeAll(async () => {
  pagesFolder = await buildWithParts()
  app = await startServedApp({ demo: true, pagesFolder })
  browser = await launchChromium()
}, 240_000)
afterAll(async () => {
  await browser.close()
  await app.stop()
  await rm(pagesFolder, { recursive: true, force: true })
})

/** Everything that a person reads on the page, each quantity as what it is marked, and the whole as prose. */
async function unsafeWritingOn(page: Page): Promise<string[]> {
  const read = await page.evaluate(() => ({
    quantities: [...document.querySelectorAll<HTMLElement>('[data-quantity]')].map((each) => ({
      kind: each.dataset['quantity'] ?? '',
      text: each.textContent,
    })),
    prose: document.body.innerText,
  }))
  const found = (text: string, writing: Writing) =>
    findUnsafeWriting(text, writing).map(
      (each) =>
        `${writing} ${each.code}: "${each.found}" in "${text.slice(Math.max(0, each.at - 40), each.at + 40)}"`,
    )
  return [
    ...read.quantities.flatMap(({ kind, text }) => found(text, kind as Writing)),
    // the number of a publication is no quantity
    ...found(read.prose.replace(/\b10\.\d{4,9}\/\S+/g, 'doi'), 'prose'),
  ]
}

// the first question of a page is who is signed in, and one sheet looks up a print that nobody made; the page of an address that leads nowhere is one of the sheets
const expectedErrors = [/401 \(Unauthorized\)/, /404 \(Not Found\) \(.*\/api\/checks\//]
const desk = { width: 1440, height: 900 }
const hand = { width: 390, height: 844 }

describe('the list of sheets', () => {
  it('has every address of the client', () => {
    const listed = new Set<string>(everySheet.map((sheet) => sheet.address.replace(/\?.*/, '')))
    const missing = routesOfTheClient().filter((route) => !listed.has(route))
    expect(missing).toEqual([])
  })
})

const people = [...new Set(everySheet.map((sheet) => sheet.as))]

/** Waits until nothing was asked of the server for a quarter of a second. Made before the page first opens anything. */
function restOf(page: Page): () => Promise<void> {
  let open = 0
  let changedMs = performance.now()
  const count = (step: number) => () => {
    open += step
    changedMs = performance.now()
  }
  page.on('request', count(1))
  page.on('requestfinished', count(-1))
  page.on('requestfailed', count(-1))
  return async () => {
    changedMs = performance.now()
    while (open > 0 || performance.now() - changedMs < 250) await page.waitForTimeout(50)
  }
}

/**
 * Opens one sheet after another and waits until it has come to rest; null when the practice data has nothing to show on
 * it. The first is loaded, and from there the page moves on as with its own links, which takes a third of the time.
 */
function opener(page: Page): (sheet: (typeof everySheet)[number]) => Promise<string | null> {
  const rest = restOf(page)
  const get = async (address: string) => (await page.request.get(app.url + address)).json()
  return async (sheet) => {
    const address = await addressOf(sheet, get)
    if (address === null) return null
    if (page.url() === 'about:blank') await page.goto(app.url + address)
    else
      await page.evaluate((to) => {
        history.pushState(null, '', to)
        dispatchEvent(new PopStateEvent('popstate', { state: null }))
      }, address)
    await rest()
    await page.getByRole('heading').first().waitFor()
    await page.locator('.skeleton').first().waitFor({ state: 'detached' })
    // some addresses lead on to the first sheet below them, none to the door
    expect.soft(page.url(), sheet.name).toContain(app.url + address)
    return address
  }
}

async function expectNarrowerThan(width: number, page: Page, sheet: string): Promise<void> {
  const taken = await page.evaluate(() => document.documentElement.scrollWidth)
  expect.soft(taken, `${sheet} at ${String(width)} px`).toBeLessThanOrEqual(width)
}

/** How wide the page is with every word from right to left, in place: a page has the same words either way. */
async function widthFromRightToLeft(page: Page): Promise<number> {
  return page.evaluate(() => {
    const walker = document.createTreeWalker(document.body, NodeFilter.SHOW_TEXT)
    const before = new Map<Node, string | null>()
    while (walker.nextNode()) before.set(walker.currentNode, walker.currentNode.nodeValue)
    for (const [node, words] of before) node.nodeValue = `\u202e${words ?? ''}\u202c`
    const width = document.documentElement.scrollWidth
    for (const [node, words] of before) node.nodeValue = words
    return width
  })
}

describe('every sheet with the practice data, in the hand and at the desk', () => {
  it.each(people)(
    'of %s has no fault, nothing unsafe to read, nothing wider than the window',
    async (name) => {
      const { page } = await newSession(browser, { ...hand, expectedErrors })
      await enter(page, app, name)
      const open = opener(page)
      for (const sheet of everySheet.filter((each) => each.as === name)) {
        await page.setViewportSize(hand)
        const address = await open(sheet)
        expect.soft(address, `${sheet.name} has something to show`).not.toBeNull()
        if (address === null) continue
        await expectNarrowerThan(hand.width, page, sheet.name)
        expect.soft(await unsafeWritingOn(page), `${sheet.name} in the hand`).toEqual([])
        await page.setViewportSize(desk)
        await expectNarrowerThan(desk.width, page, sheet.name)
        expect.soft(await unsafeWritingOn(page), `${sheet.name} at the desk`).toEqual([])
        // the journeys of each feature judge their sheets in the hand
        await expectAccessible(page, sheet.name)
      }
    },
    300_000,
  )
})

describe('every sheet in longer words, and from right to left', () => {
  it.each(people)(
    'of %s is no wider than a phone',
    async (name) => {
      const { page, context } = await newSession(browser, { ...hand, expectedErrors })
      await context.addInitScript(() => localStorage.setItem('pratique.words', 'pseudo'))
      await enter(page, app, name)
      const open = opener(page)
      for (const sheet of everySheet.filter((each) => each.as === name)) {
        if ((await open(sheet)) === null) continue
        expect.soft(await page.locator('main').innerText(), sheet.name).toMatch(/\[.*[áéíóúñç]/)
        await expectNarrowerThan(hand.width, page, sheet.name)
        expect
          .soft(await widthFromRightToLeft(page), `${sheet.name} from right to left`)
          .toBeLessThanOrEqual(hand.width)
      }
    },
    300_000,
  )
})
