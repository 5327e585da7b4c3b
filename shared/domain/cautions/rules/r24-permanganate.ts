import { convert } from '../../units/convert.ts'
import { hoursBetween } from '../../time/instant-arithmetic.ts'
import type { CautionFacts } from '../caution-facts.ts'
import { doseOf, readingOf } from '../caution-param.ts'
import { type CautionFinding, defineRule } from '../caution-rule.ts'
import { exceeds } from '../exceeds.ts'
import { valueOf } from '../fact.ts'
import { freshReading } from '../fresh-reading.ts'

/** Permanganate leaves manganese dioxide on gills in alkaline and hard water, adds up, and is not repeated weekly. */
export const permanganate = defineRule({
  id: 'R24',
  levels: ['warning', 'stop'],
  when: 'design',
  overridable: true,
  parameters: {
    highestPh: { default: 8.5, unit: 'pH', source: 'treatment-practice', mark: 'M', tighter: 'lower' },
    hardMgPerLCaCO3: {
      default: 250,
      unit: 'mg/L_CaCO3',
      source: 'project-default',
      mark: 'P',
      tighter: 'lower',
    },
    totalMgPerL: { default: 6, unit: 'mg/L', source: 'ufifas-fa37', mark: 'V2', tighter: 'lower' },
    apartDays: { default: 7, unit: 'd', source: 'treatment-practice', mark: 'M', tighter: 'higher' },
    maxAgeHours: { default: 24, unit: 'h', source: 'project-default', mark: 'P', tighter: 'lower' },
  },
  uses: [
    'water.pH',
    'water.hardnessMgPerLCaCO3',
    'order.target',
    'order.startsAt',
    'history.givenInLast24hMgPerL',
    'history.agentUses',
  ],
  findings: {
    'agent-history-unknown': ['record-history'],
    'permanganate-alkaline': ['choose-other-agent', 'correct-water'],
    'permanganate-hard': ['choose-other-agent', 'correct-water'],
    'permanganate-unknown': ['read-water'],
    'permanganate-total': ['lower-target', 'wait-between-agents'],
    'permanganate-total-unknown': ['record-history'],
    'permanganate-repeated': ['wait-between-agents'],
  },
  sources: [
    { source: 'ufifas-fa37', mark: 'V2' },
    { source: 'treatment-practice', mark: 'M' },
  ],
  concerns: ({ agent }) => agent === 'potassium-permanganate',
  judge(facts, parameters) {
    const maxAgeMinutes = parameters.maxAgeHours * 60
    const found: CautionFinding[] = []
    const pH = freshReading(facts.water.pH, facts.at, maxAgeMinutes)
    const hardness = freshReading(facts.water.hardnessMgPerLCaCO3, facts.at, maxAgeMinutes)
    if (pH.state !== 'fresh')
      found.push({
        code: 'permanganate-unknown',
        level: 'warning',
        params: { reading: 'pH' },
        resolvedBy: ['read-water'],
        unknown: ['water.pH'],
      })
    else if (exceeds(pH.value, parameters.highestPh))
      found.push({
        code: 'permanganate-alkaline',
        level: 'warning',
        params: {
          reading: readingOf(pH.value, 'pH', pH.digits),
          limit: readingOf(parameters.highestPh, 'pH'),
        },
        resolvedBy: ['choose-other-agent', 'correct-water'],
      })
    if (hardness.state !== 'fresh')
      found.push({
        code: 'permanganate-unknown',
        level: 'warning',
        params: { reading: 'hardness' },
        resolvedBy: ['read-water'],
        unknown: ['water.hardnessMgPerLCaCO3'],
      })
    else if (exceeds(hardness.value, parameters.hardMgPerLCaCO3))
      found.push({
        code: 'permanganate-hard',
        level: 'warning',
        params: {
          reading: readingOf(hardness.value, 'mg/L_CaCO3', hardness.digits),
          limit: readingOf(parameters.hardMgPerLCaCO3, 'mg/L_CaCO3'),
        },
        resolvedBy: ['choose-other-agent', 'correct-water'],
      })
    return [
      ...found,
      ...judgeTotal(facts, parameters.totalMgPerL),
      ...judgeRepeat(facts, parameters.apartDays),
    ]
  },
})

function judgeTotal(facts: CautionFacts, totalMgPerL: number): CautionFinding[] {
  const limit = doseOf(totalMgPerL, 'mg/L')
  const target = valueOf(facts.order.target)
  const now = target ? convert(target.value, target.unit, 'mg/L') : null
  if (!now?.ok) return []
  const before = valueOf(facts.history.givenInLast24hMgPerL)
  if (before === null && facts.history.givenInLast24hMgPerL.state === 'unknown')
    return [
      {
        code: 'permanganate-total-unknown',
        level: 'stop',
        params: { limit },
        resolvedBy: ['record-history'],
        unknown: ['history.givenInLast24hMgPerL'],
      },
    ]
  const total = (before ?? 0) + now.value
  if (!exceeds(total, totalMgPerL)) return []
  return [
    {
      code: 'permanganate-total',
      level: 'stop',
      params: { total: doseOf(total, 'mg/L'), limit },
      resolvedBy: ['lower-target', 'wait-between-agents'],
    },
  ]
}

function judgeRepeat(facts: CautionFacts, limitDays: number): CautionFinding[] {
  const uses = valueOf(facts.history.agentUses)
  if (uses === null)
    return [
      {
        code: 'agent-history-unknown',
        level: 'warning',
        params: {},
        resolvedBy: ['record-history'],
        unknown: ['history.agentUses'],
      },
    ]
  const startsAt = valueOf(facts.order.startsAt) ?? facts.at
  const recent = uses.find(
    ({ agent, until }) =>
      agent === 'potassium-permanganate' && until !== null && hoursBetween(until, startsAt) < limitDays * 24,
  )
  if (!recent) return []
  return [
    {
      code: 'permanganate-repeated',
      level: 'warning',
      params: { orderNumber: recent.orderNumber, limitDays },
      resolvedBy: ['wait-between-agents'],
    },
  ]
}
