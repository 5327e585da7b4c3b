import { describe, expect, it } from 'vitest'
import { longestContactInADay } from '../../../shared/domain/orders/longest-contact-in-a-day.ts'

// Worked by hand: the doses of a day laid side by side from the beginning of one of them.
describe('the most contact that any 24 hours hold', () => {
  it.each([
    ['one dose', 50, 1, null, 50],
    ['two within a day', 50, 2, 20, 100],
    ['three of which the last begins at hour 22', 45, 3, 11, 135],
    ['a second of which one hour lies within the day', 60, 2, 23, 120],
    ['a second of which half lies within the day', 120, 2, 23, 180],
    ['one every day', 60, 10, 24, 60],
    ['one every second day', 60, 10, 48, 60],
    ['every hour for half an hour', 30, 100, 1, 720],
    ['no more of them than are planned', 30, 3, 1, 90],
    ['overlapping, a day and no more', 180, 100, 1, 1440],
    ['one that is longer than a day', 3000, 1, null, 3000],
  ])('%s', (_, contactMinutes, doses, intervalHours, expected) => {
    expect(longestContactInADay(contactMinutes, doses, intervalHours)).toBe(expected)
  })
})
