import { readingOf } from '../caution-param.ts'
import { defineRule } from '../caution-rule.ts'
import { isBelow } from '../exceeds.ts'
import { valueOf } from '../fact.ts'
import { freshReading } from '../fresh-reading.ts'

/** In fresh water of low alkalinity copper kills the fish it should help. */
export const copperAlkalinity = defineRule({
  id: 'R10',
  levels: ['stop'],
  when: 'both',
  overridable: true,
  parameters: {
    floorMgPerLCaCO3: {
      default: 50,
      unit: 'mg/L_CaCO3',
      source: 'ufifas-fa008',
      mark: 'V',
      tighter: 'higher',
    },
    maxAgeHours: { default: 24, unit: 'h', source: 'project-default', mark: 'P', tighter: 'lower' },
  },
  uses: ['water.kind', 'water.alkalinityMgPerLCaCO3'],
  findings: {
    'alkalinity-unknown': ['read-alkalinity'],
    'alkalinity-old': ['read-alkalinity'],
    'alkalinity-low': ['raise-alkalinity', 'choose-other-agent'],
  },
  sources: [
    { source: 'ufifas-fa008', mark: 'V' },
    { source: 'project-default', mark: 'P' },
  ],
  concerns: ({ agent, water }) => agent === 'copper-sulfate' && valueOf(water.kind) !== 'marine',
  judge(facts, { floorMgPerLCaCO3, maxAgeHours }) {
    const floor = readingOf(floorMgPerLCaCO3, 'mg/L_CaCO3')
    const reading = freshReading(facts.water.alkalinityMgPerLCaCO3, facts.at, maxAgeHours * 60)
    const base = {
      level: 'stop',
      resolvedBy: ['read-alkalinity'],
      unknown: ['water.alkalinityMgPerLCaCO3'],
    } as const
    if (reading.state === 'unknown')
      return [{ ...base, code: 'alkalinity-unknown', params: { floor, maxAgeHours } }]
    const alkalinity = readingOf(reading.value, 'mg/L_CaCO3', reading.digits)
    if (reading.state === 'old')
      return [{ ...base, code: 'alkalinity-old', params: { alkalinity, readAt: reading.at, maxAgeHours } }]
    if (!isBelow(reading.value, floorMgPerLCaCO3)) return []
    return [
      {
        code: 'alkalinity-low',
        level: 'stop',
        params: { alkalinity, floor },
        resolvedBy: ['raise-alkalinity', 'choose-other-agent'],
      },
    ]
  },
})
