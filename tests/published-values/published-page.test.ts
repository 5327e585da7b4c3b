import { describe, expect, it } from 'vitest'
import { calculators } from '../../shared/bench/calculators.ts'
import { groups } from './groups.ts'
import { offTheBench, publishedPage } from './published-page.ts'

const cases = Object.values(groups).flat()
const asked = new Set(cases.map((each) => each.calculator))

describe('the page of published values', () => {
  it('is docs/published-values.md, as it would be made now', async () => {
    await expect(publishedPage()).toMatchFileSnapshot('../../docs/published-values.md')
  })

  it(`shows all ${String(cases.length)} cases, none twice`, () => {
    const page = publishedPage()
    const off = new Set(offTheBench().map(({ id }) => id))
    for (const { id, calculator } of cases) {
      const claims = calculators.filter((of) => of.published?.includes(calculator)).length
      expect(claims + Number(off.has(id)), `${id} of ${calculator}`).toBeGreaterThanOrEqual(1)
      expect(page).toContain(`| ${id} |`)
    }
  })

  it('has no calculator that answers for a value which nobody published', () => {
    const unknown = calculators.flatMap((of) => (of.published ?? []).filter((name) => !asked.has(name)))
    expect(unknown).toEqual([])
  })
})
