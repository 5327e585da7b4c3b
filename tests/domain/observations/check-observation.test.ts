import { describe, expect, it } from 'vitest'
import { checkObservation, isSomethingSaid } from '../../../shared/domain/observations/check-observation.ts'
import { allWell, nothingSaid } from '../../../shared/domain/observations/observation.ts'
import type { ObservationSaid } from '../../../shared/domain/observations/observation.ts'

const refusal = (said: Partial<ObservationSaid>, named = 0) => {
  const checked = checkObservation({ ...nothingSaid, ...said }, named)
  return checked.ok ? null : checked.refusal.code
}

describe('an observation', () => {
  it('says nothing by default, and saving opens when one thing is said', () => {
    expect(isSomethingSaid(nothingSaid)).toBe(false)
    expect(isSomethingSaid({ ...nothingSaid, words: '  ' })).toBe(false)
    expect(isSomethingSaid({ ...nothingSaid, forVeterinarian: true })).toBe(false)
    for (const said of [
      { feeding: 'none' },
      { foundDead: 0 },
      { words: 'hides' },
      { signs: ['pale'] },
      { count: { basis: 'not-counted' } },
      { unwell: 0 },
      { handled: false },
    ] as Partial<ObservationSaid>[])
      expect(isSomethingSaid({ ...nothingSaid, ...said })).toBe(true)
  })

  it('that all is well never says a count, a reading, a sign, the skin, how many are weak or that none was handled', () => {
    expect(allWell).toEqual({
      lookedAt: true,
      feeding: 'all',
      breathing: 'normal',
      foundDead: 0,
      skin: null,
      signs: [],
      words: null,
      count: null,
      unwell: null,
      handled: null,
      forVeterinarian: false,
      urgent: false,
    })
  })

  it('is refused only for its shape', () => {
    expect(refusal({})).toBe('nothing-said')
    expect(refusal({ count: { basis: 'estimated', low: 40, high: 20 } })).toBe('count-reversed')
    expect(refusal({ count: { basis: 'counted', low: 3, high: 4 } })).toBe('count-reversed')
    expect(refusal({ urgent: true, foundDead: 1 })).toBe('urgent-without-words')
    expect(refusal({ urgent: true, signs: ['gasping'] })).toBeNull()
    expect(refusal({ foundDead: 2 }, 3)).toBe('more-named-than-found')
    expect(refusal({ words: 'dead' }, 1)).toBe('more-named-than-found')
    expect(refusal({ foundDead: 300 }, 2)).toBeNull()
  })
})
