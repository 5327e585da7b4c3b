import type { Browser } from 'playwright-core'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { pageCount, textOf } from '../pdf/support/poppler.ts'
import { launchChromium } from '../support/chromium.ts'
import { deskSize, openSignedIn, phoneSize } from '../support/journey.ts'
import { startServedApp } from '../support/served-app.ts'
import type { ServedApp } from '../support/served-app.ts'

let browser: Browser
let app: ServedApp

beforeAll(async () => {
  app = await startServedApp()
  await app.as('technician')
  browser = await launchChromium()
}, 180_000)
afterAll(async () => {
  await browser.close()
  await app.stop()
})

const flat = (text: string) => text.normalize('NFKC').replaceAll(/\s/g, '')

describe.each([deskSize, phoneSize])('the browser’s own print of a calculator, from $width px', (size) => {
  it.each(['tricaine-bath', 'salinity-change', 'un-ionised-ammonia', 'repeated-doses'])(
    'has all of %s and nothing to press',
    async (id) => {
      const page = await openSignedIn(browser, app, 'technician', `/bench/${id}`, size)
      // the theme is chosen in the application, not by the device
      await page.evaluate(() => (document.documentElement.dataset['theme'] = 'night'))
      await page.getByRole('button', { name: 'Fill in an example' }).click()
      await page.getByRole('table', { name: 'Working' }).waitFor()
      const shown = await page.evaluate(() => ({
        figure: document.querySelector('.bench-result [data-quantity]')?.textContent ?? '',
        cells: [...document.querySelectorAll('.bench-result :is(td, th, .caution)')].map(
          (each) => each.textContent ?? '',
        ),
        sources: [...document.querySelectorAll('.bench-sources li')].map((each) => each.textContent ?? ''),
      }))
      expect(shown.cells.length).toBeGreaterThan(3)
      for (const format of ['A4', 'Letter']) {
        const bytes = await page.pdf({ format, margin: { top: '15mm', bottom: '15mm' } })
        const text = flat(textOf(bytes))
        for (const part of [shown.figure, ...shown.cells, ...shown.sources])
          expect(text, `${format}: ${part}`).toContain(flat(part))
        for (const control of ['Pharmacy', 'Find', 'Fill in an example', 'Empty the fields', 'Print as PDF'])
          expect(text, format).not.toContain(flat(control))
        expect(pageCount(bytes)).toBeLessThanOrEqual(4)
      }
      await page.emulateMedia({ media: 'print' })
      const colours = await page.evaluate(() => {
        const brightness = (colour: string) =>
          Math.max(...(colour.match(/[\d.]+/g) ?? ['0']).slice(0, 3).map(Number))
        return [...document.querySelectorAll('.bench-sheet :is(p, td, h1, h2, input, label)')]
          .filter((each) => each.checkVisibility())
          .map((each) => brightness(getComputedStyle(each).color))
      })
      // ink: text that was light on a dark ground would be lost on white paper
      expect(Math.max(...colours)).toBeLessThan(170)
    },
  )
})
