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

/** No sheet has frames: one run in the page itself judges all of it. */
async function judge(page: Page, within: string | undefined): Promise<{ faults: string[]; judged: number }> {
  // a page keeps it while it moves on by its links
  if (!(await page.evaluate(() => 'axe' in window))) await page.evaluate(axe.source)
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
