const minutesInADay = 24 * 60

/**
 * The most contact, in minutes, that any 24 hours of a course hold: 24 hours that begin with a dose hold that one whole,
 * and of each later one what lies within them. Our own working; what it is held against comes with its source.
 *
 * @param contactMinutes of one dose, above 0; one dose alone may be longer than a day
 * @param doses          planned, a whole number from 1
 * @param intervalHours  from the beginning of one dose to that of the next; null when there is but one
 */
export function longestContactInADay(
  contactMinutes: number,
  doses: number,
  intervalHours: number | null,
): number {
  let sum = 0
  for (let dose = 0; dose < doses && sum < minutesInADay; dose++) {
    const left = minutesInADay - dose * (intervalHours ?? 24) * 60
    if (left <= 0) break
    sum += Math.min(contactMinutes, left)
  }
  return Math.max(contactMinutes, Math.min(sum, minutesInADay))
}
