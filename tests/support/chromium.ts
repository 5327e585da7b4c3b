import { chromium } from 'playwright-core'
import type { Browser, BrowserContext, Page } from 'playwright-core'
import { expect, onTestFinished } from 'vitest'
import { findChromium } from '../../server/cli/chromium.mjs'
import { putOnTestDay } from './test-time.ts'

const launchArguments = [
  '--no-sandbox', // the tests may run as root
  '--disable-gpu',
  '--disable-dev-shm-usage',
  '--disable-background-networking',
  '--disable-component-update',
  '--disable-sync',
  '--no-first-run',
]

/** One browser per test file: launch in `beforeAll`, close in `afterAll`. */
export async function launchChromium(): Promise<Browser> {
  const executablePath = findChromium()
  if (!executablePath) throw new Error('No Chromium: set CHROMIUM, or let `npm test` install it')
  return chromium.launch({ executablePath, args: launchArguments })
}

export interface SessionOptions {
  width: number
  height: number
  theme?: 'light' | 'dark'
  /** How many days after the test day the page lives; set the clock of the server to it too. */
  daysLater?: number
  /** With the service worker that keeps the sheets of the tank on the device: for tests that go without a signal, since to fill it costs seconds. */
  keepsSheets?: boolean
  /** Console lines that this test provokes on purpose, such as the browser's own line about a 403. */
  expectedErrors?: readonly RegExp[]
}

export interface BrowserSession {
  context: BrowserContext
  page: Page
}

/**
 * A browser as one person would have it: own cookies, own storage. Call it inside a test or `beforeEach`; when
 * the test ends it is closed, and the test fails if the page wrote an error to the console, threw, or asked any
 * address off this machine.
 */
export async function newSession(browser: Browser, options: SessionOptions): Promise<BrowserSession> {
  const { width, height, theme = 'light', daysLater, keepsSheets = false, expectedErrors = [] } = options
  const context = await browser.newContext({
    viewport: { width, height },
    colorScheme: theme,
    hasTouch: width < 600,
    reducedMotion: 'reduce',
    serviceWorkers: keepsSheets ? 'allow' : 'block',
  })
  await putOnTestDay(context, daysLater)
  const troubles = watchForTroubles(context, expectedErrors)
  onTestFinished(async () => {
    await context.close()
    expect(troubles, 'errors in the browser').toEqual([])
  })
  return { context, page: await context.newPage() }
}

/** What goes wrong in the pages of a context, as it comes: one line each. */
export function watchForTroubles(
  context: BrowserContext,
  expectedErrors: readonly RegExp[] = [],
): readonly string[] {
  const troubles: string[] = []
  const note = (trouble: string) => {
    if (!expectedErrors.some((expected) => expected.test(trouble))) troubles.push(trouble)
  }
  context.on('console', (message) => {
    if (message.type() === 'error') note(`console: ${message.text()} (${message.location().url})`)
  })
  context.on('weberror', (failure) => note(`page: ${failure.error().stack ?? failure.error().message}`))
  context.on('request', (request) => {
    const { protocol, hostname } = new URL(request.url())
    const onThisMachine = ['127.0.0.1', 'localhost'].includes(hostname) || !protocol.startsWith('http')
    if (!onThisMachine) note(`request to another machine: ${request.url()}`)
  })
  return troubles
}
