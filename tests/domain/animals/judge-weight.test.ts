import { describe, expect, it } from 'vitest'
import { bandForStage, judgeWeight } from '../../../shared/domain/animals/judge-weight.ts'

// The band of the southern stingray (AnAge adult 74.6 kg read; band from memory): 10 to 100 kg
const stingray = { lowKg: 10, highKg: 100 }

const verdictOf = (kg: number, newest: number | null = null, band: typeof stingray | null = stingray) => {
  const judged = judgeWeight(kg, band, newest)
  if (!judged.ok) throw new Error(judged.refusal.code)
  return judged.value
}

describe('a weight, before it is believed', () => {
  it('passes inside the band, both ends included', () => {
    for (const kg of [10, 41.6, 100]) expect(verdictOf(kg)).toEqual({ verdict: 'plausible' })
  })

  it.each([
    [416, 'above-band'],
    [4.16, 'below-band'],
    [500, 'above-band'],
    [500.01, 'far-above-band'],
    [1000, 'far-above-band'],
    [2, 'below-band'],
    [1.99, 'far-below-band'],
  ])('asks %s kg back when no weight is known (%s)', (kg, doubt) => {
    expect(verdictOf(kg)).toEqual({ verdict: 'needs-confirmation', doubt })
  })

  it('asks a tenfold weight back, and a tenth, also where the band is wide enough to hold it', () => {
    const trout = { lowKg: 0.1, highKg: 12 }
    expect(verdictOf(11, 1.1, trout)).toEqual({ verdict: 'needs-confirmation', doubt: 'unlike-the-last' })
    expect(verdictOf(0.11, 1.1, trout)).toEqual({ verdict: 'needs-confirmation', doubt: 'unlike-the-last' })
    expect(verdictOf(416, 41.6)).toMatchObject({ doubt: 'unlike-the-last' })
    expect(verdictOf(4.3, 42.9)).toMatchObject({ doubt: 'unlike-the-last' })
    expect(verdictOf(5, 1, null)).toMatchObject({ verdict: 'needs-confirmation' })
    expect(verdictOf(4.99, 1, null)).toEqual({ verdict: 'plausible' })
  })

  it('keeps a weight outside the band unasked when it is like the one before, and marks it', () => {
    expect(verdictOf(104, 101)).toEqual({ verdict: 'unusual', doubt: 'above-band' })
    expect(verdictOf(9, 13.5)).toEqual({ verdict: 'unusual', doubt: 'below-band' })
    expect(verdictOf(9, 13.6)).toEqual({ verdict: 'needs-confirmation', doubt: 'below-band' })
  })

  it('has nothing to say where neither a band nor a weight is known', () => {
    expect(verdictOf(80, null, null)).toEqual({ verdict: 'plausible' })
  })

  it('refuses what no animal weighs', () => {
    for (const kg of [0, -1])
      expect(judgeWeight(kg, stingray, null)).toMatchObject({ refusal: { code: 'not-above-zero' } })
    for (const kg of [Number.NaN, Number.POSITIVE_INFINITY])
      expect(judgeWeight(kg, stingray, null)).toMatchObject({ refusal: { code: 'not-finite' } })
  })
})

describe('the band of a stage', () => {
  const bands = [
    { stage: null, lowKg: 70, highKg: 180 },
    { stage: 'juvenile', lowKg: 0.02, highKg: 20 },
  ] as const

  it('is its own where there is one, else the grown one; the young without one may weigh less', () => {
    expect(bandForStage(bands, 'juvenile')).toEqual({ lowKg: 0.02, highKg: 20 })
    expect(bandForStage(bands, 'adult')).toEqual({ lowKg: 70, highKg: 180 })
    expect(bandForStage(bands, 'unknown')).toEqual({ lowKg: 70, highKg: 180 })
    expect(bandForStage(bands, 'fry')).toEqual({ lowKg: 0, highKg: 180 })
    expect(bandForStage([], 'adult')).toBeNull()
  })
})
