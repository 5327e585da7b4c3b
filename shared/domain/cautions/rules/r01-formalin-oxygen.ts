import { readingOf } from '../caution-param.ts'
import { defineRule } from '../caution-rule.ts'
import { isBelow } from '../exceeds.ts'
import { freshReading } from '../fresh-reading.ts'

/** Formalin takes oxygen out of water: none is dosed without a fresh reading at or above the floor. */
export const formalinOxygen = defineRule({
  id: 'R01',
  levels: ['stop'],
  when: 'start',
  overridable: true,
  parameters: {
    oxygenFloorMgPerL: { default: 5, unit: 'mg/L', source: 'cfr-529-1030', mark: 'V', tighter: 'higher' },
    oxygenMaxAgeMinutes: { default: 30, unit: 'min', source: 'project-default', mark: 'P', tighter: 'lower' },
  },
  uses: ['water.oxygenMgPerL'],
  sources: [
    { source: 'cfr-529-1030', mark: 'V' },
    { source: 'project-default', mark: 'P' },
  ],
  concerns: ({ agent }) => agent === 'formalin',
  judge(facts, { oxygenFloorMgPerL, oxygenMaxAgeMinutes }) {
    const floor = readingOf(oxygenFloorMgPerL, 'mg/L')
    const oxygen = freshReading(facts.water.oxygenMgPerL, facts.at, oxygenMaxAgeMinutes)
    if (oxygen.state === 'unknown')
      return [
        {
          code: 'oxygen-unknown',
          level: 'stop',
          params: { floor, maxAgeMinutes: oxygenMaxAgeMinutes },
          resolvedBy: ['read-oxygen'],
          unknown: ['water.oxygenMgPerL'],
        },
      ]
    const reading = readingOf(oxygen.value, 'mg/L', oxygen.digits)
    if (oxygen.state === 'old')
      return [
        {
          code: 'oxygen-old',
          level: 'stop',
          params: {
            oxygen: reading,
            readAt: oxygen.at,
            ageMinutes: oxygen.ageMinutes,
            maxAgeMinutes: oxygenMaxAgeMinutes,
          },
          resolvedBy: ['read-oxygen'],
          unknown: ['water.oxygenMgPerL'],
        },
      ]
    if (!isBelow(oxygen.value, oxygenFloorMgPerL)) return []
    return [
      { code: 'oxygen-low', level: 'stop', params: { oxygen: reading, floor }, resolvedBy: ['raise-oxygen'] },
    ]
  },
  condition: (_, { oxygenFloorMgPerL, oxygenMaxAgeMinutes }) => ({
    floor: readingOf(oxygenFloorMgPerL, 'mg/L'),
    maxAgeMinutes: oxygenMaxAgeMinutes,
  }),
})
