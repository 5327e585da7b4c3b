import type { CautionFacts, DefaultRange } from '../caution-facts.ts'
import { type CautionFinding, defineRule } from '../caution-rule.ts'
import { exceeds } from '../exceeds.ts'
import { valueOf } from '../fact.ts'

/**
 * A dose line is a figure for one kind of water and, where its source says so, for a time. The same figure in other
 * water, or for much longer, is another treatment.
 */
export const lineConditions = defineRule({
  id: 'R49',
  levels: ['warning', 'stop'],
  when: 'design',
  overridable: true,
  parameters: {
    contactStopFactor: {
      default: 2,
      unit: 'factor',
      source: 'project-default',
      mark: 'P',
      tighter: 'lower',
    },
  },
  uses: ['order.defaultRange', 'order.timing', 'order.contactMinutes', 'water.kind'],
  sources: [{ source: 'project-default', mark: 'P' }],
  concerns: () => true,
  judge(facts, { contactStopFactor }) {
    const line = valueOf(facts.order.defaultRange)
    return line ? [...judgeWater(line, facts), ...judgeContact(line, facts, contactStopFactor)] : []
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

function judgeContact(
  { longestContactMinutes: limitMinutes, stays }: DefaultRange,
  { order }: CautionFacts,
  stopFactor: number,
): CautionFinding[] {
  const resolvedBy = ['shorten-contact', 'choose-dose-line'] as const
  const isLeftIn = valueOf(order.timing) === 'indefinite'
  if (limitMinutes === null)
    return isLeftIn && !stays ? [{ code: 'left-in-bath-line', level: 'stop', params: {}, resolvedBy }] : []
  if (isLeftIn) return [{ code: 'left-in-over-line', level: 'stop', params: { limitMinutes }, resolvedBy }]
  const minutes = valueOf(order.contactMinutes)
  if (minutes === null || !exceeds(minutes, limitMinutes)) return []
  const isFar = exceeds(minutes, limitMinutes * stopFactor)
  return [
    {
      code: isFar ? 'contact-far-over-line' : 'contact-over-line',
      level: isFar ? 'stop' : 'warning',
      params: { minutes, limitMinutes },
      resolvedBy,
    },
  ]
}
