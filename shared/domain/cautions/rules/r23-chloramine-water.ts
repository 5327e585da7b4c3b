import { readingOf } from '../caution-param.ts'
import { type CautionFinding, defineRule } from '../caution-rule.ts'
import { isBelow } from '../exceeds.ts'
import { freshReading } from '../fresh-reading.ts'

/** Chloramine-T is more toxic in acid, soft water. */
export const chloramineWater = defineRule({
  id: 'R23',
  levels: ['warning'],
  when: 'design',
  overridable: true,
  parameters: {
    lowestPh: { default: 6.5, unit: 'pH', source: 'treatment-practice', mark: 'M', tighter: 'higher' },
    floorMgPerLCaCO3: {
      default: 50,
      unit: 'mg/L_CaCO3',
      source: 'treatment-practice',
      mark: 'M',
      tighter: 'higher',
    },
    maxAgeHours: { default: 24, unit: 'h', source: 'project-default', mark: 'P', tighter: 'lower' },
  },
  uses: ['water.pH', 'water.alkalinityMgPerLCaCO3'],
  findings: {
    'chloramine-acid': ['correct-water', 'lower-target'],
    'chloramine-soft': ['correct-water', 'lower-target'],
    'chloramine-unknown': ['read-water'],
  },
  sources: [{ source: 'treatment-practice', mark: 'M' }],
  concerns: ({ agent }) => agent === 'chloramine-t',
  judge(facts, { lowestPh, floorMgPerLCaCO3, maxAgeHours }) {
    const found: CautionFinding[] = []
    const pH = freshReading(facts.water.pH, facts.at, maxAgeHours * 60)
    const alkalinity = freshReading(facts.water.alkalinityMgPerLCaCO3, facts.at, maxAgeHours * 60)
    if (pH.state !== 'fresh')
      found.push({
        code: 'chloramine-unknown',
        level: 'warning',
        params: { reading: 'pH' },
        resolvedBy: ['read-water'],
        unknown: ['water.pH'],
      })
    else if (isBelow(pH.value, lowestPh))
      found.push({
        code: 'chloramine-acid',
        level: 'warning',
        params: { reading: readingOf(pH.value, 'pH', pH.digits), limit: readingOf(lowestPh, 'pH') },
        resolvedBy: ['correct-water', 'lower-target'],
      })
    if (alkalinity.state !== 'fresh')
      found.push({
        code: 'chloramine-unknown',
        level: 'warning',
        params: { reading: 'alkalinity' },
        resolvedBy: ['read-water'],
        unknown: ['water.alkalinityMgPerLCaCO3'],
      })
    else if (isBelow(alkalinity.value, floorMgPerLCaCO3))
      found.push({
        code: 'chloramine-soft',
        level: 'warning',
        params: {
          reading: readingOf(alkalinity.value, 'mg/L_CaCO3', alkalinity.digits),
          limit: readingOf(floorMgPerLCaCO3, 'mg/L_CaCO3'),
        },
        resolvedBy: ['correct-water', 'lower-target'],
      })
    return found
  },
})
