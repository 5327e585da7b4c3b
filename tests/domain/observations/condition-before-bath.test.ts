import { describe, expect, it } from 'vitest'
import { conditionBeforeBath } from '../../../shared/domain/observations/condition-before-bath.ts'
import type { CountHere, StrengthSaid } from '../../../shared/domain/observations/condition-before-bath.ts'

const at = '2026-12-01T18:00:00Z'
const look = (said: Partial<StrengthSaid>): StrengthSaid => ({
  enclosureId: 'a',
  at: '2026-12-01T12:00:00Z',
  unwell: null,
  handled: null,
  ...said,
})
const school = { enclosureId: 'a', low: 40 }
const ray = { enclosureId: 'b', low: 1 }
const judge = (looks: StrengthSaid[], animals: CountHere[] = [school]) =>
  conditionBeforeBath(looks, animals, at)

describe('the share of weak animals before a bath', () => {
  it('is what the newest look that says it counted, of the animals in the ledger', () => {
    expect(judge([look({ unwell: 2 })]).unwellPercent).toEqual({ value: 5, at: '2026-12-01T12:00:00Z' })
    expect(judge([look({ unwell: 0 })]).unwellPercent?.value).toBe(0)
    const later = look({ at: '2026-12-01T15:00:00Z', unwell: 3 })
    expect(judge([look({ unwell: 2 }), later]).unwellPercent?.value).toBe(7.5)
    expect(judge([later, look({ unwell: 2 })]).unwellPercent?.value).toBe(7.5)
    // a later look that says nothing of it takes nothing back
    expect(judge([look({ unwell: 2 }), look({ at: '2026-12-01T17:00:00Z' })]).unwellPercent?.value).toBe(5)
  })

  it('wants a look in every enclosure of the water, and counts all animals together', () => {
    expect(judge([look({ unwell: 0 })], [school, ray]).unwellPercent).toBeNull()
    const both = [look({ unwell: 1 }), look({ enclosureId: 'b', at: '2026-12-01T10:00:00Z', unwell: 1 })]
    const { unwellPercent } = judge(both, [school, ray])
    expect(unwellPercent?.value).toBeCloseTo((2 / 41) * 100, 12)
    // as old as the older of the two
    expect(unwellPercent?.at).toBe('2026-12-01T10:00:00Z')
    // a look at another water says nothing here
    expect(judge([look({ unwell: 0 }), look({ enclosureId: 'c', unwell: 9 })]).unwellPercent?.value).toBe(0)
  })

  it('is known for a day, to the minute, and never from a look to come', () => {
    const of = (made: string) => judge([look({ at: made, unwell: 0, handled: false })])
    expect(of('2026-11-30T18:00:00Z').unwellPercent).not.toBeNull()
    expect(of('2026-11-30T17:59:59Z')).toEqual({ unwellPercent: null, handled: null })
    expect(of(at).handled?.value).toBe(false)
    expect(of('2026-12-01T18:00:01Z')).toEqual({ unwellPercent: null, handled: null })
  })

  it('errs towards many: the smallest number the ledger allows, and never over all of them', () => {
    expect(judge([look({ unwell: 60 })]).unwellPercent?.value).toBe(100)
    const uncertain = [{ enclosureId: 'a', low: 0 }]
    expect(judge([look({ unwell: 1 })], uncertain).unwellPercent?.value).toBe(100)
    expect(judge([look({ unwell: 0 })], uncertain).unwellPercent?.value).toBe(0)
  })

  it('of nobody is none', () => {
    expect(judge([], [])).toEqual({
      unwellPercent: { value: 0, at: null },
      handled: { value: false, at: null },
    })
  })
})

describe('handling within a day before a bath', () => {
  it('is known as soon as one look says so, whatever a later one says', () => {
    const yes = look({ handled: true })
    const no = look({ at: '2026-12-01T16:00:00Z', handled: false })
    expect(judge([yes, no]).handled).toEqual({ value: true, at: '2026-12-01T12:00:00Z' })
    expect(judge([yes], [school, ray]).handled?.value).toBe(true)
  })

  it('is ruled out only by a look in every enclosure', () => {
    const no = look({ handled: false })
    expect(judge([no]).handled?.value).toBe(false)
    expect(judge([no], [school, ray]).handled).toBeNull()
    expect(judge([no, look({ enclosureId: 'b', handled: false })], [school, ray]).handled?.value).toBe(false)
    expect(judge([look({ unwell: 0 })]).handled).toBeNull()
    expect(judge([]).handled).toBeNull()
  })
})

describe('animals that were elsewhere within the day', () => {
  const moved = {
    enclosureId: 'tub',
    low: 10,
    stays: [
      { enclosureId: 'home', from: '2026-11-01T00:00:00Z', until: '2026-12-01T16:00:00Z' },
      { enclosureId: 'tub', from: '2026-12-01T16:00:00Z', until: null },
    ],
  }
  const atHome = (made: string, unwell: number, handled = false) =>
    look({ enclosureId: 'home', at: made, unwell, handled })
  const inTub = (made: string, unwell: number) => look({ enclosureId: 'tub', at: made, unwell })
  const before = '2026-12-01T12:00:00Z'
  const after = '2026-12-01T17:00:00Z'

  it('are told of by the looks where they were then, and by nobody else', () => {
    expect(judge([atHome(before, 1)], [moved])).toMatchObject({
      unwellPercent: { value: 10, at: before },
      handled: { value: false },
    })
    // those who are left at home tell nothing of them, and the tub before they came as little
    expect(judge([atHome(after, 1)], [moved]).unwellPercent).toBeNull()
    expect(judge([atHome('2026-12-01T16:00:00Z', 1)], [moved]).unwellPercent).toBeNull()
    expect(judge([inTub(before, 1)], [moved]).unwellPercent).toBeNull()
    expect(judge([atHome(before, 1), inTub(after, 0)], [moved]).unwellPercent?.value).toBe(0)
  })

  it('were handled where a look there says so while they were there', () => {
    expect(judge([atHome(before, 0, true)], [moved]).handled?.value).toBe(true)
    expect(judge([atHome(after, 0, true)], [moved]).handled).toBeNull()
  })

  it('joined others: the look before they came tells of the others alone', () => {
    const there = {
      enclosureId: 'tub',
      low: 30,
      stays: [{ enclosureId: 'tub', from: '2026-11-01T00:00:00Z', until: null }],
    }
    const both: CountHere[] = [there, moved]
    expect(judge([inTub(before, 0)], both).unwellPercent).toBeNull()
    expect(judge([inTub(before, 3), atHome(before, 1)], both).unwellPercent?.value).toBe(10)
    expect(judge([inTub(before, 3), inTub(after, 1)], both).unwellPercent?.value).toBe(2.5)
  })

  it('of two looks at one time the worse counts', () => {
    expect(judge([look({ unwell: 0 }), look({ unwell: 20 })]).unwellPercent?.value).toBe(50)
  })
})
