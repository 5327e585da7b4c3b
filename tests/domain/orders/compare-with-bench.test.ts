import { describe, expect, it } from 'vitest'
import { compareWithBench } from '../../../shared/domain/orders/compare-with-bench.ts'

const own = { value: 4.3628, unit: 'g', shown: { value: '4.36', unit: 'g' } } as const
const bench = (value: number, rounded: string, unit: 'g' | 'mg' | 'mL' = 'g') => ({ value, rounded, unit })

describe('a figure of the bench beside the amount of an order', () => {
  it('is the same before rounding or after it, in whichever unit', () => {
    expect(compareWithBench(bench(4.3628, '4.363'), own)).toBe('same')
    expect(compareWithBench(bench(4.362, '4.36'), own)).toBe('same')
    expect(compareWithBench(bench(4362.8, '4363', 'mg'), own)).toBe('same')
    expect(compareWithBench(bench(4360.2, '4360', 'mg'), own)).toBe('same')
  })

  it('differs by the last digit that the balance shows, and without a balance by any', () => {
    expect(compareWithBench(bench(4.3663, '4.37'), own)).toBe('differs')
    expect(compareWithBench(bench(4.362, '4.36'), { ...own, shown: null })).toBe('differs')
    expect(compareWithBench(bench(5.68, '5.68'), own)).toBe('differs')
  })

  it('is compared with nothing of another dimension', () => {
    expect(compareWithBench(bench(4.3628, '4.363', 'mL'), own)).toBeNull()
  })
})
