import type { FormalinRow } from '../caution-code.ts'
import type { AnimalInWater, CautionFacts } from '../caution-facts.ts'
import { doseOf, readingOf } from '../caution-param.ts'
import { type CautionFinding, defineRule } from '../caution-rule.ts'
import { exceeds, isBelow } from '../exceeds.ts'
import { valueOf } from '../fact.ts'
import { formalinConcentration } from '../formalin-concentration.ts'
import { isEgg, isFinfish } from '../inhabitants.ts'
import { warmestTemperatureC } from '../warmest-temperature.ts'

interface Ceiling {
  ulPerL: number
  row: FormalinRow | 'salmonid-warm' | 'salmonid-temperature-unknown'
}

type Limits = Record<
  | 'salmonidWarmUlPerL'
  | 'finfishUlPerL'
  | 'salmonidBoundaryC'
  | 'eggUlPerL'
  | 'sturgeonEggUlPerL'
  | 'penaeidTankUlPerL'
  | 'penaeidPondUlPerL',
  number
>

/**
 * The label's ceilings, by stage, group and temperature. In mixed water the strictest row of the animals in it holds;
 * exactly 10.0 °C is in neither row of the label for salmonids, so the stricter holds.
 */
export const formalinCeiling = defineRule({
  id: 'R05',
  levels: ['stop'],
  when: 'both',
  overridable: true,
  parameters: {
    salmonidWarmUlPerL: { default: 170, unit: 'uL/L', source: 'cfr-529-1030', mark: 'V', tighter: 'lower' },
    finfishUlPerL: { default: 250, unit: 'uL/L', source: 'cfr-529-1030', mark: 'V', tighter: 'lower' },
    salmonidBoundaryC: { default: 10, unit: 'degC', source: 'cfr-529-1030', mark: 'V', tighter: 'lower' },
    eggUlPerL: { default: 2000, unit: 'uL/L', source: 'cfr-529-1030', mark: 'V', tighter: 'lower' },
    sturgeonEggUlPerL: { default: 1500, unit: 'uL/L', source: 'cfr-529-1030', mark: 'V', tighter: 'lower' },
    penaeidTankUlPerL: { default: 100, unit: 'uL/L', source: 'cfr-529-1030', mark: 'V', tighter: 'lower' },
    penaeidPondUlPerL: { default: 25, unit: 'uL/L', source: 'cfr-529-1030', mark: 'V', tighter: 'lower' },
    windowHours: { default: 4, unit: 'h', source: 'project-default', mark: 'P', tighter: 'higher' },
  },
  uses: [
    'order.setting',
    'order.target',
    'water.temperatureC',
    'water.recentTemperaturesC',
    'animals.inWater',
    'lot.densityGPerMl',
  ],
  findings: {
    'formalin-over-ceiling': ['lower-target'],
    'formalin-over-salmonid-ceiling': ['lower-target'],
    'formalin-salmonid-temperature-unknown': ['read-temperature', 'lower-target'],
    'inhabitants-unknown': ['record-inhabitants'],
  },
  sources: [
    { source: 'cfr-529-1030', mark: 'V' },
    { source: 'project-default', mark: 'P' },
  ],
  concerns: ({ agent }) => agent === 'formalin',
  judge(facts, parameters) {
    const strength = formalinConcentration(facts)
    const inWater = valueOf(facts.animals.inWater)
    if (inWater === null)
      return [
        {
          code: 'inhabitants-unknown',
          level: 'stop',
          params: {},
          resolvedBy: ['record-inhabitants'],
          unknown: ['animals.inWater'],
        },
      ]
    if (!strength) return []
    const warmestC = warmestTemperatureC(facts, parameters.windowHours)
    const strictest = inWater
      .flatMap((animal) => ceilingOf(animal, facts, warmestC, parameters))
      .sort((a, b) => a.ulPerL - b.ulPerL)[0]
    if (!strictest || !exceeds(strength.productUlPerL, strictest.ulPerL)) return []
    return [told(strictest, strength.productUlPerL, warmestC, parameters.salmonidBoundaryC)]
  },
})

function ceilingOf(
  animal: AnimalInWater,
  { order }: CautionFacts,
  warmestC: number | null,
  limits: Limits,
): Ceiling[] {
  if (animal.taxonGroup === 'penaeid-shrimp') {
    const setting = valueOf(order.setting)
    const isTank = setting === 'tank' || setting === 'raceway'
    return [
      isTank
        ? { ulPerL: limits.penaeidTankUlPerL, row: 'penaeid-tank' }
        : { ulPerL: limits.penaeidPondUlPerL, row: 'penaeid-pond' },
    ]
  }
  if (!isFinfish(animal)) return []
  if (isEgg(animal))
    return [
      animal.taxonGroup === 'sturgeon'
        ? { ulPerL: limits.sturgeonEggUlPerL, row: 'sturgeon-egg' }
        : { ulPerL: limits.eggUlPerL, row: 'egg' },
    ]
  if (animal.taxonGroup !== 'salmonid') return [{ ulPerL: limits.finfishUlPerL, row: 'finfish' }]
  if (warmestC === null) return [{ ulPerL: limits.salmonidWarmUlPerL, row: 'salmonid-temperature-unknown' }]
  return [
    isBelow(warmestC, limits.salmonidBoundaryC)
      ? { ulPerL: limits.finfishUlPerL, row: 'finfish' }
      : { ulPerL: limits.salmonidWarmUlPerL, row: 'salmonid-warm' },
  ]
}

function told(
  { ulPerL, row }: Ceiling,
  targetUlPerL: number,
  warmestC: number | null,
  boundaryC: number,
): CautionFinding {
  const target = doseOf(targetUlPerL, 'uL/L')
  const ceiling = doseOf(ulPerL, 'uL/L')
  const boundary = readingOf(boundaryC, 'degC')
  if (row === 'salmonid-temperature-unknown' || (row === 'salmonid-warm' && warmestC === null))
    return {
      code: 'formalin-salmonid-temperature-unknown',
      level: 'stop',
      params: { target, ceiling, boundary },
      resolvedBy: ['read-temperature', 'lower-target'],
      unknown: ['water.temperatureC'],
    }
  if (row === 'salmonid-warm')
    return {
      code: 'formalin-over-salmonid-ceiling',
      level: 'stop',
      params: { target, ceiling, temperature: readingOf(warmestC ?? boundaryC, 'degC'), boundary },
      resolvedBy: ['lower-target'],
    }
  return {
    code: 'formalin-over-ceiling',
    level: 'stop',
    params: { target, ceiling, row },
    resolvedBy: ['lower-target'],
  }
}
