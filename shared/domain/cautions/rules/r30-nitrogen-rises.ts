import type { AgentCode } from '../../formulary/agent.ts'
import type { TimedReading } from '../caution-facts.ts'
import { readingOf } from '../caution-param.ts'
import { type CautionFinding, defineRule } from '../caution-rule.ts'
import { exceeds } from '../exceeds.ts'
import { valueOf } from '../fact.ts'
import { freshReading } from '../fresh-reading.ts'
import { readingFact, readingFacts } from '../required-readings.ts'

/**
 * Agents that harm plants or the biofilter by a warning or more in the matrix of interactions. Where its cell names
 * plants or algae first, the stricter reading holds.
 *
 * @source treatments reference 3.2, column of the biofilter: from memory (M)
 */
export const harmBiofilter: readonly AgentCode[] = [
  'formalin',
  'copper-sulfate',
  'chelated-copper',
  'chloroquine',
  'hydrogen-peroxide',
  'chloramine-t',
  'oxytetracycline',
  'enrofloxacin',
  'sodium-chloride',
  'potassium-permanganate',
  'methylene-blue',
]

const resolvedBy = ['test-nitrogen', 'feed-less', 'change-water'] as const
const effects = [{ kind: 'task' }] as const

/** While an agent that harms the biofilter is given, ammonia and nitrite are read, and do not rise. */
export const nitrogenRises = defineRule({
  id: 'R30',
  levels: ['warning'],
  when: 'start',
  overridable: true,
  parameters: {
    risesFactor: { default: 2, unit: 'factor', source: 'project-default', mark: 'P', tighter: 'lower' },
    unionisedMgPerL: {
      default: 0.05,
      unit: 'mg/L',
      source: 'treatment-practice',
      mark: 'M',
      tighter: 'lower',
    },
    nitrogenMaxAgeHours: { default: 24, unit: 'h', source: 'project-default', mark: 'P', tighter: 'lower' },
  },
  uses: [
    'water.totalAmmoniaNMgPerL',
    'water.nitriteNMgPerL',
    'water.unionisedAmmoniaNMgPerL',
    'water.earlierTotalAmmoniaN',
    'water.earlierNitriteN',
  ],
  findings: {
    'nitrogen-unknown': ['read-water'],
    'nitrogen-before-unknown': ['test-nitrogen'],
    'nitrogen-rising': resolvedBy,
    'unionised-ammonia-high': resolvedBy,
    'unionised-ammonia-unknown': ['read-water'],
  },
  effects: ['task'],
  sources: [
    { source: 'project-default', mark: 'P' },
    { source: 'treatment-practice', mark: 'M' },
  ],
  concerns: ({ agent }) => harmBiofilter.includes(agent),
  judge(facts, { risesFactor, unionisedMgPerL, nitrogenMaxAgeHours: maxAgeHours }) {
    const { water, at } = facts
    const found: CautionFinding[] = []
    const pairs = [
      ['total-ammonia', 'water.earlierTotalAmmoniaN', water.earlierTotalAmmoniaN],
      ['nitrite', 'water.earlierNitriteN', water.earlierNitriteN],
    ] as const
    for (const [reading, path, earlier] of pairs) {
      const now = freshReading(readingFact(facts, reading), at, maxAgeHours * 60)
      if (now.state !== 'fresh') {
        found.push({
          code: 'nitrogen-unknown',
          level: 'warning',
          params: { reading, maxAgeHours },
          resolvedBy: ['read-water'],
          unknown: [readingFacts[reading]],
        })
        continue
      }
      const before = median(valueOf(earlier) ?? [])
      if (before === null)
        found.push({
          code: 'nitrogen-before-unknown',
          level: 'warning',
          params: { reading },
          resolvedBy: ['test-nitrogen'],
          unknown: [path],
        })
      else if (exceeds(now.value, before * risesFactor))
        found.push({
          code: 'nitrogen-rising',
          level: 'warning',
          params: {
            reading,
            value: readingOf(now.value, 'mg/L', now.digits),
            before: readingOf(before, 'mg/L'),
            factor: risesFactor,
          },
          resolvedBy,
          effects,
        })
    }
    // so much ammonia as a whole is not more when all of it is un-ionised
    const total = freshReading(water.totalAmmoniaNMgPerL, at, maxAgeHours * 60)
    if (total.state === 'fresh' && !exceeds(total.value, unionisedMgPerL)) return found
    const limit = readingOf(unionisedMgPerL, 'mg/L')
    const unionised = freshReading(water.unionisedAmmoniaNMgPerL, at, maxAgeHours * 60)
    if (unionised.state === 'fresh' && exceeds(unionised.value, unionisedMgPerL))
      found.push({
        code: 'unionised-ammonia-high',
        level: 'warning',
        params: { value: readingOf(unionised.value, 'mg/L'), limit },
        resolvedBy,
        effects,
      })
    else if (unionised.state !== 'fresh' && total.state === 'fresh')
      found.push({
        code: 'unionised-ammonia-unknown',
        level: 'warning',
        params: { limit },
        resolvedBy: ['read-water'],
        unknown: ['water.unionisedAmmoniaNMgPerL'],
      })
    return found
  },
  condition: (_, { nitrogenMaxAgeHours, unionisedMgPerL }) => ({
    maxAgeHours: nitrogenMaxAgeHours,
    limit: readingOf(unionisedMgPerL, 'mg/L'),
  }),
})

/** The middle of earlier readings, which one slip of a test kit does not move; null when there are none. */
function median(readings: readonly TimedReading[]): number | null {
  const values = readings.map(({ value }) => value).sort((a, b) => a - b)
  const middle = values.length / 2
  const high = values[Math.floor(middle)]
  const low = values[Math.ceil(middle) - 1]
  return high === undefined || low === undefined ? null : (low + high) / 2
}
