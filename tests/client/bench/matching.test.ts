import { describe, expect, it } from 'vitest'
import { matchingCalculators } from '../../../src/features/bench/calculator-list.tsx'

const found = (q: string) => matchingCalculators(q).map(({ id }) => id)

describe('looking for a calculator', () => {
  it('finds it by its name, by what it is for, and by what else people call it', () => {
    expect(found('wash')).toContain('wash-out')
    expect(found('formalin')).toContain('bath-dose')
    expect(found('chlorine')).toEqual(expect.arrayContaining(['dechlorination', 'bleach-solution']))
    expect(found('biomass')).toEqual(['group-biomass'])
    expect(found('ppm')).toEqual(expect.arrayContaining(['bath-dose', 'unit-conversion']))
  })
  it('goes by how words begin, and by all of those typed', () => {
    expect(found('ash')).toEqual([])
    expect(found('bath dose')).toContain('bath-dose')
    expect(found('formalin feed')).toEqual([])
    expect(found('').length).toBeGreaterThan(30)
  })
})
