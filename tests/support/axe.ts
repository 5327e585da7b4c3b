import { AxeBuilder } from '@axe-core/playwright'
import type { Page } from 'playwright-core'
import { expect } from 'vitest'

const tags = ['wcag2a', 'wcag2aa', 'wcag21a', 'wcag21aa', 'wcag22aa']

/**
 * Fails when axe finds a fault against WCAG 2.2 AA on the page as it stands, naming rule and element.
 *
 * @param within only this part of the page is judged: on a large page one run takes seconds
 */
export async function expectAccessible(page: Page, where: string, within?: string): Promise<void> {
  // No sheet has frames, so one run in the page itself judges all of it: without this each run opens a second page
  const axe = new AxeBuilder({ page })
    .setLegacyMode()
    .options({ resultTypes: ['violations'] })
    .withTags(tags)
  const { violations, passes } = await (within === undefined ? axe : axe.include(within)).analyze()
  const faults = violations.flatMap(({ id, help, nodes }) =>
    nodes.map((node) => `${id}: ${help}\n    ${node.target.join(' ')}\n    ${node.failureSummary ?? ''}`),
  )
  expect(faults, where).toEqual([])
  // a page that drew nothing has no faults either
  expect(passes.length, `${where}: rules that found something to judge`).toBeGreaterThan(
    within === undefined ? 8 : 2,
  )
}
