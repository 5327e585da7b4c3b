import path from 'node:path'
import type { Page } from 'playwright-core'
import { expect } from 'vitest'
import { password } from './api.ts'
import { expectAccessible } from './axe.ts'
import type { ServedApp } from './served-app.ts'

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
