import type { CautionFacts, DefaultRange } from './caution-facts.ts'
import type { RuleParameter } from './caution-rule.ts'
import { exceeds } from './exceeds.ts'
import { valueOf } from './fact.ts'
import { targetOnBasisOf } from './target-on-basis.ts'

/**
 * A line for a bath whose source names no minutes is of one that is watched and has an end, not of days. Without a limit
 * of its own it would fit any contact that is called timed.
 */
export const contactParameters = {
  untimedBathMinutes: { default: 60, unit: 'min', source: 'project-default', mark: 'P', tighter: 'lower' },
  contactStopFactor: { default: 2, unit: 'factor', source: 'project-default', mark: 'P', tighter: 'lower' },
} as const satisfies Record<string, RuleParameter>
export type ContactLimits = Record<keyof typeof contactParameters, number>

/** Whether a line is for a bath that has an end, though its source does not say when. */
export function isUntimedBath({ longestContactMinutes, stays }: DefaultRange): boolean {
  return longestContactMinutes === null && !stays
}

/** Minutes of one contact, or of all contacts of a day together where these are more; null when nobody told. */
export function longestContactOrDay({ order }: CautionFacts): number | null {
  const minutes = valueOf(order.contactMinutes)
  const perDay = valueOf(order.contactMinutesPerDay)
  if (minutes === null || perDay === null) return minutes ?? perDay
  return Math.max(minutes, perDay)
}

/** Whether a line is one for this water. A kind that nobody told, and brackish water, fit any. */
export function isForWater({ water }: DefaultRange, { water: { kind } }: CautionFacts): boolean {
  const here = valueOf(kind)
  return here === null || here === 'brackish' || water === 'both' || water === here
}

/** Whether the contact ordered is one that a line covers; a time that is not stated yet fits any. */
export function isForContact(
  line: DefaultRange,
  facts: CautionFacts,
  { untimedBathMinutes, contactStopFactor }: ContactLimits,
): boolean {
  const { longestContactMinutes, stays } = line
  if (valueOf(facts.order.timing) === 'indefinite') return stays && longestContactMinutes === null
  if (isUntimedBath(line)) {
    const minutes = longestContactOrDay(facts)
    return minutes === null || !exceeds(minutes, untimedBathMinutes * contactStopFactor)
  }
  if (longestContactMinutes === null) return true
  const minutes = valueOf(facts.order.contactMinutes)
  if (minutes !== null && exceeds(minutes, longestContactMinutes)) return false
  const longest = longestContactOrDay(facts)
  return longest === null || !exceeds(longest, longestContactMinutes * contactStopFactor)
}

/** Every line of the drug that a figure can be held against. */
export function linesOfAgent({ order }: CautionFacts): readonly DefaultRange[] {
  return (valueOf(order.agentRanges) ?? []).filter(({ high }) => high > 0)
}

/** The lines that an order is held against: the one it names, or those of the drug for such water and such a contact. */
export function linesToCompare(facts: CautionFacts, limits: ContactLimits): readonly DefaultRange[] {
  const named = valueOf(facts.order.defaultRange)
  if (named) return named.high > 0 ? [named] : []
  return linesOfAgent(facts).filter((line) => isForWater(line, facts) && isForContact(line, facts, limits))
}

/** The target in the terms of the line whose upper end it is the smallest multiple of; null where none can be compared with. */
export function nearestLine(
  facts: CautionFacts,
  limits: ContactLimits,
): { value: number; range: DefaultRange } | null {
  const compared = linesToCompare(facts, limits).flatMap((range) => {
    const value = targetOnBasisOf(facts, range)
    return value === null ? [] : [{ value, range }]
  })
  return compared.sort((a, b) => a.value / a.range.high - b.value / b.range.high)[0] ?? null
}
