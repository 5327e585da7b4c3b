import type { CautionFacts, DefaultRange } from '../caution-facts.ts'
import { type CautionFinding, defineRule } from '../caution-rule.ts'
import { type ContactLimits, contactParameters, isUntimedBath, longestContactOrDay } from '../dose-lines.ts'
import { exceeds } from '../exceeds.ts'
import { valueOf } from '../fact.ts'

/**
 * A dose line is a figure for one kind of water and, where its source says so, for a time. The same figure in other
 * water, or for much longer, is another treatment. A line for a bath that names no time is held to a default.
 */
export const lineConditions = defineRule({
  id: 'R49',
  levels: ['warning', 'stop'],
  when: 'design',
  overridable: true,
  parameters: contactParameters,
  uses: [
    'order.defaultRange',
    'order.timing',
    'order.contactMinutes',
    'order.contactMinutesPerDay',
    'water.kind',
  ],
  findings: {
    'line-water-unknown': ['state-water-kind', 'choose-dose-line'],
    'line-of-other-water': ['choose-dose-line', 'choose-other-agent'],
    'left-in-bath-line': ['shorten-contact', 'choose-dose-line'],
    'left-in-over-line': ['shorten-contact', 'choose-dose-line'],
    'contact-over-line': ['shorten-contact', 'choose-dose-line'],
    'contact-far-over-line': ['shorten-contact', 'choose-dose-line'],
    'day-over-line': ['shorten-contact', 'choose-dose-line'],
    'day-far-over-line': ['shorten-contact', 'choose-dose-line'],
    'contact-over-untimed-line': ['shorten-contact', 'choose-dose-line', 'confirm-dose-line'],
    'contact-far-over-untimed-line': ['shorten-contact', 'choose-dose-line', 'confirm-dose-line'],
  },
  sources: [{ source: 'project-default', mark: 'P' }],
  concerns: () => true,
  judge(facts, limits) {
    const line = valueOf(facts.order.defaultRange)
    return line ? [...judgeWater(line, facts), ...judgeContact(line, facts, limits)] : []
  },
})

function judgeWater({ water: lineWater }: DefaultRange, { water: { kind } }: CautionFacts): CautionFinding[] {
  if (lineWater === 'both') return []
  const water = valueOf(kind)
  if (water === null)
    return [
      {
        code: 'line-water-unknown',
        level: 'warning',
        params: { lineWater },
        resolvedBy: ['state-water-kind', 'choose-dose-line'],
        unknown: ['water.kind'],
      },
    ]
  if (water === lineWater) return []
  return [
    {
      code: 'line-of-other-water',
      // brackish water lies between the two, and nobody published a figure for it
      level: water === 'brackish' ? 'warning' : 'stop',
      params: { lineWater, water },
      resolvedBy: ['choose-dose-line', 'choose-other-agent'],
    },
  ]
}

function judgeContact(line: DefaultRange, facts: CautionFacts, limits: ContactLimits): CautionFinding[] {
  const { longestContactMinutes: limitMinutes } = line
  const resolvedBy = ['shorten-contact', 'choose-dose-line'] as const
  const isLeftIn = valueOf(facts.order.timing) === 'indefinite'
  if (isUntimedBath(line))
    return isLeftIn
      ? [{ code: 'left-in-bath-line', level: 'stop', params: {}, resolvedBy }]
      : judgeUntimedBath(facts, limits)
  if (limitMinutes === null) return []
  if (isLeftIn) return [{ code: 'left-in-over-line', level: 'stop', params: { limitMinutes }, resolvedBy }]
  const minutes = longestContactOrDay(facts)
  if (minutes === null || !exceeds(minutes, limitMinutes)) return []
  const isFar = exceeds(minutes, limitMinutes * limits.contactStopFactor)
  const code = exceeds(minutes, valueOf(facts.order.contactMinutes) ?? 0)
    ? (['day-over-line', 'day-far-over-line'] as const)
    : (['contact-over-line', 'contact-far-over-line'] as const)
  return [
    {
      code: code[isFar ? 1 : 0],
      level: isFar ? 'stop' : 'warning',
      // a day is seldom a whole number of intervals
      params: { minutes: Math.ceil(minutes), limitMinutes },
      resolvedBy,
    },
  ]
}

function judgeUntimedBath(
  facts: CautionFacts,
  { untimedBathMinutes, contactStopFactor }: ContactLimits,
): CautionFinding[] {
  const minutes = longestContactOrDay(facts)
  if (minutes === null || !exceeds(minutes, untimedBathMinutes)) return []
  const isFar = exceeds(minutes, untimedBathMinutes * contactStopFactor)
  return [
    {
      code: isFar ? 'contact-far-over-untimed-line' : 'contact-over-untimed-line',
      level: isFar ? 'stop' : 'warning',
      // a day is seldom a whole number of intervals
      params: { minutes: Math.ceil(minutes), limitMinutes: untimedBathMinutes },
      resolvedBy: ['shorten-contact', 'choose-dose-line', 'confirm-dose-line'],
    },
  ]
}
