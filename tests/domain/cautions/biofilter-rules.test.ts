import { describe, expect, it } from 'vitest'
import { evaluateCautions } from '../../../shared/domain/cautions/evaluate-cautions.ts'
import type { CautionFacts } from '../../../shared/domain/cautions/caution-facts.ts'
import { known, notApplicable, unknown } from '../../../shared/domain/cautions/fact.ts'
import { firedBy, minutesAgo, someFacts } from './some-facts.ts'

describe('R25: methylene blue and the biofilter', () => {
  const blue = (biofilter: CautionFacts['lifeSupport']['biofilter']) =>
    someFacts('methylene-blue', { value: 2, unit: 'mg/L', basis: 'active' }, { lifeSupport: { biofilter } })
  it('stops where one runs on the water, or where nobody knows; not where it is off', () => {
    expect(firedBy('R25', blue(known('on')))).toEqual(['stop biofilter-on'])
    expect(firedBy('R25', blue(unknown()))).toEqual(['stop biofilter-unknown'])
    expect(firedBy('R25', blue(notApplicable()))).toEqual(['stop biofilter-unknown'])
    expect(firedBy('R25', blue(known('off')))).toEqual([])
  })
  it('is of methylene blue alone', () => {
    const other = someFacts(
      'praziquantel',
      { value: 2, unit: 'mg/L', basis: 'active' },
      {
        lifeSupport: { biofilter: known('on') },
      },
    )
    expect(firedBy('R25', other)).toEqual([])
  })
  it('is judged again at the dose once it was turned on', () => {
    const found = (then: CautionFacts, now: CautionFacts) =>
      evaluateCautions({ facts: now, stage: 'start', factsAtSigning: then }).cautions.map(({ code }) => code)
    expect(found(blue(known('off')), blue(known('on')))).toEqual(['biofilter-on'])
    expect(found(blue(known('off')), blue(known('off')))).toEqual([])
  })
  it('an order that was signed before the question is asked only about what happened since', () => {
    const now = (turnedOnAt: string | null) => blue(known('on', turnedOnAt))
    const { biofilter: _, ...lifeSupport } = now(null).lifeSupport
    const signed = { ...now(null), at: minutesAgo(60), lifeSupport } as unknown as CautionFacts
    const found = (turnedOnAt: string | null) =>
      evaluateCautions({ facts: now(turnedOnAt), stage: 'start', factsAtSigning: signed }).cautions.map(
        ({ code }) => code,
      )
    expect(found(null)).toEqual([])
    expect(found(minutesAgo(90))).toEqual([])
    expect(found(minutesAgo(30))).toEqual(['biofilter-on'])
  })
})
