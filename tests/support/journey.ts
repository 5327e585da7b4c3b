import path from 'node:path'
import type { Browser, Page } from 'playwright-core'
import { expect } from 'vitest'
import { password } from './api.ts'
import { expectAccessible } from './axe.ts'
import { newSession } from './chromium.ts'
import type { SessionOptions } from './chromium.ts'
import type { ServedApp } from './served-app.ts'

export const deskSize = { width: 1440, height: 900 }
export const phoneSize = { width: 390, height: 844 }

/**
 * The browser's own lines about answers that a journey means to get, by their status. The first question of every page
 * is who is signed in: 401 is always among them.
 */
export const refusals = (...statuses: number[]): RegExp[] =>
  [401, ...statuses].map((status) => new RegExp(`status of ${String(status)} `))

/** A session of its own, signed in already, at an address. */
export async function openSignedIn(
  browser: Browser,
  app: ServedApp,
  who: string,
  at: string,
  options: SessionOptions,
): Promise<Page> {
  const { page } = await newSession(browser, options)
  await enter(page, app, who)
  await page.goto(`${app.url}${at}`)
  return page
}

/** Signs the browser in without its form, which has journeys of its own: half of a short journey was spent on it. */
export async function enter(page: Page, app: ServedApp, name: string): Promise<void> {
  const email = `${name}@harrow-point.example`
  const reply = await page.request.post(`${app.url}/api/sign-in`, { data: { email, password } })
  expect(reply.status(), `sign-in of ${email}`).toBe(200)
}

/** Opens an address, signs in on the way as a person would, and is there when it returns. */
export async function signIn(page: Page, app: ServedApp, name: string, at: string): Promise<Page> {
  await page.goto(`${app.url}${at}`)
  await page.getByRole('textbox', { name: 'E-mail' }).fill(`${name}@harrow-point.example`)
  await page.getByRole('textbox', { name: 'Password' }).fill(password)
  await page.getByRole('button', { name: 'Sign in' }).click()
  const asked = at.replace(/\?.*/, '')
  await page.waitForURL((url) => url.pathname === asked)
  return page
}

/** A picture for whoever looks, into the folder that `PRATIQUE_PICTURES` names; none without it. */
export async function picture(page: Page, name: string): Promise<void> {
  const folder = process.env['PRATIQUE_PICTURES']
  const width = page.viewportSize()?.width ?? 0
  if (folder)
    await page.screenshot({ path: path.join(folder, `${name}-${String(width)}.png`), fullPage: true })
}

/** Accessible, nothing sticks out at the side, and a picture of it. */
export async function expectSound(page: Page, name: string): Promise<void> {
  await picture(page, name)
  // what stands at the foot of a phone lies over what can be scrolled clear of it; at the end of the page it lies over nothing
  await page.evaluate(() => {
    if (document.querySelector('.bench-bar')) scrollTo(0, document.documentElement.scrollHeight)
  })
  await expectAccessible(page, name)
  const [width, window] = await page.evaluate(() => [document.documentElement.scrollWidth, innerWidth])
  expect(width, `${name}: width`).toBeLessThanOrEqual(window ?? 0)
}

/** Types into a combobox and takes the first row that is offered. */
export async function choose(
  page: Page,
  name: string | RegExp,
  text: string,
  row: string | RegExp = text,
): Promise<void> {
  await page.getByRole('combobox', { name }).fill(text)
  await page.getByRole('option', { name: row }).first().click()
}
