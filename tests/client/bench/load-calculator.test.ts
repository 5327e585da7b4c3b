import { describe, expect, it } from 'vitest'
import { calculators } from '../../../shared/bench/calculators.ts'
import { say } from '../../../shared/bench/words.ts'
import { listedCalculators, loadCalculator } from '../../../src/features/bench/load-calculator.ts'

describe('the calculators in pieces', () => {
  it('are listed as they are described, in their order', () => {
    const described = calculators.map((of) => [
      of.id,
      of.group,
      of.weekly ?? false,
      say(of, 'name'),
      say(of, 'purpose'),
    ])
    expect(
      listedCalculators.map(({ id, group, weekly, words }) => [id, group, weekly, words.name, words.purpose]),
    ).toEqual(described)
  })

  it.each(calculators.map((of) => [of.id, of] as const))('%s loads by its address', async (id, of) => {
    const loaded = await loadCalculator(id)
    expect(loaded?.id).toBe(id)
    expect(Object.keys(loaded?.inputs ?? {})).toEqual(Object.keys(of.inputs))
  })

  it('are none at another address', async () => {
    expect(await loadCalculator('no-such-thing')).toBeUndefined()
    expect(await loadCalculator('constructor')).toBeUndefined()
  })
})
