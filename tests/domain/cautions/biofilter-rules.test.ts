import { describe, expect, it } from 'vitest'
import { evaluateCautions } from '../../../shared/domain/cautions/evaluate-cautions.ts'
import type { CautionFacts } from '../../../shared/domain/cautions/caution-facts.ts'
import { harmBiofilter } from '../../../shared/domain/cautions/rules/r30-nitrogen-rises.ts'
import { sayCaution } from '../../../shared/messages/say-caution.ts'
import { known, notApplicable, unknown } from '../../../shared/domain/cautions/fact.ts'
import { cautions, firedBy, formalin, minutesAgo, read, someFacts } from './some-facts.ts'
import type { Change } from './some-facts.ts'

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

describe('R30: ammonia and nitrite under a drug that harms the biofilter', () => {
  const start = (water: Change['water'] = {}) =>
    firedBy('R30', someFacts('formalin', formalin(100), { water }), 'start')
  const days = (...values: number[]) => known(values.map((value) => ({ value, at: minutesAgo(1440) })))

  it.each<[string, Change['water'], string[]]>([
    ['all is as before', {}, []],
    ['exactly twice as much', { totalAmmoniaNMgPerL: read(0.04) }, []],
    ['more than twice', { totalAmmoniaNMgPerL: read(0.041) }, ['warning nitrogen-rising']],
    ['nitrite too', { nitriteNMgPerL: read(0.041) }, ['warning nitrogen-rising']],
    [
      'beside the middle of the days before',
      { totalAmmoniaNMgPerL: read(0.041), earlierTotalAmmoniaN: days(0.02, 0.3, 0.02) },
      ['warning nitrogen-rising'],
    ],
    [
      'where the middle lies between two',
      {
        totalAmmoniaNMgPerL: read(0.06),
        earlierTotalAmmoniaN: days(0.02, 0.04),
        unionisedAmmoniaNMgPerL: read(0),
      },
      [],
    ],
    ['none before, and some now', { earlierNitriteN: days(0) }, ['warning nitrogen-rising']],
    ['read 24 h ago', { nitriteNMgPerL: read(0.02, 1440) }, []],
    ['read longer ago', { nitriteNMgPerL: read(0.02, 1441) }, ['warning nitrogen-unknown']],
    ['never read', { totalAmmoniaNMgPerL: unknown() }, ['warning nitrogen-unknown']],
    ['nothing before', { earlierTotalAmmoniaN: unknown() }, ['warning nitrogen-before-unknown']],
  ])('%s', (_, water, expected) => expect(start(water)).toEqual(expected))

  it.each<[string, number, CautionFacts['water']['unionisedAmmoniaNMgPerL'], string[]]>([
    ['un-ionised at exactly 0.05', 1, read(0.05), []],
    ['above it', 1, read(0.0501), ['warning unionised-ammonia-high']],
    ['not known', 1, unknown(), ['warning unionised-ammonia-unknown']],
    ['not known, but all ammonia together is no more', 0.05, unknown(), []],
  ])('%s', (_, total, unionisedAmmoniaNMgPerL, expected) =>
    expect(
      start({ totalAmmoniaNMgPerL: read(total), earlierTotalAmmoniaN: days(1), unionisedAmmoniaNMgPerL }),
    ).toEqual(expected),
  )
  it('brings work to do, and says what was before', () => {
    const facts = someFacts('formalin', formalin(100), {
      water: { totalAmmoniaNMgPerL: read(0.6), earlierTotalAmmoniaN: days(0.2) },
    })
    const found = cautions(facts, 'start').find(({ code }) => code === 'nitrogen-rising')
    expect(found?.effects).toEqual([{ kind: 'task' }])
    expect(found && sayCaution(found, 'UTC').text.replaceAll('\u00a0', ' ')).toContain(
      'total ammonia nitrogen is 0.6 mg/L, more than 2 times the 0.2 mg/L of the days before',
    )
  })
  it('is a condition while the order is written, and of no drug that leaves the biofilter alone', () => {
    const facts = someFacts('formalin', formalin(100), { water: { nitriteNMgPerL: unknown() } })
    expect(firedBy('R30', facts)).toEqual([])
    expect(
      evaluateCautions({ facts, stage: 'design' }).conditions.find(({ ruleId }) => ruleId === 'R30')?.state,
    ).toBe('unknown')
    for (const agent of ['praziquantel', 'tricaine', 'metronidazole', 'fenbendazole'] as const)
      expect(harmBiofilter).not.toContain(agent)
  })
})
