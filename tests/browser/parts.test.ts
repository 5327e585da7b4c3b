import { readdir, readFile, rm } from 'node:fs/promises'
import path from 'node:path'
import { gzipSync } from 'node:zlib'
import type { Browser } from 'playwright-core'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { expectAccessible } from '../support/axe.ts'
import { launchChromium, newSession } from '../support/chromium.ts'
import { buildWithParts } from '../support/parts-build.ts'
import { startServedApp } from '../support/served-app.ts'
import type { ServedApp } from '../support/served-app.ts'

const root = path.resolve(import.meta.dirname, '../..')
let browser: Browser
let withParts: ServedApp
let app: ServedApp
let folder: string

beforeAll(async () => {
  folder = await buildWithParts()
  withParts = await startServedApp({ pagesFolder: folder })
  app = await startServedApp()
  browser = await launchChromium()
}, 240_000)

afterAll(async () => {
  await browser.close()
  await withParts.stop()
  await app.stop()
  await rm(folder, { recursive: true, force: true })
})

const signedOut = { expectedErrors: [/401 \(Unauthorized\)/] }

describe.each([
  { width: 1440, height: 900 },
  { width: 390, height: 844 },
])('the page of parts at $width px', (size) => {
  it('has no fault that axe knows, in both themes at once', async () => {
    const { page } = await newSession(browser, { ...size, ...signedOut })
    await page.goto(`${withParts.url}/parts`)
    await page.getByRole('heading', { name: 'Parts, night watch' }).waitFor()
    await page.waitForTimeout(400)
    await expectAccessible(page, `parts at ${size.width} px`)
  }, 180_000)

  it('shows a whole sheet without a fault, within the width of the screen', async () => {
    const { page } = await newSession(browser, { ...size, ...signedOut })
    await page.goto(`${withParts.url}/parts/sheet`)
    await page.getByRole('heading', { name: 'Passages' }).waitFor()
    await expectAccessible(page, `a sheet at ${size.width} px`)
    expect(await page.evaluate(() => document.documentElement.scrollWidth)).toBeLessThanOrEqual(size.width)
  })

  it('stays within the width of the screen', async () => {
    const { page } = await newSession(browser, { ...size, ...signedOut })
    await page.goto(`${withParts.url}/parts`)
    await page.getByRole('heading', { name: 'Parts, night watch' }).waitFor()
    expect(await page.evaluate(() => document.documentElement.scrollWidth)).toBeLessThanOrEqual(size.width)
  })
})

describe('what opens over the parts', () => {
  it('is accessible while it is open: list, dialog, drawer, tip', async () => {
    const { page } = await newSession(browser, { width: 1440, height: 900, ...signedOut })
    await page.goto(`${withParts.url}/parts`)
    await page.getByRole('combobox', { name: 'Enclosure' }).first().click()
    await page.getByRole('option', { name: /QT-5/ }).waitFor()
    await expectAccessible(page, 'open list', '.combobox-anchor')
    await page.keyboard.press('Escape')

    await page.getByRole('button', { name: 'Open the dialog' }).first().click()
    await page.getByRole('dialog', { name: 'Stop order TO-0728?' }).waitFor()
    await expectAccessible(page, 'open dialog', 'dialog')
    await page.keyboard.press('Escape')
    expect(await page.getByRole('dialog').count()).toBe(0)

    await page.getByRole('button', { name: 'Open the log as a drawer' }).first().click()
    await page.getByRole('dialog', { name: 'Ship’s log' }).waitFor()
    await expectAccessible(page, 'open drawer', 'dialog')
    await page.keyboard.press('Escape')
    expect(await page.getByRole('dialog').count()).toBe(0)

    await page.getByRole('navigation', { name: 'Due today' }).first().getByRole('link').first().focus()
    await expectAccessible(page, 'focused tick', '.hour-ruler')
  })

  it('never throws typed words away without asking, however often Esc is pressed', async () => {
    const { page } = await newSession(browser, { width: 1440, height: 900, ...signedOut })
    await page.goto(`${withParts.url}/parts`)
    await page.getByRole('button', { name: 'Open the dialog' }).first().click()
    const dialog = page.getByRole('dialog', { name: 'Stop order TO-0728?' })
    await dialog.getByRole('textbox').fill('stock')
    for (const _ of [1, 2, 3]) await page.keyboard.press('Escape')
    expect(await dialog.isVisible()).toBe(true)
    expect(await dialog.getByRole('textbox').inputValue()).toBe('stock')
  })
})

describe('a number field in a real browser', () => {
  it('does not change with the wheel', async () => {
    const { page } = await newSession(browser, { width: 1440, height: 900, ...signedOut })
    await page.goto(`${withParts.url}/parts`)
    const depth = page.getByRole('textbox', { name: 'Depth of water' }).first()
    await depth.click()
    await page.mouse.wheel(0, 400)
    await page.waitForTimeout(100)
    expect(await depth.inputValue()).toBe('0.68')
  })

  it('asks what a changed unit means before anything changes', async () => {
    const { page } = await newSession(browser, { width: 1440, height: 900, ...signedOut })
    await page.goto(`${withParts.url}/parts`)
    await page.getByRole('combobox', { name: 'Unit of Target, free copper' }).first().selectOption('g/L')
    await page.getByRole('button', { name: 'Convert to 0.00015 g/L' }).click()
    expect(await page.getByRole('textbox', { name: 'Target, free copper' }).first().inputValue()).toBe(
      '0.00015',
    )
  })
})

describe('the ordinary bundle', () => {
  it('has no page of parts', async () => {
    const { page } = await newSession(browser, { width: 1440, height: 900, ...signedOut })
    await page.goto(`${app.url}/parts`)
    await page.waitForURL(/\/sign-in/)
    const scripts = await readdir(path.join(root, 'dist/client/assets'))
    for (const script of scripts.filter((name) => name.endsWith('.js'))) {
      const text = await readFile(path.join(root, 'dist/client/assets', script), 'utf8')
      expect(text.includes('Parts, night watch'), script).toBe(false)
    }
  })

  it('loads at most 150 kB of script, packed, for the first screen', async () => {
    const { page } = await newSession(browser, { width: 1440, height: 900, ...signedOut })
    const scripts = new Set<string>()
    page.on('response', (response) => {
      if (response.request().resourceType() === 'script') scripts.add(new URL(response.url()).pathname)
    })
    await page.goto(`${app.url}/`)
    await page.getByRole('button', { name: 'Sign in' }).waitFor()
    await page.waitForLoadState('networkidle')
    let packed = 0
    for (const script of scripts)
      packed += gzipSync(await readFile(path.join(root, 'dist/client', script))).length
    expect(scripts.size).toBeGreaterThan(1)
    expect(packed).toBeLessThan(150_000)
  })

  it('loads at most 185 kB of script, packed, for Today of somebody signed in, whatever their roles', async () => {
    const client = path.join(root, 'dist/client')
    const text = await readFile(path.join(client, '.vite/manifest.json'), 'utf8')
    const manifest = JSON.parse(text) as Record<string, { file: string; imports?: string[] }>
    const files = new Set<string>()
    const take = (key: string): void => {
      const chunk = manifest[key]
      if (!chunk) throw new Error(`${key} is not in the build`)
      if (files.has(chunk.file)) return
      files.add(chunk.file)
      chunk.imports?.forEach(take)
    }
    for (const key of ['index.html', 'src/app/shell/frame.tsx', 'src/app/routes/today.tsx']) take(key)
    let packed = 0
    for (const file of files) packed += gzipSync(await readFile(path.join(client, file))).length
    expect(packed).toBeLessThan(185_000)
  })
})
