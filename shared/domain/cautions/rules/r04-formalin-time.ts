import type { FormalinRow } from '../caution-code.ts'
import type { CautionFacts } from '../caution-facts.ts'
import { doseOf } from '../caution-param.ts'
import { type CautionFinding, defineRule } from '../caution-rule.ts'
import { exceeds } from '../exceeds.ts'
import { valueOf } from '../fact.ts'
import { formalinConcentration } from '../formalin-concentration.ts'
import { isEgg, isFinfish } from '../inhabitants.ts'

/** The label's times in tanks and raceways, by stage and group of the animals in the water. */
export const formalinTime = defineRule({
  id: 'R04',
  levels: ['stop'],
  when: 'design',
  overridable: true,
  parameters: {
    finfishMinutes: { default: 60, unit: 'min', source: 'cfr-529-1030', mark: 'V', tighter: 'lower' },
    indefiniteUlPerL: { default: 25, unit: 'uL/L', source: 'cfr-529-1030', mark: 'V', tighter: 'lower' },
    eggMinutes: { default: 15, unit: 'min', source: 'cfr-529-1030', mark: 'V', tighter: 'lower' },
    penaeidMinutesPerDay: { default: 240, unit: 'min', source: 'cfr-529-1030', mark: 'V', tighter: 'lower' },
  },
  uses: [
    'order.setting',
    'order.target',
    'order.timing',
    'order.contactMinutes',
    'order.contactMinutesPerDay',
    'animals.inWater',
    'lot.densityGPerMl',
  ],
  findings: {
    'formalin-too-long': ['shorten-contact'],
    'formalin-too-long-for-strength': ['shorten-contact', 'lower-target'],
    'formalin-indefinite': ['shorten-contact', 'lower-target'],
    'formalin-indefinite-not-allowed': ['shorten-contact'],
    'formalin-time-unknown': ['state-contact-time'],
  },
  sources: [{ source: 'cfr-529-1030', mark: 'V' }],
  concerns: ({ agent, order }) => agent === 'formalin' && valueOf(order.setting) !== 'pond',
  judge(facts, parameters) {
    const inWater = valueOf(facts.animals.inWater)
    const minutes = contactMinutes(facts)
    const perDay = valueOf(facts.order.contactMinutesPerDay) ?? minutes
    if (inWater === null) {
      // The strictest row for one treatment, and the only row there is for a whole day.
      const once = judgeLimit(minutes, parameters.eggMinutes, 'inhabitants-unknown')
      return once.length > 0 ? once : judgeLimit(perDay, parameters.penaeidMinutesPerDay, 'penaeid-tank')
    }
    const found: CautionFinding[] = []
    const finfish = inWater.filter(isFinfish)
    if (finfish.some(isEgg)) found.push(...judgeLimit(minutes, parameters.eggMinutes, 'egg'))
    if (inWater.some(({ taxonGroup }) => taxonGroup === 'penaeid-shrimp'))
      found.push(...judgeLimit(perDay, parameters.penaeidMinutesPerDay, 'penaeid-tank'))
    if (finfish.some((animal) => !isEgg(animal))) found.push(...judgeFinfish(facts, minutes, parameters))
    return found
  },
})

/** Minutes of one treatment; null when not told, infinite when the agent stays in. */
function contactMinutes({ order }: CautionFacts): number | null {
  return valueOf(order.timing) === 'indefinite' ? Infinity : valueOf(order.contactMinutes)
}

function judgeFinfish(
  facts: CautionFacts,
  minutes: number | null,
  limits: { finfishMinutes: number; indefiniteUlPerL: number },
): CautionFinding[] {
  const strength = formalinConcentration(facts)
  // Without a strength nothing shows that it is low enough to be left in.
  if (strength && !exceeds(strength.productUlPerL, limits.indefiniteUlPerL)) return []
  if (minutes === null || !strength) return judgeLimit(minutes, limits.finfishMinutes, 'finfish')
  if (minutes <= limits.finfishMinutes) return []
  const target = doseOf(strength.productUlPerL, 'uL/L')
  const limit = doseOf(limits.indefiniteUlPerL, 'uL/L')
  if (minutes === Infinity)
    return [
      {
        code: 'formalin-indefinite',
        level: 'stop',
        params: { target, limit },
        resolvedBy: ['shorten-contact', 'lower-target'],
      },
    ]
  return [
    {
      code: 'formalin-too-long-for-strength',
      level: 'stop',
      params: { minutes, limitMinutes: limits.finfishMinutes, target, limit },
      resolvedBy: ['shorten-contact', 'lower-target'],
    },
  ]
}

function judgeLimit(minutes: number | null, limitMinutes: number, row: FormalinRow): CautionFinding[] {
  const unknown = row === 'inhabitants-unknown' ? (['animals.inWater'] as const) : []
  if (minutes === null)
    return [
      {
        code: 'formalin-time-unknown',
        level: 'stop',
        params: { limitMinutes },
        resolvedBy: ['state-contact-time'],
        unknown: ['order.contactMinutes', ...unknown],
      },
    ]
  if (minutes <= limitMinutes) return []
  if (minutes === Infinity)
    return [
      {
        code: 'formalin-indefinite-not-allowed',
        level: 'stop',
        params: { limitMinutes, row },
        resolvedBy: ['shorten-contact'],
        unknown,
      },
    ]
  return [
    {
      code: 'formalin-too-long',
      level: 'stop',
      params: { minutes, limitMinutes, row },
      resolvedBy: ['shorten-contact'],
      unknown,
    },
  ]
}
