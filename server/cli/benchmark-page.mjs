import { gzipSync } from 'node:zlib'
import { findChromium } from './chromium.mjs'

/**
 * What a browser with an empty cache fetches for the first screen, and how long until it shows.
 *
 * @param {string} url
 * @returns {Promise<{ ms: number, scriptBytes: number, styleBytes: number, fontBytes: number }>} scripts and styles gzipped
 */
export async function measureFirstScreen(url) {
  const { chromium } = await import('playwright-core')
  const browser = await chromium.launch({
    executablePath: findChromium(),
    args: ['--no-sandbox', '--disable-gpu'],
  })
  try {
    const page = await (await browser.newContext()).newPage()
    const bytes = { script: 0, stylesheet: 0, font: 0 }
    const reading = []
    page.on('response', (response) => {
      const kind = response.request().resourceType()
      if (!(kind in bytes)) return
      reading.push(
        response.body().then((body) => {
          bytes[kind] += kind === 'font' ? body.length : gzipSync(body).length // fonts are compressed in themselves
        }),
      )
    })
    const begun = performance.now()
    await page.goto(url)
    await page.getByRole('textbox').first().waitFor()
    const ms = performance.now() - begun
    await page.waitForLoadState('networkidle')
    await Promise.all(reading)
    return { ms, scriptBytes: bytes.script, styleBytes: bytes.stylesheet, fontBytes: bytes.font }
  } finally {
    await browser.close()
  }
}
