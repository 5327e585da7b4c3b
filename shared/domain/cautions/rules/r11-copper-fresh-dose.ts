import { doseOf, readingOf } from '../caution-param.ts'
import { defineRule } from '../caution-rule.ts'
import { copperConcentration } from '../copper-concentration.ts'
import { exceeds } from '../exceeds.ts'
import { valueOf } from '../fact.ts'
import { freshReading } from '../fresh-reading.ts'

/** In fresh water the dose of copper sulfate is the alkalinity ÷ 100, and never above the cap. */
export const copperFreshDose = defineRule({
  id: 'R11',
  levels: ['stop'],
  when: 'both',
  overridable: true,
  parameters: {
    capMgPerL: { default: 2.5, unit: 'mg/L', source: 'ufifas-fa008', mark: 'V', tighter: 'lower' },
    alkalinityDivisor: { default: 100, unit: 'factor', source: 'ufifas-fa008', mark: 'V', tighter: 'higher' },
    maxAgeHours: { default: 24, unit: 'h', source: 'project-default', mark: 'P', tighter: 'lower' },
  },
  uses: ['order.target', 'water.kind', 'water.alkalinityMgPerLCaCO3'],
  findings: {
    'copper-over-alkalinity': ['lower-target'],
    'copper-over-cap': ['lower-target'],
  },
  sources: [{ source: 'ufifas-fa008', mark: 'V' }],
  concerns: ({ agent, water }) => agent === 'copper-sulfate' && valueOf(water.kind) !== 'marine',
  judge(facts, { capMgPerL, alkalinityDivisor, maxAgeHours }) {
    const strength = copperConcentration(valueOf(facts.order.target))
    if (!strength) return []
    const target = doseOf(strength.pentahydrateMgPerL, 'mg/L')
    const base = { level: 'stop', resolvedBy: ['lower-target'] } as const
    if (exceeds(strength.pentahydrateMgPerL, capMgPerL))
      return [{ ...base, code: 'copper-over-cap', params: { target, limit: doseOf(capMgPerL, 'mg/L') } }]
    // An alkalinity that is unknown or old is R10's matter; the cap holds all the same.
    const reading = freshReading(facts.water.alkalinityMgPerLCaCO3, facts.at, maxAgeHours * 60)
    if (reading.state !== 'fresh') return []
    const limitMgPerL = reading.value / alkalinityDivisor
    if (!exceeds(strength.pentahydrateMgPerL, limitMgPerL)) return []
    const alkalinity = readingOf(reading.value, 'mg/L_CaCO3', reading.digits)
    return [
      {
        ...base,
        code: 'copper-over-alkalinity',
        params: { target, limit: doseOf(limitMgPerL, 'mg/L'), alkalinity },
      },
    ]
  },
})
