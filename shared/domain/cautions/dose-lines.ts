import type { CautionFacts, DefaultRange } from './caution-facts.ts'
import { exceeds } from './exceeds.ts'
import { valueOf } from './fact.ts'
import { targetOnBasisOf } from './target-on-basis.ts'

/** Whether a line is one for this water. A kind that nobody told, and brackish water, fit any. */
export function isForWater({ water }: DefaultRange, { water: { kind } }: CautionFacts): boolean {
  const here = valueOf(kind)
  return here === null || here === 'brackish' || water === 'both' || water === here
}

/** Whether the contact ordered is one that a line covers; a time that is not stated yet fits any. */
export function isForContact(
  { longestContactMinutes, stays }: DefaultRange,
  { order }: CautionFacts,
): boolean {
  if (valueOf(order.timing) === 'indefinite') return stays && longestContactMinutes === null
  if (longestContactMinutes === null) return true
  const minutes = valueOf(order.contactMinutes)
  return minutes === null || !exceeds(minutes, longestContactMinutes)
}

/** Every line of the drug that a figure can be held against. */
export function linesOfAgent({ order }: CautionFacts): readonly DefaultRange[] {
  return (valueOf(order.agentRanges) ?? []).filter(({ high }) => high > 0)
}

/** The lines that an order is held against: the one it names, or those of the drug for such water and such a contact. */
export function linesToCompare(facts: CautionFacts): readonly DefaultRange[] {
  const named = valueOf(facts.order.defaultRange)
  if (named) return named.high > 0 ? [named] : []
  return linesOfAgent(facts).filter((line) => isForWater(line, facts) && isForContact(line, facts))
}

/** The target in the terms of the line whose upper end it is the smallest multiple of; null where none can be compared with. */
export function nearestLine(facts: CautionFacts): { value: number; range: DefaultRange } | null {
  const compared = linesToCompare(facts).flatMap((range) => {
    const value = targetOnBasisOf(facts, range)
    return value === null ? [] : [{ value, range }]
  })
  return compared.sort((a, b) => a.value / a.range.high - b.value / b.range.high)[0] ?? null
}
