import { readingOf } from '../caution-param.ts'
import { defineRule } from '../caution-rule.ts'
import { isBelow } from '../exceeds.ts'
import { freshReading } from '../fresh-reading.ts'

/**
 * Animals in a bath breathe harder, and some agents take oxygen out of the water themselves: none is given without a
 * fresh reading at or above the floor. The figure is the label's for formalin in ponds; that it holds for every bath is
 * the project's own choice.
 */
export const oxygen = defineRule({
  id: 'R01',
  levels: ['stop'],
  when: 'start',
  overridable: true,
  parameters: {
    oxygenFloorMgPerL: { default: 5, unit: 'mg/L', source: 'cfr-529-1030', mark: 'P', tighter: 'higher' },
    oxygenMaxAgeMinutes: { default: 30, unit: 'min', source: 'project-default', mark: 'P', tighter: 'lower' },
  },
  uses: ['water.oxygenMgPerL'],
  findings: {
    'oxygen-unknown': ['read-oxygen'],
    'oxygen-old': ['read-oxygen'],
    'oxygen-low': ['raise-oxygen'],
  },
  sources: [
    { source: 'cfr-529-1030', mark: 'V' },
    { source: 'project-default', mark: 'P' },
  ],
  concerns: () => true,
  judge(facts, { oxygenFloorMgPerL, oxygenMaxAgeMinutes }) {
    const floor = readingOf(oxygenFloorMgPerL, 'mg/L')
    const now = freshReading(facts.water.oxygenMgPerL, facts.at, oxygenMaxAgeMinutes)
    if (now.state === 'unknown')
      return [
        {
          code: 'oxygen-unknown',
          level: 'stop',
          params: { floor, maxAgeMinutes: oxygenMaxAgeMinutes },
          resolvedBy: ['read-oxygen'],
          unknown: ['water.oxygenMgPerL'],
        },
      ]
    const reading = readingOf(now.value, 'mg/L', now.digits)
    if (now.state === 'old')
      return [
        {
          code: 'oxygen-old',
          level: 'stop',
          params: {
            oxygen: reading,
            readAt: now.at,
            ageMinutes: now.ageMinutes,
            maxAgeMinutes: oxygenMaxAgeMinutes,
          },
          resolvedBy: ['read-oxygen'],
          unknown: ['water.oxygenMgPerL'],
        },
      ]
    if (!isBelow(now.value, oxygenFloorMgPerL)) return []
    return [
      { code: 'oxygen-low', level: 'stop', params: { oxygen: reading, floor }, resolvedBy: ['raise-oxygen'] },
    ]
  },
  condition: (_, { oxygenFloorMgPerL, oxygenMaxAgeMinutes }) => ({
    floor: readingOf(oxygenFloorMgPerL, 'mg/L'),
    maxAgeMinutes: oxygenMaxAgeMinutes,
  }),
})
