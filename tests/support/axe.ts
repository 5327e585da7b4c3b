import axe from 'axe-core'
import type { Page } from 'playwright-core'
import { expect } from 'vitest'

const tags = ['wcag2a', 'wcag2aa', 'wcag21a', 'wcag21aa', 'wcag22aa']

/**
 * Fails when axe finds a fault against WCAG 2.2 AA on the page as it stands, naming rule and element.
 *
 * @param within only this part of the page is judged: on a large page one run takes seconds
 */
export async function expectAccessible(page: Page, where: string, within?: string): Promise<void> {
  const { faults, judged } = await judge(page, within)
  expect(faults, where).toEqual([])
  // a page that drew nothing has no faults either
  expect(judged, `${where}: rules that found something to judge`).toBeGreaterThan(
    within === undefined ? 8 : 2,
  )
}

/**
 * Marks the elements whose contrast is to be judged: of those that are written alike upon the same grounds, the first
 * and the last. Contrast is three quarters of what axe does, and a list has hundreds of cells of one kind.
 */
function markEachKindOfText(): void {
  const kinds = new Map<string, Element[]>()
  const isOpaque = (colour: string) => /^rgb\(|^(ok)?(lch|lab)\((?!.*\/)|^color\((?!.*\/)/.test(colour)
  const groundsOf = (element: Element): string[] => {
    const { backgroundColor, backgroundImage, opacity, filter } = getComputedStyle(element)
    const own = `${backgroundColor} ${backgroundImage} ${opacity} ${filter}`
    const up = element.parentElement
    return up === null || (isOpaque(backgroundColor) && opacity === '1') ? [own] : [own, ...groundsOf(up)]
  }
  for (const element of document.body.querySelectorAll('*')) {
    element.removeAttribute('data-contrast')
    const holdsText =
      element.matches('input, select, textarea') ||
      [...element.childNodes].some((node) => node.nodeType === Node.TEXT_NODE && node.nodeValue?.trim())
    if (!holdsText || !element.checkVisibility({ visibilityProperty: true, opacityProperty: true })) continue
    const { color, fontSize, fontWeight, textShadow, position } = getComputedStyle(element)
    const { width, height } = element.getBoundingClientRect()
    const isAway =
      element.closest('[disabled], [aria-disabled="true"], [aria-hidden="true"], [inert]') !== null
    const kind = JSON.stringify([
      [element.tagName, color, fontSize, fontWeight, textShadow, position, isAway, width > 1 && height > 1],
      groundsOf(element),
    ])
    kinds.set(kind, [...(kinds.get(kind) ?? []), element])
  }
  for (const alike of kinds.values())
    for (const element of [alike.at(0), alike.at(-1)]) element?.setAttribute('data-contrast', '')
}

/** No sheet has frames: one run in the page itself judges all of it. */
export async function judge(page: Page, within?: string): Promise<{ faults: string[]; judged: number }> {
  // a page keeps it while it moves on by its links
  if (!(await page.evaluate(() => 'axe' in window))) {
    await page.evaluate(axe.source)
    await page.evaluate(() => {
      const { axe: checker } = window as unknown as { axe: typeof axe }
      checker.configure({ rules: [{ id: 'color-contrast', selector: '[data-contrast]' }] })
    })
  }
  await page.evaluate(markEachKindOfText)
  return page.evaluate(
    async ({ within, tags }) => {
      const { violations, passes } = await (window as unknown as { axe: typeof axe }).axe.run(
        within ?? document,
        { resultTypes: ['violations'], runOnly: { type: 'tag', values: tags } },
      )
      const faults = violations.flatMap(({ id, help, nodes }) =>
        nodes.map((node) => `${id}: ${help}\n    ${node.target.join(' ')}\n    ${node.failureSummary ?? ''}`),
      )
      return { faults, judged: passes.length }
    },
    { within, tags },
  )
}
