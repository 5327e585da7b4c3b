import { describe, expect, it } from 'vitest'
import { foodOrRelease } from '../../../shared/domain/animals/food-or-release.ts'
import type { FoodAnswer, FoodTies } from '../../../shared/domain/animals/food-or-release.ts'

const day = (n: number) => `2026-05-${String(n).padStart(2, '0')}T12:00:00Z`
const said = (animalId: string, answer: FoodAnswer, on: number) => ({
  id: `${animalId}-${String(on)}`,
  animalId,
  answer,
  at: day(on),
})
const answer = (animalId: string, ties: Partial<FoodTies>, on = 20) =>
  foodOrRelease(animalId, { statements: [], splits: [], merges: [], ...ties }, day(on))?.answer ?? null

describe('whether an animal may be eaten or set free', () => {
  it('is unknown until somebody says, then as it was said last', () => {
    const statements = [said('a', 'no', 2), said('a', 'yes', 4)]
    expect(answer('a', {})).toBeNull()
    expect([1, 2, 3, 4].map((on) => answer('a', { statements }, on))).toEqual([null, 'no', 'no', 'yes'])
  })
  it('comes with an animal out of its group, as it was said by then', () => {
    const splits = [{ animalId: 'one', fromId: 'school', at: day(5) }]
    expect(answer('one', { splits, statements: [said('school', 'yes', 4)] })).toBe('yes')
    expect(answer('one', { splits, statements: [said('school', 'yes', 6)] })).toBeNull()
    expect(answer('one', { splits, statements: [said('school', 'yes', 4), said('one', 'no', 6)] })).toBe('no')
  })
  it('of a group that others joined is the strictest of them, until it is said anew', () => {
    const merges = [{ animalId: 'school', otherId: 'other', at: day(5) }]
    const no = said('school', 'no', 2)
    expect(answer('school', { merges, statements: [no, said('other', 'yes', 3)] })).toBe('yes')
    expect(answer('school', { merges, statements: [no, said('other', 'no', 3)] })).toBe('no')
    expect(answer('school', { merges, statements: [no] })).toBeNull()
    expect(answer('school', { merges, statements: [said('school', 'no', 6), said('other', 'yes', 3)] })).toBe(
      'no',
    )
    expect(answer('school', { merges, statements: [said('other', 'yes', 3)] })).toBe('yes')
    expect(answer('school', { merges, statements: [said('other', 'no', 3)] })).toBeNull()
  })
  it('ends where groups went round in a ring', () => {
    const merges = [
      { animalId: 'a', otherId: 'b', at: day(5) },
      { animalId: 'b', otherId: 'a', at: day(4) },
    ]
    expect(answer('a', { merges })).toBeNull()
  })
})
