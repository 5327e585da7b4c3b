import { doseOf, readingOf } from '../caution-param.ts'
import { defineRule } from '../caution-rule.ts'
import { exceeds } from '../exceeds.ts'
import { valueOf } from '../fact.ts'
import { formalinConcentration } from '../formalin-concentration.ts'
import { isFinfish } from '../inhabitants.ts'
import { warmestTemperatureC } from '../warmest-temperature.ts'

/** The extension sheet's cap in warm water, in its own unit: milligrams of product per litre. */
export const formalinWarmWater = defineRule({
  id: 'R06',
  levels: ['warning'],
  when: 'both',
  overridable: true,
  parameters: {
    boundaryC: { default: 21, unit: 'degC', source: 'ufifas-vm77', mark: 'V', tighter: 'lower' },
    capProductMgPerL: { default: 150, unit: 'mg/L', source: 'ufifas-vm77', mark: 'V', tighter: 'lower' },
    windowHours: { default: 4, unit: 'h', source: 'project-default', mark: 'P', tighter: 'higher' },
  },
  uses: [
    'order.target',
    'water.temperatureC',
    'water.recentTemperaturesC',
    'animals.inWater',
    'lot.densityGPerMl',
  ],
  findings: {
    'formalin-in-warm-water': ['lower-target', 'cool-water'],
    'formalin-temperature-unknown': ['read-temperature', 'lower-target'],
  },
  sources: [{ source: 'ufifas-vm77', mark: 'V' }],
  concerns: ({ agent }) => agent === 'formalin',
  judge(facts, { boundaryC, capProductMgPerL, windowHours }) {
    const strength = formalinConcentration(facts)
    const inWater = valueOf(facts.animals.inWater)
    if (!strength || !exceeds(strength.productMgPerL, capProductMgPerL)) return []
    if (inWater !== null && !inWater.some(isFinfish)) return []
    const target = doseOf(strength.productMgPerL, 'mg/L')
    const limit = doseOf(capProductMgPerL, 'mg/L')
    const boundary = readingOf(boundaryC, 'degC')
    const warmestC = warmestTemperatureC(facts, windowHours)
    if (warmestC === null)
      return [
        {
          code: 'formalin-temperature-unknown',
          level: 'warning',
          params: { target, limit, boundary },
          resolvedBy: ['read-temperature', 'lower-target'],
          unknown: ['water.temperatureC'],
        },
      ]
    if (!exceeds(warmestC, boundaryC)) return []
    return [
      {
        code: 'formalin-in-warm-water',
        level: 'warning',
        params: { target, limit, temperature: readingOf(warmestC, 'degC'), boundary },
        resolvedBy: ['lower-target', 'cool-water'],
      },
    ]
  },
})
