import { mkdirSync, mkdtempSync, rmSync, writeFileSync } from 'node:fs'
import os from 'node:os'
import path from 'node:path'
import { ensureChromium } from './chromium.mjs'
import { addressOf, everySheet } from './every-sheet.mjs'
import { startInstallation } from './installation.mjs'
import { enterProject, projectRoot } from './project.mjs'

/*
 * `npm run screens`: pictures of every sheet with the practice data, by day and in the night watch, on a desk and on a
 * phone, and a contact sheet of each kind to look at. Names after `--` are the only sheets taken.
 */

const sizes = [
  { width: 1440, height: 900, columns: 4 },
  { width: 390, height: 844, columns: 8 },
]
const themes = ['day', 'night']

enterProject()
const asked = process.argv.slice(2)
const sheets = everySheet.filter(({ name }) => asked.length === 0 || asked.includes(name))
const folder = path.join(projectRoot, '.data', 'screens')
mkdirSync(folder, { recursive: true })
const executablePath = await ensureChromium(console.log)
const { chromium } = await import('playwright-core')
const data = mkdtempSync(path.join(os.tmpdir(), 'pratique-screens-'))
const installation = await startInstallation(projectRoot, { PRATIQUE_DATA: data })
const browser = await chromium.launch({ executablePath, args: ['--no-sandbox', '--disable-gpu'] })
try {
  for (const theme of themes) for (const size of sizes) await takeAll(theme, size)
} finally {
  await browser.close()
  await installation.stop()
  rmSync(data, { recursive: true, force: true, maxRetries: 5 })
}

/** Pictures of all sheets in one theme and size, and their contact sheet. */
async function takeAll(theme, { width, height, columns }) {
  const people = new Map()
  const taken = []
  for (const sheet of sheets) {
    if (!people.has(sheet.as)) people.set(sheet.as, await signedIn(sheet.as, theme, { width, height }))
    const page = people.get(sheet.as)
    const get = async (address) => (await page.request.get(installation.url + address)).json()
    const address = await addressOf(sheet, get)
    if (address === null) {
      console.log(`${sheet.name}: nothing to show`)
      continue
    }
    await page.goto(installation.url + address)
    await page.getByRole('heading').first().waitFor()
    await page.waitForLoadState('networkidle')
    await page.locator('.skeleton').first().waitFor({ state: 'detached' })
    const file = `${sheet.name}-${width}-${theme}.png`
    await page.screenshot({ path: path.join(folder, file), fullPage: true })
    taken.push({ file, words: `${sheet.name} · ${sheet.as}` })
  }
  for (const page of people.values()) await page.context().close()
  await contactSheet(`contact-${width}-${theme}`, taken, columns)
}

async function signedIn(name, theme, viewport) {
  const context = await browser.newContext({
    viewport,
    hasTouch: viewport.width < 600,
    reducedMotion: 'reduce',
    // what keeps sheets on a device loads all of them, for nothing here
    serviceWorkers: 'block',
  })
  await context.addInitScript((choice) => localStorage.setItem('pratique.theme', choice), theme)
  const { emails, password } = installation.accounts()
  const email = emails.find((each) => each.startsWith(`${name}@`))
  const signIn = await context.request.post(`${installation.url}/api/sign-in`, { data: { email, password } })
  if (!signIn.ok()) throw new Error(`${name} cannot sign in: ${signIn.status()}`)
  return context.newPage()
}

/** All pictures small on one page, their tops as a person first sees them. */
async function contactSheet(name, taken, columns) {
  const cells = taken.map(
    ({ file, words }) => `<figure><img src="${file}"><figcaption>${words}</figcaption></figure>`,
  )
  const html = `<!doctype html><meta charset="utf-8"><title>${name}</title>
<style>body{font:12px sans-serif;margin:12px;display:grid;gap:12px;grid-template-columns:repeat(${columns},1fr)}
figure{margin:0}img{width:100%;max-height:420px;object-fit:cover;object-position:top;border:1px solid #999}</style>
${cells.join('\n')}\n`
  const file = path.join(folder, `${name}.html`)
  writeFileSync(file, html)
  const page = await browser.newPage({ viewport: { width: 1800, height: 1000 } })
  await page.goto(`file://${file}`)
  await page.screenshot({ path: path.join(folder, `${name}.png`), fullPage: true })
  await page.close()
  console.log(`${path.relative(projectRoot, file)}: ${taken.length} sheets`)
}
