import { mkdtempSync, rmSync, symlinkSync, writeFileSync } from 'node:fs'
import { createServer } from 'node:http'
import type { Server } from 'node:http'
import os from 'node:os'
import path from 'node:path'
import type { Browser } from 'playwright-core'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { launchChromium, newSession, watchForTroubles } from '../support/chromium.ts'
import { judge } from '../support/axe.ts'
import { projectRoot } from '../support/project-files.ts'
import { runCommand } from '../../server/cli/run-command.mjs'

// A browser test is worth what it notices: these pages go wrong on purpose.

const scripts: Record<string, string> = {
  '/sound':
    'document.title = innerWidth + (matchMedia("(prefers-color-scheme: dark)").matches ? " dark" : " light")',
  '/says': 'console.warn("a warning"); console.error("wrong figure")',
  '/throws': 'setTimeout(() => { throw new Error("not a number") })',
  '/rejects': 'Promise.reject(new Error("no answer"))',
  '/refused': 'fetch("/forbidden")',
  '/elsewhere': 'fetch("http://elsewhere.invalid/figures").catch(() => {})',
}

const row = (style: string, words: string) => `<li style="${style}">${words}</li>`
scripts['/faint'] =
  `document.documentElement.lang = 'en'; onload = () => document.body.innerHTML = ${JSON.stringify(
    `<main><h1>Contrast</h1><ul>${row('', 'ink').repeat(40)}${row('color: #bbb', 'faint')}${row('', 'ink').repeat(40)}
   <li style="background: #333"><span>ink on a dark ground</span></li></ul></main>`,
  )}`

let browser: Browser
let server: Server
let address = ''

beforeAll(async () => {
  server = createServer((request, response) => {
    const script = scripts[request.url ?? '']
    response.writeHead(script ? 200 : request.url === '/favicon.ico' ? 204 : 403, {
      'Content-Type': 'text/html',
    })
    response.end(script ? `<!doctype html><title>page</title><script>${script}</script>` : '')
  })
  await new Promise<void>((resolve) => server.listen(0, '127.0.0.1', resolve))
  const at = server.address()
  address = `http://127.0.0.1:${typeof at === 'object' && at ? at.port : 0}`
  browser = await launchChromium()
})

afterAll(async () => {
  await browser.close()
  server.close()
})

async function troublesOf(page: string, expected: RegExp[] = []): Promise<readonly string[]> {
  const context = await browser.newContext()
  const troubles = watchForTroubles(context, expected)
  const opened = await context.newPage()
  await opened.goto(address + page)
  await opened.waitForLoadState('networkidle')
  await context.close()
  return troubles
}

describe('a browser session', () => {
  it('has the width and the theme that were asked for, and storage of its own', async () => {
    const phone = await newSession(browser, { width: 390, height: 844, theme: 'dark' })
    await phone.page.goto(`${address}/sound`)
    expect(await phone.page.title()).toBe('390 dark')
    await phone.page.evaluate(() => localStorage.setItem('who', 'one'))
    const desk = await newSession(browser, { width: 1440, height: 900 })
    await desk.page.goto(`${address}/sound`)
    expect(await desk.page.title()).toBe('1440 light')
    expect(await desk.page.evaluate(() => localStorage.getItem('who'))).toBe(null)
  })

  it.each([
    ['/says', /^console: wrong figure/],
    ['/throws', /^page: Error: not a number/],
    ['/rejects', /^page: Error: no answer/],
    ['/refused', /^console: .*403/],
    ['/elsewhere', /^request to another machine: http:\/\/elsewhere\.invalid\/figures/],
  ])('notices what goes wrong on %s', async (page, expected) => {
    const troubles = await troublesOf(page)
    expect(troubles.some((trouble) => expected.test(trouble))).toBe(true)
  })

  it('takes no offence at a sound page, nor at what the test expects', async () => {
    expect(await troublesOf('/sound')).toEqual([])
    expect(await troublesOf('/refused', [/403/])).toEqual([])
  })

  it('fails the test in which it happened', async () => {
    const folder = mkdtempSync(path.join(os.tmpdir(), 'pratique-session-'))
    try {
      symlinkSync(path.join(projectRoot, 'node_modules'), path.join(folder, 'node_modules'))
      writeFileSync(
        path.join(folder, 'one.test.ts'),
        `import { afterAll, it } from 'vitest'
         import { launchChromium, newSession } from ${JSON.stringify(path.join(projectRoot, 'tests/support/chromium.ts'))}
         const browser = await launchChromium()
         afterAll(() => browser.close())
         it('one', async () => {
           const { page } = await newSession(browser, { width: 800, height: 600 })
           await page.goto('${address}/says')
         }, 30_000)`,
      )
      const program = path.join(projectRoot, 'node_modules/vitest/vitest.mjs')
      const { VITEST: _, VITEST_POOL_ID: _pool, VITEST_WORKER_ID: _worker, ...env } = process.env
      const { code, output } = await runCommand(process.execPath, [program, 'run', '--root', folder], {
        cwd: folder,
        env,
      })
      expect(output).toContain('wrong figure')
      expect(code).toBe(1)
    } finally {
      rmSync(folder, { recursive: true, force: true })
    }
  })
})

describe('the accessibility checker', () => {
  it('finds the one faint row of a list, and ink upon another ground', async () => {
    const { page } = await newSession(browser, { width: 390, height: 844 })
    await page.goto(`${address}/faint`)
    const { faults } = await judge(page, 'main')
    expect(faults.map((fault) => fault.split('\n')[1])).toEqual([
      expect.stringContaining('li'),
      expect.stringContaining('span'),
    ])
    expect(faults[0]).toContain('nth-child(41)')
    expect(faults.join()).toContain('color-contrast')
  })
})
