import { readingOf } from '../caution-param.ts'
import { type CautionLevel, defineRule } from '../caution-rule.ts'
import { isBelow } from '../exceeds.ts'
import { valueOf } from '../fact.ts'
import { formalinConcentration } from '../formalin-concentration.ts'
import { freshReading } from '../fresh-reading.ts'

/** Formalin left in the water uses up oxygen over a day and a half: what will be left has to stay above the floor. */
export const formalinOxygenDemand = defineRule({
  id: 'R02',
  levels: ['warning', 'stop'],
  when: 'both',
  overridable: true,
  parameters: {
    oxygenFloorMgPerL: { default: 5, unit: 'mg/L', source: 'cfr-529-1030', mark: 'V', tighter: 'higher' },
    productMgPerMgOxygen: { default: 5, unit: 'factor', source: 'ufifas-vm77', mark: 'V', tighter: 'lower' },
    startMaxAgeMinutes: { default: 30, unit: 'min', source: 'project-default', mark: 'P', tighter: 'lower' },
    designMaxAgeHours: { default: 24, unit: 'h', source: 'project-default', mark: 'P', tighter: 'lower' },
  },
  uses: [
    'order.target',
    'order.timing',
    'water.oxygenMgPerL',
    'water.oxygenIsLogged',
    'lifeSupport.aeration',
    'lot.densityGPerMl',
  ],
  findings: {
    'oxygen-would-fall': ['lower-target', 'raise-oxygen', 'aerate-and-log'],
    'oxygen-fall-unknown': ['read-oxygen', 'aerate-and-log'],
  },
  sources: [
    { source: 'ufifas-vm77', mark: 'V' },
    { source: 'formalin-density', mark: 'M' },
  ],
  concerns: ({ agent, order }) => agent === 'formalin' && valueOf(order.timing) !== 'timed',
  judge(facts, parameters, stage) {
    const strength = formalinConcentration(facts)
    if (!strength) return []
    const floor = readingOf(parameters.oxygenFloorMgPerL, 'mg/L')
    const takesMgPerL = strength.productMgPerL / parameters.productMgPerMgOxygen
    const takes = readingOf(takesMgPerL, 'mg/L')
    const isSafe =
      valueOf(facts.lifeSupport.aeration) === 'on' && valueOf(facts.water.oxygenIsLogged) === true
    const level: CautionLevel = isSafe ? 'warning' : 'stop'
    const maxAge = stage === 'start' ? parameters.startMaxAgeMinutes : parameters.designMaxAgeHours * 60
    const now = freshReading(facts.water.oxygenMgPerL, facts.at, maxAge)
    if (now.state !== 'fresh')
      return [
        {
          code: 'oxygen-fall-unknown',
          level,
          params: { takes, floor },
          resolvedBy: ['read-oxygen', 'aerate-and-log'],
          unknown: ['water.oxygenMgPerL'],
        },
      ]
    const predictedMgPerL = now.value - takesMgPerL
    if (!isBelow(predictedMgPerL, parameters.oxygenFloorMgPerL)) return []
    const predicted = readingOf(predictedMgPerL, 'mg/L')
    return [
      {
        code: 'oxygen-would-fall',
        level,
        params: { oxygen: readingOf(now.value, 'mg/L', now.digits), takes, predicted, floor },
        resolvedBy: isSafe
          ? ['lower-target', 'raise-oxygen']
          : ['aerate-and-log', 'lower-target', 'raise-oxygen'],
      },
    ]
  },
})
